/** What happens, and the case number typed to confirm. The locked button says what it waits for. */
import { View } from 'react-native';
import { ApiProblem } from '@/components/api/api-problem';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { TextField } from '@/components/ui/text-field';
import { space } from '@/components/ui/theme';
import { Section } from '../view/section';
import { Trail } from '../view/trail';
import type { SignOffForm } from './use-sign-off';

interface ConfirmPartProps {
  form: SignOffForm;
  /** Name and role of who signs. */
  signer: string;
  /** The signing button, where it stands beside the field. */
  button?: React.ReactNode;
}

export function ConfirmPart({ form, signer, button }: ConfirmPartProps) {
  const atNumber = form.error instanceof ApiProblem ? form.error.issueAt('caseNumber') : undefined;
  const wrong = form.fault !== null && !/more digit/.test(form.fault) ? form.fault : undefined;
  return (
    <View>
      <Section title="What happens">
        <Trail
          label="what happens"
          textFirst
          knots={[
            { id: 'now', glyph: 'awaiting-sign-off', text: 'awaiting sign-off', when: 'now' },
            {
              id: 'closed',
              glyph: 'closed',
              text: 'closed, signed by you',
              when: 'the finding can no longer be edited; reopening asks for a reason',
              coming: true,
            },
          ]}
        />
      </Section>
      <Section title="Confirm">
        <Text variant="detail" tone="inkSoft" style={{ paddingBottom: space(3) }}>
          You sign as {signer}: it is yours alone. Type the case number, so that nobody signs by a slip.
        </Text>
        <View style={{ flexDirection: 'row', gap: space(3), alignItems: 'flex-start' }}>
          <View style={button ? { width: 152 } : { flex: 1 }}>
            <TextField
              label="case number"
              value={form.number}
              onChange={form.setNumber}
              error={atNumber ?? wrong}
              note={form.fault ?? undefined}
              maxLength={8}
              input={{ inputMode: 'numeric', autoComplete: 'off', onSubmitEditing: form.sign }}
            />
          </View>
          {button ? <View style={{ flex: 1, paddingTop: 20 }}>{button}</View> : null}
        </View>
        <Text variant="small" tone="inkFaint" style={{ paddingTop: 10 }}>
          Kept with it: your name, the time, a digest of the case as you saw it.
        </Text>
        {form.error && !atNumber ? (
          <View style={{ paddingTop: space(3) }}>
            <Notice kind="failed" text={form.error.message} />
          </View>
        ) : null}
      </Section>
    </View>
  );
}
