/** The parts of a page of the catalogue: how it looks, what drives it, what can be done about it, how it is modelled, where it is published. */
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
import { priceLegend } from './price-words';
import { RemedyList } from './remedy-list';
import { SourceList } from './source-list';

type Parameter = CatalogueEntry['parameters'][number];

const rangeOf = (parameter: Parameter): string =>
  'options' in parameter
    ? parameter.options.map(({ label }) => label).join(', ')
    : `${withMinus(String(parameter.min))} to ${withMinus(String(parameter.max))} ${parameter.unit}`.trim();

/** The choices for which a parameter matters, in their own words. */
const onlyWith = ({ when = {} }: Parameter, parameters: readonly Parameter[]): string =>
  Object.entries(when)
    .flatMap(([id, values]) => {
      const choice = parameters.find((parameter) => parameter.id === id);
      if (!choice || !('options' in choice)) return [];
      const options = choice.options.filter(({ value }) => values.includes(value)).map(({ label }) => label);
      return [`${choice.label.toLowerCase()}: ${options.join(' or ')}`];
    })
    .join(' · ');

interface PartProps {
  cause: CatalogueEntry;
}

/** What it looks like in both domains. */
export function CauseLooks({ cause }: PartProps) {
  return (
    <Section title="Looks like">
      <CauseLine name="image">{cause.looks.image}</CauseLine>
      <CauseLine name="k-space">{cause.looks.kspace}</CauseLine>
    </Section>
  );
}

/** The scan facts that drive it. */
export function CauseDrivers({ cause }: PartProps) {
  if (cause.drivers.length === 0) return null;
  return (
    <Section title="Driven by">
      {cause.drivers.map(({ fact, does }) => (
        <CauseLine key={fact} name={fact}>
          {does}
        </CauseLine>
      ))}
    </Section>
  );
}

/** The formula, the parameters with their ranges, what is assumed. */
export function CauseModel({ cause }: PartProps) {
  return (
    <Section title="Model">
      <Formula tex={cause.formula} />
      {cause.parameters.map((parameter) => (
        <CauseLine key={parameter.id} name={parameter.label}>
          {rangeOf(parameter)}
          {parameter.when ? (
            <Text variant="detail" tone="inkFaint">
              {` · ${onlyWith(parameter, cause.parameters)}`}
            </Text>
          ) : null}
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
  );
}

/** What can be changed, by whom, at what price. */
export function CauseRemedies({ cause }: PartProps) {
  const atHand = cause.remedies.filter(({ who }) => who === 'technologist');
  const others = cause.remedies.filter(({ who }) => who !== 'technologist');
  return (
    <>
      {atHand.length > 0 ? (
        <Section title="What I can change now">
          <RemedyList name="what I can change now" remedies={atHand} />
        </Section>
      ) : null}
      {others.length > 0 ? (
        <Section title="Needs a physicist or licensed service">
          <RemedyList name="needs a physicist or licensed service" remedies={others} />
        </Section>
      ) : null}
      <Text variant="small" tone="inkFaint" style={{ paddingTop: space(2) }}>
        {priceLegend}
      </Text>
      <Deference />
    </>
  );
}

/** Where it was found, and where it is published. */
export function CauseRecord({ cause }: PartProps) {
  return (
    <>
      <Section title="Closed cases with it">
        <ClosedCases causeId={cause.id} />
      </Section>
      <Section title="Sources">
        <SourceList sources={cause.sources} />
      </Section>
    </>
  );
}
