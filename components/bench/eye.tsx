/** The eye: numbers, marks and facts under tabs. Beside the panes on a wide bench, below them on a tablet. */
import { ScrollView, View } from 'react-native';
import { Tabs, type Tab } from '@/components/ui/tabs';
import { space } from '@/components/ui/theme';
import type { EyeTab } from './bench-view';
import { useBench } from './bench-context';
import { FactsTab } from './facts-tab';
import { MarksTab } from './marks-tab';
import { NumbersTab } from './numbers-tab';
import { useLetteredMarks } from './use-marking';

type Shown = Exclude<EyeTab, 'recipe'>;

export function EyeTabBody({ tab }: { tab: Shown }) {
  if (tab === 'marks') return <MarksTab />;
  return tab === 'facts' ? <FactsTab /> : <NumbersTab />;
}

export function Eye({ scrolls }: { scrolls: boolean }) {
  const { view, change } = useBench();
  const marks = useLetteredMarks();
  const tab: Shown = view.tab === 'recipe' ? 'facts' : view.tab;
  const tabs: readonly Tab<Shown>[] = [
    { value: 'numbers', label: 'numbers' },
    { value: 'marks', label: 'marks', count: marks.length > 0 ? marks.length : undefined },
    { value: 'facts', label: 'facts' },
  ];
  const body = (
    <View style={{ paddingHorizontal: space(6), paddingBottom: space(4) }}>
      <EyeTabBody tab={tab} />
    </View>
  );
  return (
    <View style={{ flex: 1, minHeight: 0 }}>
      <View style={{ paddingHorizontal: space(3) }}>
        <Tabs label="evidence" tabs={tabs} value={tab} onChange={(next) => change({ tab: next })} even />
      </View>
      {scrolls ? <ScrollView style={{ flex: 1 }}>{body}</ScrollView> : body}
    </View>
  );
}
