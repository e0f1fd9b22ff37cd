/** The parts of a cause's page: how it looks and how it is modelled; what can be done about it. */
import { View } from 'react-native';
import { Badge } from '@/components/ui/badge';
import { withMinus } from '@/components/ui/number-text';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { Section } from '../case/view/section';
import { CauseLine } from './cause-line';
import { ClosedCases } from './closed-cases';
import { Deference } from './deference';
import { Formula } from './formula';
import { RemedyList } from './remedy-list';
import { SourceList } from './source-list';

const rangeOf = (parameter: CatalogueEntry['parameters'][number]): string =>
  'options' in parameter
    ? parameter.options.map(({ label }) => label).join(', ')
    : `${withMinus(String(parameter.min))} to ${withMinus(String(parameter.max))} ${parameter.unit}`.trim();

/** What it looks like, what drives it, the model. */
export function CauseModel({ cause }: { cause: CatalogueEntry }) {
  return (
    <>
      <Section title="Looks like">
        <CauseLine name="image">{cause.looks.image}</CauseLine>
        <CauseLine name="k-space">{cause.looks.kspace}</CauseLine>
      </Section>
      {cause.drivers.length > 0 ? (
        <Section title="Driven by">
          {cause.drivers.map(({ fact, does }) => (
            <CauseLine key={fact} name={fact}>
              {does}
            </CauseLine>
          ))}
        </Section>
      ) : null}
      <Section title="Model">
        <Formula tex={cause.formula} />
        {cause.parameters.map((parameter) => (
          <CauseLine key={parameter.id} name={parameter.label}>
            {rangeOf(parameter)}
          </CauseLine>
        ))}
        {cause.needsObjectPhase ? (
          <View style={{ paddingTop: space(3), gap: space(1) }}>
            <Badge glyph="waits" word="needs the phase of the object" small stitched tone="inkSoft" />
            <Text variant="detail" tone="inkSoft">
              Without one the model looks better than it is; the bench and the swatch start it with a smooth synthetic phase.
            </Text>
          </View>
        ) : null}
      </Section>
    </>
  );
}

/** What can be changed, by whom; where it is published; where it was found. */
export function CauseRemedies({ cause }: { cause: CatalogueEntry }) {
  const atHand = cause.remedies.filter(({ who }) => who === 'technologist');
  const others = cause.remedies.filter(({ who }) => who !== 'technologist');
  return (
    <>
      {atHand.length > 0 ? (
        <Section title="What I can change now">
          <RemedyList remedies={atHand} />
        </Section>
      ) : null}
      {others.length > 0 ? (
        <Section title="Needs a physicist or service">
          <RemedyList remedies={others} />
        </Section>
      ) : null}
      <Deference />
      <Section title="Closed cases with it">
        <ClosedCases causeId={cause.id} />
      </Section>
      <Section title="Sources">
        <SourceList sources={cause.sources} />
      </Section>
    </>
  );
}
