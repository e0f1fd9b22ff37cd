/** What narrows the sample book besides words: what is seen, with counts; the direction; who can act. */
import { View } from 'react-native';
import { Select } from '@/components/ui/select';
import { Tabs } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';
import { gutter, space, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { sightingWords } from '../case/words';
import { seenCounts, type CatalogueFilters } from './catalogue-filters';
import { actors, actorWords, alongs, alongWords } from './cause-words';

interface FilterProps {
  filters: CatalogueFilters;
  onChange: (filters: CatalogueFilters) => void;
}

const any = { id: '', label: 'any' };
const alongRows = [any, ...alongs.map((id) => ({ id, label: alongWords[id] }))];
const actorRows = [any, ...actors.map((id) => ({ id, label: actorWords[id] }))];

/** Direction and who can act, as two words with their values. */
export function MoreFilters({ filters, onChange }: FilterProps) {
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space(5) }}>
      <Select
        look="filter"
        label="runs along"
        rows={alongRows}
        value={filters.along}
        onChange={(id) => onChange({ ...filters, along: alongs.find((along) => along === id) ?? '' })}
      />
      <Select
        look="filter"
        label="who can act"
        rows={actorRows}
        value={filters.who}
        onChange={(id) => onChange({ ...filters, who: actors.find((who) => who === id) ?? '' })}
      />
    </View>
  );
}

interface SeenBarProps extends FilterProps {
  causes: readonly CatalogueEntry[];
  wide: boolean;
}

/** The band under the head. */
export function SeenBar({ causes, filters, onChange, wide }: SeenBarProps) {
  const { colours } = useTheme();
  const tabs = seenCounts(causes, filters).map(({ seen, count }) => ({
    value: seen || ('any' as const),
    label: seen === '' ? 'any' : sightingWords[seen],
    count,
  }));
  return (
    <View
      style={{
        minHeight: touchTarget,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space(3),
        paddingHorizontal: wide ? gutter.wide : 0,
        backgroundColor: colours.clothSunk,
        borderTopWidth: 1,
        borderBottomWidth: 1,
        borderColor: colours.rule,
      }}
    >
      {wide ? (
        <Text variant="small" tone="inkSoft">
          what do you see?
        </Text>
      ) : null}
      <View style={{ flex: 1, minWidth: 0 }}>
        <Tabs
          label="what is seen"
          ruled={false}
          value={filters.seen || 'any'}
          tabs={tabs}
          onChange={(value) => onChange({ ...filters, seen: value === 'any' ? '' : value })}
        />
      </View>
    </View>
  );
}
