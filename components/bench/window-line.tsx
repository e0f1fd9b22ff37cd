/** Window and level as numbers that can be typed; a drag on the picture does the same. */
import { View } from 'react-native';
import type { Domain } from '@/components/image/edge-scale';
import { NumberInput } from '@/components/ui/number-input';
import { decimalsOf } from '@/components/ui/number-text';
import { Text } from '@/components/ui/text';
import { space, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';

interface WindowLineProps {
  domain: Domain;
  /** Without rule and hint, for a line that it shares. */
  bare?: boolean;
}

/** A hundredth of the window, rounded down to a power of ten: as fine as the eye tells. */
const decimalsFor = (width: number): number => Math.min(4, decimalsOf(10 ** Math.floor(Math.log10(width / 50))));

export function WindowLine({ domain, bare = false }: WindowLineProps) {
  const { colours } = useTheme();
  const { view, change } = useBench();
  const name = domain === 'image' ? 'imageWindow' : 'logWindow';
  const window = view[name];
  const decimals = decimalsFor(window.width);
  return (
    <View
      role="group"
      aria-label={domain === 'image' ? 'window and level of the image' : 'window and level of k-space, decades'}
      style={[
        { flexDirection: 'row', alignItems: 'center', gap: space(2) },
        bare ? null : { minHeight: touchTarget, paddingHorizontal: space(4), borderTopWidth: 1, borderTopColor: colours.rule },
      ]}
    >
      <Text variant={bare ? 'small' : 'mono'} tone="inkSoft">
        window
      </Text>
      <NumberInput
        quiet
        label="window"
        width={52}
        value={window.width}
        decimals={decimals}
        min={10 ** -decimals}
        max={1e6}
        onChange={(width) => change({ [name]: { ...window, width } })}
      />
      <Text variant={bare ? 'small' : 'mono'} tone="inkSoft">
        level
      </Text>
      <NumberInput
        quiet
        label="level"
        width={52}
        value={window.level}
        decimals={decimals}
        min={-1e6}
        max={1e6}
        onChange={(level) => change({ [name]: { ...window, level } })}
      />
      {bare ? null : (
        <Text variant="mono" tone="inkSoft" style={{ marginLeft: 'auto' }} numberOfLines={1}>
          drag the picture
        </Text>
      )}
    </View>
  );
}
