/** An image that was taken in: its picture, where it stands in the exam, what was removed, and what its header does not say. */
import { View } from 'react-native';
import { thumbnailOf, useImage } from '@/components/api/images';
import { Badge } from '@/components/ui/badge';
import { LinkText } from '@/components/ui/link-text';
import { Picture } from '@/components/ui/picture';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Image } from '@/server/contract/images';
import { LookForText } from './look-for-text';
import { PhaseEncodeQuestion } from './phase-encode-question';
import { RemovedTable } from './removed-table';
import { WarningList } from './warning-list';

interface TakenImageProps {
  imageId: string;
  /** The table of what was removed stands once, under the first image. */
  withRemoved: boolean;
  onRemove: () => void;
}

const phaseWords = { row: 'phase left and right', column: 'phase up and down' } as const;

export function imageLines(image: Image): string {
  const { seriesNumber, instanceNumber, phaseEncode } = image.acquisition;
  const place = [
    seriesNumber.value === null ? '' : `series ${seriesNumber.value}`,
    instanceNumber.value === null ? '' : `image ${instanceNumber.value}`,
  ].filter(Boolean);
  const matrix = `${image.columns} × ${image.rows}, ${phaseEncode.value ? phaseWords[phaseEncode.value] : 'phase direction not said'}`;
  return [place.join(', '), matrix].filter(Boolean).join('\n');
}

export function TakenImage({ imageId, withRemoved, onRemove }: TakenImageProps) {
  const { colours } = useTheme();
  const { data: image, error } = useImage(imageId);
  const count = image ? image.deidentification.removed.length : 0;
  return (
    <View style={{ paddingHorizontal: gutter.phone, paddingVertical: space(4), borderBottomWidth: 1, borderBottomColor: colours.rule }}>
      <View style={{ flexDirection: 'row', gap: space(3) }}>
        <Picture source={error ? null : thumbnailOf(imageId)} alt="" size={64} />
        <View style={{ flex: 1 }}>
          <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', marginVertical: -12 }}>
            <Badge glyph={error ? 'danger' : 'verified'} word={error ? 'not found' : 'taken in'} tone={error ? 'madder' : 'ink'} />
            <LinkText label="leave it out" onPress={onRemove} />
          </View>
          <Text variant="small" tone="inkSoft" style={{ paddingTop: space(1) }}>
            {image ? imageLines(image) : error ? error.message : 'reading the facts'}
          </Text>
        </View>
      </View>
      {image ? (
        <Text variant="detail" tone="inkSoft" style={{ paddingTop: space(2) }}>
          Names, numbers and dates are taken out: {count} {count === 1 ? 'attribute' : 'attributes'} removed.
        </Text>
      ) : null}
      {image?.confirmedNoText === false ? <LookForText imageId={imageId} onGone={onRemove} /> : null}
      {image && image.warnings.length > 0 ? <WarningList warnings={image.warnings} /> : null}
      {image && image.use === 'measured' && image.acquisition.phaseEncode.value === null ? <PhaseEncodeQuestion image={image} /> : null}
      {image && withRemoved ? <RemovedTable deidentification={image.deidentification} /> : null}
    </View>
  );
}
