/** The readout on a phone: the glass, and beside it the numbers in columns. */
import { View } from 'react-native';
import type { Domain } from '@/components/image/edge-scale';
import { Glass } from '@/components/image/glass';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import type { ReadoutItem } from './readout';
import { useReadouts } from './use-readouts';

function Lines({ items, unitWidth }: { items: readonly ReadoutItem[]; unitWidth: number }) {
  return (
    <View style={{ flex: 1, minWidth: 0 }}>
      {items.map(({ label, value, unit }) => (
        <View key={label} style={{ flexDirection: 'row', height: 20, alignItems: 'center' }}>
          <Text variant="small" tone="matInkSoft">
            {label}
          </Text>
          <Text variant="small" tone="matInk" style={{ marginLeft: 'auto' }}>
            {value}
          </Text>
          <Text variant="small" tone="matInkSoft" style={{ width: unitWidth, paddingLeft: 5 }}>
            {unit}
          </Text>
        </View>
      ))}
    </View>
  );
}

interface ReadoutTableProps {
  domain: Domain;
  /** The numbers below one another, without the glass: beside a small picture. */
  narrow?: boolean;
}

export function ReadoutTable({ domain, narrow = false }: ReadoutTableProps) {
  const { colours } = useTheme();
  const { view, shown } = useBench();
  const items = useReadouts()[domain];
  if (narrow) {
    return (
      <View role="status" style={{ flex: 1, paddingLeft: space(3) }}>
        <Lines items={items.map((item) => (item.label === 'simulated' ? { ...item, label: 'sim' } : item))} unitWidth={28} />
      </View>
    );
  }
  const glass = shown[domain].bad ?? shown[domain].simulated;
  return (
    <View
      role="status"
      style={{
        flexDirection: 'row',
        gap: space(4),
        paddingHorizontal: space(4),
        paddingTop: space(2),
        minHeight: 94,
        backgroundColor: colours.mat,
      }}
    >
      {glass ? <Glass {...glass} cursor={view.cursor} /> : null}
      <Lines items={items.slice(0, 4)} unitWidth={30} />
      <Lines items={items.slice(4)} unitWidth={12} />
    </View>
  );
}
