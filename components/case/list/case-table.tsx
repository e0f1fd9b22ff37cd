/** The table of cases on a wide screen. */
import { View } from 'react-native';
import { gutter } from '@/components/ui/theme';
import type { CaseSummary } from '@/server/contract/cases';
import { CaseTableHead } from './case-table-head';
import { CaseTableRow } from './case-table-row';
import type { CaseFilters } from './filters';

interface CaseTableProps {
  cases: readonly CaseSummary[];
  chosen: number;
  now: number;
  filters: CaseFilters;
  onChange: (filters: CaseFilters) => void;
}

export function CaseTable({ cases, chosen, now, filters, onChange }: CaseTableProps) {
  return (
    <View role="table" aria-label="cases" style={{ paddingHorizontal: gutter.wide }}>
      <CaseTableHead filters={filters} onChange={onChange} />
      {cases.map((summary, index) => (
        <CaseTableRow key={summary.id} summary={summary} chosen={index === chosen} now={now} />
      ))}
    </View>
  );
}
