/**
 * The catalogue as a sample book: every cause as a swatch that its own model computed, in the order of the signal chain. Words and
 * filters stand in the address. On a wide screen a table of stages and directions, else a list.
 */
import { useState } from 'react';
import { ScrollView, View } from 'react-native';
import { useCatalogue } from '@/components/api/catalogue';
import { EmptyState } from '@/components/ui/empty-state';
import { GlyphButton } from '@/components/ui/glyph-button';
import { LinkText } from '@/components/ui/link-text';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { PageHead } from '@/components/ui/page-head';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { gutter, space, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { SearchField } from '../case/list/search-field';
import { fits, isNarrowed, paramsOf, readFilters, type CatalogueFilters, type Params } from './catalogue-filters';
import { MoreFilters, SeenBar } from './filter-bar';
import { SampleBook } from './sample-book';
import { SampleList } from './sample-list';

interface CausesScreenProps {
  /** What stands in the address. */
  params: Params;
  onParams: (params: Record<string, string | undefined>) => void;
}

const computed = 'computed on phantoms, every one SIMULATED · NOT FOR DIAGNOSIS';

/** The foot of the book. */
function BookFoot() {
  const { colours } = useTheme();
  return (
    <View
      style={{
        minHeight: touchTarget,
        flexDirection: 'row',
        alignItems: 'center',
        justifyContent: 'space-between',
        gap: space(4),
        marginHorizontal: gutter.wide,
        borderTopWidth: 1,
        borderTopColor: colours.rule,
      }}
    >
      <Text variant="small" tone="inkFaint" style={{ flexShrink: 1 }}>
        When you say what you see, the others stay in their places as stitched outlines: the book never reshuffles.
      </Text>
      <Text variant="small" tone="inkFaint">
        {computed}
      </Text>
    </View>
  );
}

function Samples({
  causes,
  filters,
  onAll,
  wide,
}: {
  causes: readonly CatalogueEntry[];
  filters: CatalogueFilters;
  onAll: () => void;
  wide: boolean;
}) {
  const none = isNarrowed(filters) && !causes.some((cause) => fits(cause, filters));
  return (
    <View>
      {none ? (
        <View role="status" style={{ paddingHorizontal: wide ? gutter.wide : gutter.phone, paddingTop: space(3) }}>
          <EmptyState text="No cause fits these words and filters." action={<LinkText label="show all" onPress={onAll} />} />
        </View>
      ) : null}
      {wide ? <SampleBook causes={causes} filters={filters} /> : <SampleList causes={causes} filters={filters} />}
    </View>
  );
}

export function CausesScreen({ params, onParams }: CausesScreenProps) {
  const wide = useLayout() === 'wide';
  const { data, error, refetch } = useCatalogue();
  const filters = readFilters(params);
  const [searching, setSearching] = useState(Boolean(filters.q || filters.along || filters.who));
  const change = (next: CatalogueFilters): void => onParams(paramsOf(next));
  const search = (
    <SearchField
      value={filters.q}
      onSearch={(q) => change({ ...filters, q })}
      label="search the causes"
      placeholder="a word, a scan fact, a remedy"
    />
  );
  const aside = (
    <Text variant="small" tone="inkFaint">
      {wide ? 'left half: the picture · right half: its k-space' : 'phantom, SIMULATED'}
    </Text>
  );
  return (
    <Screen
      title="Causes"
      still
      head={
        <PageHead
          title="Causes"
          end={
            <>
              {aside}
              {wide ? null : (
                <GlyphButton glyph="search" label="search and filter" expanded={searching} onPress={() => setSearching(!searching)} />
              )}
            </>
          }
        >
          {wide ? <View style={{ width: 320, marginLeft: space(6) }}>{search}</View> : null}
          {wide ? <MoreFilters filters={filters} onChange={change} /> : null}
        </PageHead>
      }
    >
      {!wide && searching ? (
        <View style={{ paddingHorizontal: gutter.phone }}>
          <View style={{ flexDirection: 'row' }}>{search}</View>
          <MoreFilters filters={filters} onChange={change} />
        </View>
      ) : null}
      {data ? <SeenBar causes={data} filters={filters} onChange={change} wide={wide} /> : null}
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1 }}>
        {error && !data ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
        {!data && !error ? <LoadingWarp what="fetching the catalogue" picture={84} /> : null}
        {data && data.length === 0 ? (
          <View style={{ padding: gutter.phone }}>
            <EmptyState text="No cause is modelled yet." />
          </View>
        ) : null}
        {data ? <Samples causes={data} filters={filters} onAll={() => change(readFilters({}))} wide={wide} /> : null}
        {wide ? null : (
          <Text variant="small" tone="inkFaint" style={{ paddingHorizontal: gutter.phone, paddingBottom: space(4) }}>
            {computed}
          </Text>
        )}
      </ScrollView>
      {wide && data ? <BookFoot /> : null}
    </Screen>
  );
}
