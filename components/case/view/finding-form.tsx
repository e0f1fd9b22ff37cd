/** Writing the finding. A finding that names no cause says 'not found', and then nothing but that is how sure it is. */
import { Controller, useForm, useWatch } from 'react-hook-form';
import { View } from 'react-native';
import { ApiProblem } from '@/components/api/api-problem';
import { useWriteFinding } from '@/components/api/cases';
import { useCauses } from '@/components/api/catalogue';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { space } from '@/components/ui/theme';
import type { Case, Finding } from '@/server/contract/cases';
import { ProseField } from '../new/prose-field';
import { confidenceWords, optionsOf } from '../words';

interface FindingFormProps {
  found: Case;
  onDone: () => void;
}

const notFound = { id: '', label: 'not found' };
const isName = (name: unknown): name is keyof Finding => name === 'cause' || name === 'confidence' || name === 'text' || name === 'lesson';

export function FindingForm({ found, onDone }: FindingFormProps) {
  const causes = useCauses();
  const write = useWriteFinding(found.id);
  const { finding } = found;
  const { control, handleSubmit, setError, setValue } = useForm<Finding>({
    defaultValues: {
      cause: finding?.cause ?? null,
      confidence: finding?.confidence ?? 'not-found',
      text: finding?.text ?? '',
      lesson: finding?.lesson ?? '',
    },
  });
  const cause = useWatch({ control, name: 'cause' });
  const submit = handleSubmit((values) =>
    write.mutate(values, {
      onSuccess: onDone,
      onError: (error) => {
        if (!(error instanceof ApiProblem)) return;
        for (const issue of error.issues) {
          const name = issue.path.find(isName);
          if (name) setError(name, { message: issue.message });
        }
      },
    }),
  );
  const chooseCause = (id: string): void => {
    setValue('cause', id || null);
    setValue('confidence', id ? 'consistent' : 'not-found');
  };
  const sure = optionsOf(confidenceWords).filter(({ value }) => (cause === null) === (value === 'not-found'));
  return (
    <View role="form" aria-label="finding" style={{ gap: space(4) }}>
      <Select
        label="cause"
        value={cause ?? ''}
        rows={[notFound, ...(causes.data ?? []).map(({ id, title, stage }) => ({ id, label: title, aside: stage }))]}
        onChange={chooseCause}
      />
      <Controller
        control={control}
        name="confidence"
        render={({ field }) => <Choice label="How sure" columns={2} options={sure} value={field.value} onChange={field.onChange} />}
      />
      <Controller
        control={control}
        name="text"
        rules={{ validate: (text) => text.trim() !== '' || 'Say what was found, in a sentence.' }}
        render={({ field, fieldState }) => (
          <ProseField
            label="the finding"
            lines={4}
            value={field.value}
            onChange={field.onChange}
            error={fieldState.error?.message}
            maxLength={4000}
          />
        )}
      />
      <Controller
        control={control}
        name="lesson"
        render={({ field, fieldState }) => (
          <ProseField
            label="lesson for the team"
            lines={2}
            value={field.value ?? ''}
            onChange={field.onChange}
            error={fieldState.error?.message}
            maxLength={2000}
          />
        )}
      />
      {write.error ? <Notice kind="failed" text={write.error.message} /> : null}
      <View style={{ flexDirection: 'row', gap: space(2), justifyContent: 'flex-end' }}>
        <Button label="not now" kind="plain" onPress={onDone} />
        <Button label="write the finding" busy={write.isPending} onPress={() => void submit()} />
      </View>
    </View>
  );
}
