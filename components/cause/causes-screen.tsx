/**
 * The catalogue: every modelled cause on the warp thread of the signal chain, stage after stage. Filtering reshuffles nothing: the rest
 * become a line of names.
 */
import { useState } from 'react';
import { ScrollView, View } from 'react-native';
import { useCauses } from '@/components/api/catalogue';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { PageHead } from '@/components/ui/page-head';
import { Press } from '@/components/ui/press';
import { Glyph } from '@/components/ui/glyph';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { stitchedLine } from '@/components/ui/stitches';
import { Tabs, type Tab } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import type { Cause } from '@/server/contract/catalogue';
import { sightings, type Sighting } from '@/server/contract/sighting';
import { sightingWords } from '../case/words';
import { causesByStage, stageWords } from './stage-words';

type SeenFilter = Sighting | 'any';

const fits = (cause: Cause, seen: SeenFilter): boolean => seen === 'any' || cause.seen.includes(seen);

/** Any, and each thing that at least one cause shows. */
const seenTabs = (causes: readonly Cause[]): Tab<SeenFilter>[] => [
  { value: 'any', label: 'any', count: causes.length },
  ...sightings
    .map((value) => ({ value, label: sightingWords[value], count: causes.filter((cause) => fits(cause, value)).length }))
    .filter(({ count }) => count > 0),
];

function CauseRow({ cause }: { cause: Cause }) {
  const { colours } = useTheme();
  return (
    <Press
      href={{ pathname: '/causes/[causeId]', params: { causeId: cause.id } }}
      aria-label={`${cause.title}: ${cause.looks.image}`}
      style={({ hovered }) => ({
        flexDirection: 'row',
        alignItems: 'center',
        gap: space(3),
        paddingVertical: space(3),
        borderTopWidth: 1,
        borderTopColor: colours.rule,
        backgroundColor: hovered ? colours.clothSunk : 'transparent',
      })}
    >
      <View style={{ flex: 1, gap: 2 }}>
        <Text variant="caseTitle">{cause.title}</Text>
        <Text variant="detail" tone="inkSoft">
          {cause.looks.image}
        </Text>
        <Text variant="small" tone="inkFaint">
          k-space: {cause.looks.kspace}
        </Text>
      </View>
      <Glyph name="right" colour={colours.inkFaint} />
    </Press>
  );
}

function Stages({ causes, seen }: { causes: readonly Cause[]; seen: SeenFilter }) {
  const { colours } = useTheme();
  return (
    <View style={{ maxWidth: 760, paddingLeft: 40, paddingRight: gutter.phone, paddingBottom: space(8) }}>
      <View style={{ position: 'absolute', left: 21, top: 24, bottom: 0, width: 2, backgroundColor: colours.ruleStrong }} />
      {causesByStage(causes).map(({ stage, causes: all }) => {
        const ofStage = all.filter((cause) => fits(cause, seen));
        const rest = all.filter((cause) => !fits(cause, seen));
        return (
          <View key={stage} role="region" aria-label={stageWords[stage]} style={{ paddingBottom: space(3) }}>
            <View
              style={{ flexDirection: 'row', alignItems: 'baseline', justifyContent: 'space-between', paddingTop: 11, paddingBottom: 10 }}
            >
              <View
                style={{
                  position: 'absolute',
                  left: -24,
                  top: 15,
                  width: 12,
                  height: 12,
                  borderWidth: 2,
                  borderColor: colours.ruleStrong,
                  backgroundColor: ofStage.length > 0 ? colours.ruleStrong : colours.cloth,
                }}
              />
              <Text variant="heading" level={2}>
                {stageWords[stage]}
              </Text>
              <Text variant="small" tone="inkFaint">
                {all.length === 0 ? 'none modelled yet' : rest.length > 0 ? `${ofStage.length} of ${all.length}` : all.length}
              </Text>
            </View>
            {ofStage.map((cause) => (
              <CauseRow key={cause.id} cause={cause} />
            ))}
            {rest.length > 0 ? (
              <View style={[{ paddingTop: space(1), paddingBottom: 10 }, stitchedLine(colours.ruleStrong)]}>
                <Text variant="detail" tone="inkFaint">
                  {rest.map(({ title }) => title).join(', ')}
                </Text>
              </View>
            ) : null}
          </View>
        );
      })}
    </View>
  );
}

export function CausesScreen() {
  const { colours } = useTheme();
  const [seen, setSeen] = useState<SeenFilter>('any');
  const wide = useLayout() === 'wide';
  const { data, error, refetch } = useCauses();
  return (
    <Screen title="Causes" still head={<PageHead title="Causes" />}>
      {data ? (
        <View
          style={{
            backgroundColor: colours.clothSunk,
            borderTopWidth: 1,
            borderBottomWidth: 1,
            borderColor: colours.rule,
            paddingHorizontal: wide ? space(2) : 0,
          }}
        >
          <Tabs label="what is seen" ruled={false} value={seen} onChange={setSeen} tabs={seenTabs(data)} />
        </View>
      ) : null}
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ paddingLeft: wide ? space(2) : 0 }}>
        {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
        {!data && !error ? <LoadingWarp what="fetching the catalogue" /> : null}
        {data ? <Stages causes={data} seen={seen} /> : null}
      </ScrollView>
    </Screen>
  );
}
