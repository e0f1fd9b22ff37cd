/** A scanner's page: its inbox, and beside it what it is and how it sends. On a phone one below the other. */
import { View } from 'react-native';
import { useScanners } from '@/components/api/registry';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkText } from '@/components/ui/link-text';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { PageHead } from '@/components/ui/page-head';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import type { Scanner } from '@/server/contract/registry';
import { FactLine } from './fact-line';
import { Inbox } from './inbox';
import { PushPanel } from './push-panel';

export function ScannerScreen({ scannerId }: { scannerId: string }) {
  const wide = useLayout() === 'wide';
  const { data, error, refetch } = useScanners();
  const scanner = data?.find(({ id }) => id === scannerId);
  const title = scanner?.name ?? 'Scanner';
  const newCase = { pathname: '/cases/new', params: { scanner: scannerId } } as const;
  return (
    <Screen
      title={title}
      head={
        <PageHead title={title} end={wide ? <Button label="new case here" kind="first" glyph="plus" href={newCase} /> : null}>
          {scanner ? (
            <Text variant="small" tone="inkSoft">
              {scanner.room}
            </Text>
          ) : null}
        </PageHead>
      }
    >
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {!data && !error ? <LoadingWarp what="fetching the scanner" /> : null}
      {data && !scanner ? (
        <View style={{ padding: gutter.phone }}>
          <EmptyState text="There is no such scanner." action={<LinkText label="all scanners" href="/scanners" />} />
        </View>
      ) : null}
      {scanner ? <ScannerBody scanner={scanner} wide={wide} /> : null}
    </Screen>
  );
}

function ScannerBody({ scanner, wide }: { scanner: Scanner; wide: boolean }) {
  const { colours } = useTheme();
  const side = wide ? gutter.wide : gutter.phone;
  return (
    <View style={{ flexDirection: wide ? 'row' : 'column', borderTopWidth: 1, borderTopColor: colours.rule, flexGrow: 1 }}>
      <View style={{ padding: side, ...(wide ? { flex: 1 } : {}) }}>
        <Inbox scanner={scanner} />
      </View>
      <View
        style={{
          ...{ padding: side, gap: space(5) },
          ...(wide ? { width: 412, borderLeftWidth: 1 } : { borderTopWidth: 1 }),
          borderColor: colours.rule,
        }}
      >
        <View>
          <FactLine name="field" value={`${scanner.fieldStrengthTesla} T`} />
          <FactLine name="made by" value={[scanner.manufacturer, scanner.model].filter(Boolean).join(' ')} />
          <FactLine name="serial" value={scanner.serial} />
          <FactLine name="software" value={scanner.softwareVersion} />
          <FactLine name="open cases" value={String(scanner.openCases)} />
        </View>
        <PushPanel scannerId={scanner.id} />
      </View>
    </View>
  );
}
