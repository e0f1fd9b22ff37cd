/** A series in the draft: its slices in the order of space, of which those that show the fault are chosen. The others stay beside them. */
import { View } from 'react-native';
import { useImage } from '@/components/api/images';
import { Badge } from '@/components/ui/badge';
import { LinkText } from '@/components/ui/link-text';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Slice } from '@/server/contract/series';
import { PhaseEncodeQuestion } from '../new/phase-encode-question';
import { RemovedTable } from '../new/removed-table';
import { imageLines } from '../new/taken-image';
import { WarningList } from '../new/warning-list';
import { SliceStrip } from './slice-strip';

interface SeriesCardProps {
  slices: readonly Slice[];
  /** Those of its images that go on the case, at least one. */
  chosen: readonly string[];
  withRemoved: boolean;
  onChange: (chosen: string[]) => void;
}

export function SeriesCard({ slices, chosen, withRemoved, onChange }: SeriesCardProps) {
  const { colours } = useTheme();
  const { data: image } = useImage(chosen[0] ?? null);
  const toggle = ({ imageId }: Slice): void => {
    const rest = chosen.filter((id) => id !== imageId);
    // The last one stays: a series without a slice on the case is left out as a whole.
    if (rest.length === chosen.length) onChange([...chosen, imageId]);
    else if (rest.length > 0) onChange(rest);
  };
  const count = chosen.length === 1 ? '1 slice goes' : `${chosen.length} slices go`;
  return (
    <View style={{ paddingHorizontal: gutter.phone, paddingVertical: space(4), borderBottomWidth: 1, borderBottomColor: colours.rule }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', marginVertical: -12 }}>
        <Badge glyph="verified" word={`${slices.length} slices taken in`} />
        <LinkText label="leave it out" name="leave it out: the whole series" onPress={() => onChange([])} />
      </View>
      <Text variant="small" tone="inkSoft" style={{ paddingTop: space(3) }}>
        {image ? imageLines(image) : 'reading the facts'}
      </Text>
      <Text variant="detailStrong" level={2} style={{ paddingTop: space(2), paddingBottom: space(1) }}>
        Which slices show it? {count} on the case.
      </Text>
      <SliceStrip
        label="slices that show the fault"
        many
        slices={slices}
        chosen={({ imageId }) => chosen.includes(imageId)}
        onPress={toggle}
      />
      {image ? (
        <Text variant="detail" tone="inkSoft" style={{ paddingTop: space(2) }}>
          Names, numbers and dates are taken out: {image.deidentification.removed.length} attributes removed from each slice.
        </Text>
      ) : null}
      {image && image.warnings.length > 0 ? <WarningList warnings={image.warnings} /> : null}
      {image && image.acquisition.phaseEncode.value === null ? <PhaseEncodeQuestion image={image} /> : null}
      {image && withRemoved ? <RemovedTable deidentification={image.deidentification} /> : null}
    </View>
  );
}
