/** The scanners of the department: each with its coils and how many cases are open on it. */
import { ScrollView, View } from 'react-native';
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

function ScannerPart({ scanner }: { scanner: Scanner }) {
  const { colours } = useTheme();
  const facts = [scanner.room, `${scanner.fieldStrengthTesla} T`, scanner.softwareVersion && `software ${scanner.softwareVersion}`]
    .filter(Boolean)
    .join(' · ');
  const maker = [scanner.manufacturer, scanner.model, scanner.serial && `serial ${scanner.serial}`].filter(Boolean).join(' · ');
  const open = scanner.openCases === 1 ? '1 open case' : `${scanner.openCases} open cases`;
  return (
    <View role="region" aria-label={scanner.name} style={{ flexGrow: 1, flexBasis: 340, maxWidth: 560, paddingTop: space(5) }}>
      <Text variant="title" level={2}>
        {scanner.name}
      </Text>
      <Text variant="small" tone="inkSoft">
        {facts}
      </Text>
      <Text variant="small" tone="inkFaint">
        {maker}
      </Text>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(5) }}>
        {scanner.openCases > 0 ? (
          <LinkText label={open} name={`${open} on ${scanner.name}`} href={{ pathname: '/cases', params: { scanner: scanner.id } }} />
        ) : (
          <Text variant="small" tone="inkFaint" style={{ lineHeight: 44 }}>
            no open case
          </Text>
        )}
        <LinkText
          label="new case here"
          name={`new case on ${scanner.name}`}
          href={{ pathname: '/cases/new', params: { scanner: scanner.id } }}
        />
        <LinkText
          label="inbox"
          name={`inbox of ${scanner.name}`}
          href={{ pathname: '/scanners/[scannerId]', params: { scannerId: scanner.id } }}
        />
      </View>
      <View role="table" aria-label={`coils of ${scanner.name}`}>
        <View
          role="row"
          style={{ flexDirection: 'row', height: 28, alignItems: 'center', borderBottomWidth: 1, borderBottomColor: colours.ruleStrong }}
        >
          {(['coil', 'serial', 'elements'] as const).map((head) => (
            <Text
              key={head}
              role="columnheader"
              variant="small"
              tone="inkSoft"
              style={{ flex: 1, textAlign: head === 'elements' ? 'right' : 'left' }}
            >
              {head}
            </Text>
          ))}
        </View>
        {scanner.coils.map((coil) => (
          <View
            role="row"
            key={coil.id}
            style={{ flexDirection: 'row', minHeight: 44, alignItems: 'center', borderBottomWidth: 1, borderBottomColor: colours.rule }}
          >
            <Text role="cell" variant="mono" style={{ flex: 1 }}>
              {coil.name}
            </Text>
            <Text role="cell" variant="mono" tone="inkFaint" style={{ flex: 1 }}>
              {coil.serial}
            </Text>
            <Text role="cell" variant="mono" style={{ flex: 1, textAlign: 'right' }}>
              {coil.elements}
            </Text>
          </View>
        ))}
      </View>
    </View>
  );
}

export function ScannersScreen() {
  const wide = useLayout() === 'wide';
  const { data, error, refetch } = useScanners();
  return (
    <Screen
      title="Scanners"
      still
      head={<PageHead title="Scanners" end={wide ? <Button label="new case" kind="first" glyph="plus" href="/cases/new" /> : null} />}
    >
      <ScrollView style={{ flex: 1 }}>
        {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
        {!data && !error ? <LoadingWarp what="fetching the scanners" /> : null}
        <View
          style={{
            flexDirection: 'row',
            flexWrap: 'wrap',
            columnGap: space(10),
            paddingHorizontal: wide ? gutter.wide : gutter.phone,
            paddingBottom: space(8),
          }}
        >
          {data?.map((scanner) => (
            <ScannerPart key={scanner.id} scanner={scanner} />
          ))}
        </View>
        {data?.length === 0 ? (
          <View style={{ padding: gutter.phone }}>
            <EmptyState text="No scanner is registered." />
          </View>
        ) : null}
      </ScrollView>
    </Screen>
  );
}
