/** What the signature rests on, side by side: the bad image, the nearest trial, the image after the fix. */
import { useState } from 'react';
import { View } from 'react-native';
import { thumbnailOf, useImage } from '@/components/api/images';
import { trialThumbnailOf } from '@/components/api/trials';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Trial } from '@/server/contract/case-parts';
import type { Case } from '@/server/contract/cases';
import { Figure } from '../view/figure';
import { imageRoleWords } from '../words';

interface EvidenceMatProps {
  found: Case;
  trial: Trial | undefined;
}

export function EvidenceMat({ found, trial }: EvidenceMatProps) {
  const { colours } = useTheme();
  const [room, setRoom] = useState(0);
  const bad = found.images.find(({ role }) => role === 'bad');
  const after = found.images.find(({ role }) => role === 'verification');
  const { data: image } = useImage(bad?.imageId ?? null);
  const size = Math.max(96, Math.min(204, Math.floor((room - 18 - 2 * space(3)) / 3)));
  const phaseEncode = image?.acquisition.phaseEncode.value ?? null;
  const lines = image ? (phaseEncode === 'column' ? image.rows : image.columns) : 256;
  const common = { size, lines, phaseEncode, edge: 'phase' };
  return (
    <View style={{ backgroundColor: colours.mat, paddingHorizontal: gutter.wide, paddingTop: space(5), paddingBottom: space(3) }}>
      <View onLayout={(event) => setRoom(event.nativeEvent.layout.width)} style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space(3) }}>
        {room > 0 && bad ? <Figure {...common} source={thumbnailOf(bad.imageId)} alt="bad image" role={imageRoleWords.bad} /> : null}
        {room > 0 && trial ? (
          <Figure
            {...common}
            phaseEncode={trial.phaseEncode}
            source={trialThumbnailOf(found.id, trial.id)}
            alt={`trial ${trial.number}, simulated, not for diagnosis`}
            role={{ word: `trial ${trial.number}`, glyph: 'simulated', tone: 'orchil' }}
            simulated
          />
        ) : null}
        {room > 0 && after ? (
          <Figure {...common} source={thumbnailOf(after.imageId)} alt="after the fix" role={imageRoleWords.verification} />
        ) : null}
      </View>
    </View>
  );
}
