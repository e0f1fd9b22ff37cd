/** What the physicist stands by: the lines, how sure, the lesson. */
import { View } from 'react-native';
import { CheckBox } from '@/components/ui/check-box';
import { Choice } from '@/components/ui/choice';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { ProseField } from '../new/prose-field';
import { Section } from '../view/section';
import { confidenceWords, optionsOf } from '../words';
import type { AttestLine } from './attest-lines';
import type { SignOffForm } from './use-sign-off';

interface AttestPartProps {
  form: SignOffForm;
  lines: readonly AttestLine[];
  causeFound: boolean;
}

export function AttestPart({ form, lines, causeFound }: AttestPartProps) {
  const { colours } = useTheme();
  const sure = optionsOf(confidenceWords).filter(({ value }) => causeFound === (value !== 'not-found'));
  return (
    <View>
      <Section title="You attest">
        <Text tone="inkSoft" style={{ maxWidth: 560, paddingBottom: space(1) }}>
          Leave a line open if you cannot stand by it. What is left open is shown as open, on the case and wherever it is printed.
        </Text>
        {lines.map(({ line, restsOn }) => (
          <View key={line} style={{ borderBottomWidth: 1, borderBottomColor: colours.rule }}>
            <CheckBox label={line} note={restsOn} checked={form.standing.has(line)} onChange={(stands) => form.toggle(line, stands)} />
          </View>
        ))}
      </Section>
      <View style={{ paddingTop: space(5) }}>
        <Choice label="How sure" columns={2} options={sure} value={form.confidence} onChange={form.setConfidence} />
      </View>
      <View style={{ paddingTop: space(5) }}>
        <ProseField
          label="lesson for the team"
          lines={2}
          value={form.lesson}
          onChange={form.setLesson}
          maxLength={2000}
          placeholder="what to look at first, the next time"
        />
      </View>
    </View>
  );
}
