/** The readout below a pane, in one line: the place in the full ink, what is there beside its name. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { fonts, space } from '@/components/ui/theme';
import type { ReadoutItem } from './readout';

export function ReadoutLine({ items }: { items: readonly ReadoutItem[] }) {
  return (
    <View role="status" style={{ height: 24, flexDirection: 'row', columnGap: space(3), overflow: 'hidden', flexWrap: 'wrap' }}>
      {items.map(({ label, value, unit, isPlace }) => (
        <Text key={label} variant="small" tone="matInkSoft" numberOfLines={1} style={{ height: 24 }}>
          {`${label} `}
          <Text variant="small" tone="matInk" style={isPlace ? { fontFamily: fonts.monoMedium } : null}>
            {unit === '°' ? `${value}°` : unit ? `${value} ${unit}` : value}
          </Text>
        </Text>
      ))}
    </View>
  );
}
