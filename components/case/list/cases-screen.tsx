/** The cases of the department: found by words, state, scanner and what was seen, all of which stand in the address. */
import { useMemo, useState } from 'react';
import { ScrollView, View } from 'react-native';
import { useCases } from '@/components/api/cases';
import { Button } from '@/components/ui/button';
import { GlyphButton } from '@/components/ui/glyph-button';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { PageHead } from '@/components/ui/page-head';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { gutter, space } from '@/components/ui/theme';
import { useLayout } from '@/components/ui/use-layout';
import { useNow } from '../use-now';
import { CaseRow } from './case-row';
import { CaseTable } from './case-table';
import { CaseTabs } from './case-tabs';
import { FilterBand } from './filter-band';
import { pageSize, paramsOf, queryOf, readFilters, type CaseFilters, type Params } from './filters';
import { KeyFoot } from './key-foot';
import { NoCases } from './no-cases';
import { SearchField } from './search-field';
import { useListKeys } from './use-list-keys';

interface CasesScreenProps {
  /** What stands in the address. */
  params: Params;
  onParams: (params: Record<string, string | undefined>) => void;
}

export function CasesScreen({ params, onParams }: CasesScreenProps) {
  const wide = useLayout() === 'wide';
  const now = useNow();
  const filters = readFilters(params);
  const { data, error, refetch } = useCases(queryOf(filters));
  const [searching, setSearching] = useState(filters.q !== '');
  const ids = useMemo(() => (data?.cases ?? []).map((summary) => summary.id), [data]);
  const chosen = useListKeys(ids, wide);
  const change = (next: CaseFilters): void => onParams(paramsOf(next));
  const search = (
    <SearchField value={filters.q} onSearch={(q) => change({ ...filters, q, limit: pageSize })} autoFocus={!wide && filters.q === ''} />
  );
  const shown = data ? (data.total > data.cases.length ? `${data.cases.length} of ${data.total} shown` : `${data.total} shown`) : '';
  const list = (): React.ReactNode => {
    if (error && !data) return <ProblemNotice error={error} onRetry={() => void refetch()} />;
    if (!data) return <LoadingWarp what="fetching the cases" picture={wide ? 40 : 72} />;
    if (data.cases.length === 0) {
      return <NoCases filters={filters} nothingFiled={Object.values(data.counts).every((count) => count === 0)} onChange={change} />;
    }
    if (wide) return <CaseTable cases={data.cases} chosen={chosen} now={now} filters={filters} onChange={change} />;
    return data.cases.map((summary) => <CaseRow key={summary.id} summary={summary} now={now} />);
  };
  const more = data && data.total > data.cases.length && filters.limit < 200;
  return (
    <Screen
      title="Cases"
      still
      head={
        <PageHead
          title="Cases"
          end={
            wide ? (
              <Button label="new case" kind="first" glyph="plus" href="/cases/new" />
            ) : (
              <GlyphButton glyph="search" label="search" expanded={searching} onPress={() => setSearching(!searching)} />
            )
          }
        >
          {wide ? <View style={{ flex: 1, marginLeft: space(6) }}>{search}</View> : null}
        </PageHead>
      }
    >
      {!wide && searching ? <View style={{ paddingHorizontal: gutter.phone, flexDirection: 'row' }}>{search}</View> : null}
      <View style={wide ? { paddingHorizontal: space(2) } : null}>
        <CaseTabs
          value={filters.state}
          counts={data?.counts}
          ruled={!wide}
          onChange={(state) => change({ ...filters, state, limit: pageSize })}
        />
      </View>
      <FilterBand filters={filters} onChange={change} aside={shown} />
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1, paddingBottom: space(6) }}>
        {list()}
        {more ? (
          <View style={{ padding: gutter.phone, alignItems: 'flex-start' }}>
            <Button
              label={`show ${pageSize} more`}
              onPress={() => change({ ...filters, limit: Math.min(200, filters.limit + pageSize) })}
            />
          </View>
        ) : null}
      </ScrollView>
      {wide ? <KeyFoot /> : null}
    </Screen>
  );
}
