/** One cause: what it looks like, what drives it, what can be changed now, what needs service, and where it is published. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useCauses } from '@/components/api/catalogue';
import { BarHead } from '@/components/ui/bar-head';
import { Badge } from '@/components/ui/badge';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkText } from '@/components/ui/link-text';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Cause } from '@/server/contract/catalogue';
import { Section } from '../case/view/section';
import { Deference } from './deference';
import { RemedyList } from './remedy-list';
import { SourceList } from './source-list';
import { stageWords } from './stage-words';

function Line({ name, children }: { name: string; children: ReactNode }) {
  const { colours } = useTheme();
  return (
    <View
      style={{ flexDirection: 'row', alignItems: 'baseline', paddingVertical: 6, borderBottomWidth: 1, borderBottomColor: colours.rule }}
    >
      <Text variant="small" tone="inkFaint" style={{ width: 100, paddingRight: space(3) }}>
        {name}
      </Text>
      <Text variant="detail" style={{ flex: 1 }}>
        {children}
      </Text>
    </View>
  );
}

const runsAlongWords: Record<Cause['runsAlong'], string> = {
  'phase-encode': 'the phase encoding',
  readout: 'the readout',
  both: 'both directions',
  none: 'neither direction',
};

const rangeOf = (parameter: Cause['parameters'][number]): string =>
  'options' in parameter
    ? parameter.options.map(({ label }) => label).join(', ')
    : `${parameter.min} to ${parameter.max} ${parameter.unit}${parameter.fromHeader ? `, from ${parameter.fromHeader}` : ''}`.replace(
        '-',
        '−',
      );

function CauseBody({ cause }: { cause: Cause }) {
  const atHand = cause.remedies.filter(({ who }) => who !== 'licensed service');
  const service = cause.remedies.filter(({ who }) => who === 'licensed service');
  return (
    <View style={{ width: '100%', maxWidth: 720, paddingHorizontal: gutter.phone, paddingBottom: space(8) }}>
      <Text variant="title" level={1}>
        {cause.title}
      </Text>
      <Section title="Looks like">
        <Line name="image">{cause.looks.image}</Line>
        <Line name="k-space">{cause.looks.kspace}</Line>
        <Line name="runs along">{runsAlongWords[cause.runsAlong]}</Line>
      </Section>
      {atHand.length > 0 ? (
        <Section title="What can be changed now">
          <RemedyList remedies={atHand} />
        </Section>
      ) : null}
      {service.length > 0 ? (
        <Section title="Needs service">
          <RemedyList remedies={service} />
        </Section>
      ) : null}
      <Deference />
      {cause.drivers.length > 0 ? (
        <Section title="Driven by">
          {cause.drivers.map(({ fact, does }) => (
            <Line key={fact} name={fact.toLowerCase()}>
              {does}
            </Line>
          ))}
        </Section>
      ) : null}
      <Section title="Parameters of the model">
        {cause.parameters.map((parameter) => (
          <Line key={parameter.id} name={parameter.label.toLowerCase()}>
            {rangeOf(parameter)}
          </Line>
        ))}
        {cause.needsObjectPhase ? (
          <View style={{ paddingTop: space(2) }}>
            <Badge glyph="waits" word="needs the phase of the object" small stitched tone="inkSoft" />
            <Text variant="detail" tone="inkSoft">
              Without one the model looks better than it is; the bench starts it with a smooth synthetic phase and shows it.
            </Text>
          </View>
        ) : null}
      </Section>
      <Section title="Sources">
        <SourceList sources={cause.sources} />
      </Section>
    </View>
  );
}

export function CauseScreen({ causeId }: { causeId: string }) {
  const { data, error, refetch } = useCauses();
  const cause = data?.find(({ id }) => id === causeId);
  return (
    <Screen
      title={cause?.title ?? 'Cause'}
      head={<BarHead back="/causes" backLabel="to the causes" title={cause ? `causes · ${stageWords[cause.stage]}` : 'causes'} faint />}
    >
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {!data && !error ? <LoadingWarp what="fetching the catalogue" /> : null}
      {cause ? <CauseBody cause={cause} /> : null}
      {data && !cause ? (
        <View style={{ padding: gutter.phone }}>
          <EmptyState text="There is no such cause in the catalogue." action={<LinkText label="to the causes" href="/causes" />} />
        </View>
      ) : null}
    </Screen>
  );
}
