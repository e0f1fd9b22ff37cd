/** The states of the list with how many there are in each. */
import { Tabs } from '@/components/ui/tabs';
import { caseStates, type CaseState } from '@/server/contract/cases';
import { stateWords } from '../words';
import type { CaseFilters } from './filters';

interface CaseTabsProps {
  value: CaseFilters['state'];
  counts: Partial<Record<CaseState, number>> | undefined;
  onChange: (state: CaseFilters['state']) => void;
  ruled: boolean;
}

export function CaseTabs({ value, counts, onChange, ruled }: CaseTabsProps) {
  const countOf = (states: readonly CaseState[]): number | undefined =>
    counts && states.reduce((total, state) => total + (counts[state] ?? 0), 0);
  const open = caseStates.filter((state) => state !== 'closed');
  return (
    <Tabs
      label="state"
      value={value}
      onChange={onChange}
      ruled={ruled}
      tabs={[
        { value: 'open', label: 'open', count: countOf(open) },
        ...caseStates.map((state) => ({ value: state, label: stateWords[state], glyph: state, count: countOf([state]) })),
      ]}
    />
  );
}
