/** The bench with everything that it works on: makes the shared state and takes the layout that fits the screen. */
import { useLayout } from '@/components/ui/use-layout';
import { BenchContext, CaseContext } from './bench-context';
import { useBenchKeys } from './bench-keys';
import { PhoneBench } from './phone-bench';
import { TabletBench } from './tablet-bench';
import { useBenchState, type OnTheBench } from './use-bench-state';
import { WideBench } from './wide-bench';

const layouts = { phone: PhoneBench, tablet: TabletBench, wide: WideBench } as const;

export function BenchTable(given: OnTheBench) {
  const { onBench, state } = useBenchState(given);
  useBenchKeys(state.dispatch);
  const Layout = layouts[useLayout()];
  return (
    <CaseContext value={onBench}>
      <BenchContext value={state}>
        <Layout />
      </BenchContext>
    </CaseContext>
  );
}
