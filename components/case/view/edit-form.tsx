/** Changing what a case says. When somebody else changed it meanwhile, what was typed stays and what stands now is shown beside it. */
import { useState } from 'react';
import { Controller, useForm, useWatch, type Control } from 'react-hook-form';
import { View } from 'react-native';
import { ApiProblem, isConflict } from '@/components/api/api-problem';
import { useCase, useChangeCase } from '@/components/api/cases';
import { useScanners } from '@/components/api/registry';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { DayField } from '@/components/ui/day-field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { space } from '@/components/ui/theme';
import type { Case } from '@/server/contract/cases';
import { ProseField } from '../new/prose-field';
import { SightingChoice } from '../new/sighting-choice';
import { costWords, directionWords, frequencyWords, optionsOf } from '../words';
import { changeOf, contestedFields, draftOf, type CaseDraft } from './edit-conflict';

interface EditFormProps {
  found: Case;
  onDone: () => void;
}

type ProseName = 'title' | 'bodyRegion' | 'protocol' | 'tried' | 'description';
interface ProseProps {
  control: Control<CaseDraft>;
  name: ProseName;
  label: string;
  lines?: number;
  maxLength: number;
  /** What stands at the server now, where both sides changed it. */
  standing?: string | undefined;
}

function Prose({ control, name, label, lines = 1, maxLength, standing }: ProseProps) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <ProseField
          label={label}
          lines={lines}
          value={field.value}
          onChange={field.onChange}
          error={fieldState.error?.message}
          note={standing === undefined ? undefined : `now there: ${standing || 'nothing'}`}
          maxLength={maxLength}
        />
      )}
    />
  );
}

const isName = (start: CaseDraft, name: unknown): name is keyof CaseDraft => typeof name === 'string' && name in start;

export function EditForm({ found, onDone }: EditFormProps) {
  const scanners = useScanners();
  const { refetch } = useCase(found.id);
  const change = useChangeCase(found.id);
  const [start] = useState(() => draftOf(found));
  // The version that was read when the form opened. A newer one is taken only after its conflict was shown.
  const [version, setVersion] = useState(found.version);
  const { control, handleSubmit, setError, setValue } = useForm<CaseDraft>({ defaultValues: start });
  const typed = useWatch({ control }) as CaseDraft;
  const newest = draftOf(found);
  const contested = isConflict(change.error) ? contestedFields(start, typed, newest) : [];
  const standing = (name: ProseName): string | undefined => (contested.includes(name) ? newest[name] : undefined);
  const submit = handleSubmit((values) =>
    change.mutate(
      { ...changeOf(start, values), version },
      {
        onSuccess: onDone,
        onError: (error) => {
          if (isConflict(error)) void refetch().then(({ data }) => setVersion(data?.version ?? version));
          if (!(error instanceof ApiProblem)) return;
          for (const { path, message } of error.issues) {
            const name = path.find((part) => isName(start, part));
            if (isName(start, name)) setError(name, { message });
          }
        },
      },
    ),
  );
  const scanner = scanners.data?.find(({ id }) => id === typed.scannerId);
  const none = { id: '', label: 'not said' };
  return (
    <View role="form" aria-label="the case" style={{ gap: space(4), paddingBottom: space(4) }}>
      <Prose control={control} name="title" label="title" maxLength={160} standing={standing('title')} />
      <Select
        label="scanner"
        value={typed.scannerId}
        rows={[none, ...(scanners.data ?? []).map(({ id, name, room }) => ({ id, label: name, aside: room }))]}
        onChange={(id) => {
          setValue('scannerId', id);
          setValue('coilId', '');
        }}
      />
      <Select
        label="receive coil"
        value={typed.coilId}
        disabled={!scanner}
        rows={[none, ...(scanner?.coils ?? []).map(({ id, name, serial }) => ({ id, label: name, aside: serial }))]}
        onChange={(id) => setValue('coilId', id)}
      />
      <SightingChoice value={typed.seen} onChange={(seen) => setValue('seen', seen)} />
      <Choice
        label="Which way does it run?"
        columns={2}
        options={optionsOf(directionWords)}
        value={typed.direction}
        onChange={(value) => setValue('direction', value)}
      />
      <Choice
        label="How often?"
        columns={2}
        options={optionsOf(frequencyWords)}
        value={typed.howOften}
        onChange={(value) => setValue('howOften', value)}
      />
      <Choice
        label="What did it cost?"
        columns={2}
        options={optionsOf(costWords)}
        value={typed.cost}
        onChange={(value) => setValue('cost', value)}
      />
      <Prose control={control} name="bodyRegion" label="body region" maxLength={80} standing={standing('bodyRegion')} />
      <Prose control={control} name="protocol" label="sequence or protocol" maxLength={120} standing={standing('protocol')} />
      <Prose control={control} name="tried" label="what was tried" lines={3} maxLength={4000} standing={standing('tried')} />
      <Prose control={control} name="description" label="anything else" lines={3} maxLength={4000} standing={standing('description')} />
      <DayField label="seen on" value={typed.seenOn} onChange={(day) => setValue('seenOn', day)} />
      {change.error ? (
        <Notice
          kind="failed"
          text={
            isConflict(change.error)
              ? 'Not saved: somebody changed this case meanwhile. What you typed is still here; save again to keep it over what stands now.'
              : change.error.message
          }
        />
      ) : null}
      <View style={{ flexDirection: 'row', gap: space(2), justifyContent: 'flex-end' }}>
        <Button label="leave it" kind="plain" onPress={onDone} />
        <Button label="save the changes" busy={change.isPending} onPress={() => void submit()} />
      </View>
    </View>
  );
}
