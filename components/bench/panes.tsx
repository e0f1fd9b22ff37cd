/** The two panes beside one another: image and k-space, or bad and simulated of one of them when they lie side by side. */
import { View } from 'react-native';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import { BenchPane } from './bench-pane';
import type { PictureSize } from './bench-measures';
import { ReadoutLine } from './readout-line';
import { useReadouts } from './use-readouts';

interface PanesProps {
  size: PictureSize;
  /** Space at the right of the panes. */
  gutter: number;
}

export function Panes({ size, gutter }: PanesProps) {
  const { colours } = useTheme();
  const { view } = useBench();
  const readouts = useReadouts();
  const sideBySide = view.compare === 'side-by-side';
  const [first, second] = sideBySide ? ([view.domain, view.domain] as const) : (['image', 'kspace'] as const);
  return (
    <View
      style={{
        flexDirection: 'row',
        justifyContent: 'space-between',
        backgroundColor: colours.mat,
        paddingLeft: space(1),
        paddingRight: gutter,
      }}
    >
      <View style={{ flex: 1, alignItems: 'center' }}>
        <BenchPane key={`first ${first}`} domain={first} side="bad" {...size} readout={<ReadoutLine items={readouts[first]} />} />
      </View>
      <View style={{ flex: 1, alignItems: 'center' }}>
        <BenchPane key={`second ${second}`} domain={second} side="simulated" {...size} readout={<ReadoutLine items={readouts[second]} />} />
      </View>
    </View>
  );
}
