/** An image of a case and, beside it, its k-space: the transform of a magnitude image, which is not raw data. */
import { View } from 'react-native';
import { thumbnailOf, useImage } from '@/components/api/images';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { space } from '@/components/ui/theme';
import type { Case } from '@/server/contract/cases';
import { imageRoleWords } from '../words';
import { EmptyFrame } from './empty-frame';
import { Figure } from './figure';

interface ImageFiguresProps {
  image: Case['images'][number];
  size: number;
  withKspace: boolean;
}

const kspaceRole = { word: 'its k-space', glyph: 'image', tone: 'matInk' } as const;

export function ImageFigures({ image: { imageId, role }, size, withKspace }: ImageFiguresProps) {
  const { data: image, error, refetch } = useImage(imageId);
  if (error) return <ProblemNotice error={error} onRetry={() => void refetch()} />;
  if (!image) return <EmptyFrame size={size} />;
  const { seriesNumber, instanceNumber, phaseEncode } = image.acquisition;
  const place = [
    seriesNumber.value === null ? '' : `series ${seriesNumber.value}`,
    instanceNumber.value === null ? '' : `image ${instanceNumber.value}`,
  ].filter(Boolean);
  const lines = phaseEncode.value === 'column' ? image.rows : image.columns;
  const words = imageRoleWords[role];
  const common = { size, lines, phaseEncode: phaseEncode.value };
  const note = phaseEncode.value === null ? 'phase direction not said' : place.join(', ') || `${image.columns} × ${image.rows}`;
  return (
    <View style={{ flexDirection: 'row', gap: space(2) }}>
      <Figure {...common} source={thumbnailOf(imageId)} alt={words.word} role={words} note={note} />
      {withKspace ? (
        <Figure
          {...common}
          source={thumbnailOf(imageId, 'kspace')}
          alt={`k-space of the ${words.word}`}
          role={kspaceRole}
          edge="phase-encode line"
          note={image.component === 'magnitude' ? 'not raw data' : image.component}
        />
      ) : null}
    </View>
  );
}
