/** The readout below a pane, in one line: the place in the full ink, what is there beside its name. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { fonts, space } from '@/components/ui/theme';
import type { ReadoutItem } from './readout';

/** Names that are short enough for one line below a picture. */
const short: Record<string, string> = { row: 'r', column: 'c', simulated: 'sim' };

export function ReadoutLine({ items }: { items: readonly ReadoutItem[] }) {
  return (
    <View role="status" style={{ minHeight: 40, flexDirection: 'row', columnGap: space(3), alignContent: 'flex-start', flexWrap: 'wrap' }}>
      {items.map(({ label, value, unit, isPlace }) => (
        <Text key={label} variant="small" tone="matInkSoft" numberOfLines={1}>
          {`${short[label] ?? label} `}
          <Text variant="small" tone="matInk" style={isPlace ? { fontFamily: fonts.monoMedium } : null}>
            {unit === '°' ? `${value}°` : unit ? `${value} ${unit}` : value}
          </Text>
        </Text>
      ))}
    </View>
  );
}
