/** How the two pictures are held against each other: the mode at the left, its one control at the right. */
import { View } from 'react-native';
import { fixed, significant } from '@/components/ui/number-text';
import { Tabs, type Tab } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import type { BenchView, Compare } from './bench-view';
import { BlinkTurn } from './blink-turn';
import { Shuttle } from './shuttle';

const modes: readonly Tab<Compare>[] = [
  { value: 'side-by-side', label: 'side by side' },
  { value: 'divider', label: 'divider' },
  { value: 'blink', label: 'blink' },
  { value: 'difference', label: 'difference' },
];

const domains: readonly Tab<BenchView['domain']>[] = [
  { value: 'image', label: 'image' },
  { value: 'kspace', label: 'k-space' },
];

function ModeControl({ shuttleLength }: { shuttleLength: number }) {
  const { view, change, simulation } = useBench();
  const gain = simulation.shown?.metrics?.gain;
  switch (view.compare) {
    case 'divider':
      return <Shuttle value={view.divider} onChange={(divider) => change({ divider })} length={shuttleLength} />;
    case 'side-by-side':
      return <Tabs label="which pictures" tabs={domains} value={view.domain} onChange={(domain) => change({ domain })} ruled={false} />;
    case 'blink':
      return <BlinkTurn />;
    case 'difference':
      return (
        <Text variant="small" tone="inkSoft" numberOfLines={1}>
          {`full colour at ±${significant(view.differenceSpan)}${gain ? `, gain ${fixed(gain, 2)} applied` : ''}; drag to change`}
        </Text>
      );
  }
}

export function CompareBar({ shuttleLength }: { shuttleLength: number }) {
  const { colours } = useTheme();
  const { view, change } = useBench();
  return (
    <View
      style={{
        minHeight: 48,
        flexDirection: 'row',
        alignItems: 'center',
        paddingLeft: space(2),
        paddingRight: space(6),
        borderBottomWidth: 1,
        borderBottomColor: colours.rule,
      }}
    >
      <Tabs label="compare" tabs={modes} value={view.compare} onChange={(compare) => change({ compare })} ruled={false} />
      <View style={{ marginLeft: 'auto' }}>
        <ModeControl shuttleLength={shuttleLength} />
      </View>
    </View>
  );
}
