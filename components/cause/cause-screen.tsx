/**
 * One cause: what it does to a picture and to k-space from mild to strong, what it looks like, what drives it, what can be changed now,
 * what needs others, the model, where it is published, and the cases that had it. It prints as a page.
 */
import { useState } from 'react';
import { View } from 'react-native';
import { useCatalogue } from '@/components/api/catalogue';
import { ActionBar } from '@/components/ui/action-bar';
import { BarHead } from '@/components/ui/bar-head';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkText } from '@/components/ui/link-text';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { sightingWords } from '../case/words';
import { BenchOffer } from './bench-offer';
import { CauseDrivers, CauseLooks, CauseModel, CauseRecord, CauseRemedies } from './cause-parts';
import { alongWords } from './cause-words';
import { PrintPage } from './print-page';
import { stageWords } from './stage-words';
import { StrengthMat } from './strength-mat';

/** What is seen and where it runs, in a line. */
export const factsLine = ({ seen, runsAlong }: CatalogueEntry): string =>
  [
    ...seen.map((sighting) => sightingWords[sighting]),
    `runs along ${runsAlong === 'both' ? 'both directions' : alongWords[runsAlong]}`,
  ].join(' · ');

function CauseHead({ cause, gutters }: { cause: CatalogueEntry; gutters: number }) {
  return (
    <View style={{ paddingHorizontal: gutters, paddingBottom: space(4), gap: 2 }}>
      <Text variant="title" level={1}>
        {cause.title}
      </Text>
      <Text variant="small" tone="inkSoft">
        {factsLine(cause)}
      </Text>
    </View>
  );
}

function CausePhone({ cause }: { cause: CatalogueEntry }) {
  return (
    <View style={{ width: '100%', maxWidth: 720, alignSelf: 'center' }}>
      <CauseHead cause={cause} gutters={gutter.phone} />
      <StrengthMat cause={cause} gutters={gutter.phone} />
      <View style={{ paddingHorizontal: gutter.phone, paddingBottom: space(8) }}>
        <CauseLooks cause={cause} />
        <CauseRemedies cause={cause} />
        <CauseDrivers cause={cause} />
        <CauseModel cause={cause} />
        <CauseRecord cause={cause} />
      </View>
    </View>
  );
}

function CauseWide({ cause }: { cause: CatalogueEntry }) {
  const { colours } = useTheme();
  return (
    <View style={{ flexDirection: 'row', flexGrow: 1 }}>
      <View style={{ flex: 1, minWidth: 0, paddingBottom: space(8) }}>
        <CauseHead cause={cause} gutters={gutter.wide} />
        <StrengthMat cause={cause} gutters={gutter.wide} />
        <View style={{ paddingHorizontal: gutter.wide, maxWidth: 960 }}>
          <CauseRemedies cause={cause} />
          <CauseModel cause={cause} />
        </View>
      </View>
      <View
        style={{ width: 400, paddingHorizontal: gutter.wide, paddingBottom: space(8), borderLeftWidth: 1, borderLeftColor: colours.rule }}
      >
        <CauseLooks cause={cause} />
        <CauseDrivers cause={cause} />
        <CauseRecord cause={cause} />
      </View>
    </View>
  );
}

function NotThere() {
  return (
    <View style={{ padding: gutter.phone }}>
      <EmptyState text="There is no such cause in the catalogue." action={<LinkText label="to the causes" href="/causes" />} />
    </View>
  );
}

export function CauseScreen({ causeId }: { causeId: string }) {
  const { data, error, refetch } = useCatalogue();
  const [offering, setOffering] = useState(false);
  const wide = useLayout() === 'wide';
  const cause = data?.find(({ id }) => id === causeId);
  const tryIt = <Button label="try it on the bench" kind="first" grow={!wide} onPress={() => setOffering(true)} />;
  const screenOnly = { dataSet: { screenOnly: 'true' } };
  return (
    <PrintPage>
      <Screen
        title={cause?.title ?? 'Cause'}
        head={
          <View {...screenOnly} style={wide ? { paddingVertical: space(2), paddingRight: gutter.wide - 4 } : null}>
            <BarHead
              back="/causes"
              backLabel="to the causes"
              title={cause ? `causes · ${stageWords[cause.stage]}` : 'causes'}
              faint
              end={
                cause ? (
                  <View style={{ flexDirection: 'row', gap: space(2) }}>
                    <Button label="print" kind="plain" onPress={() => window.print()} />
                    {wide ? tryIt : null}
                  </View>
                ) : null
              }
            />
          </View>
        }
        actions={
          cause && !wide ? (
            <View {...screenOnly}>
              <ActionBar>{tryIt}</ActionBar>
            </View>
          ) : null
        }
      >
        {error && !data ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
        {!data && !error ? <LoadingWarp what="fetching the catalogue" picture={96} /> : null}
        {cause ? wide ? <CauseWide cause={cause} /> : <CausePhone cause={cause} /> : null}
        {data && !cause ? <NotThere /> : null}
        {offering && cause ? <BenchOffer cause={cause} onClose={() => setOffering(false)} /> : null}
      </Screen>
    </PrintPage>
  );
}
