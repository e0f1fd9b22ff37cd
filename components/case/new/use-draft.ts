/** The draft as a form: every change is kept in this browser at once. */
import { useState } from 'react';
import { useForm, useWatch, type Path, type PathValue } from 'react-hook-form';
import { emptyDraft, forgetDraft, keepDraft, readDraft, type Draft } from './draft';

export function useDraft(memberId: string, first: Partial<Draft>) {
  const [restored] = useState(() => readDraft(window.localStorage, memberId));
  const [keptAt, setKeptAt] = useState(restored?.keptAt ?? null);
  const form = useForm<Draft>({ defaultValues: { ...emptyDraft, ...first, ...restored?.draft } });
  const draft = useWatch({ control: form.control }) as Draft;
  const keep = (): void => {
    const at = Date.now();
    keepDraft(window.localStorage, memberId, form.getValues(), at);
    setKeptAt(at);
  };
  return {
    draft,
    keptAt,
    restored: restored !== null,
    errors: form.formState.errors,
    setError: form.setError,
    change: <Name extends Path<Draft>>(name: Name, value: PathValue<Draft, Name>): void => {
      form.setValue(name, value);
      form.clearErrors(name);
      keep();
    },
    /** The value at the moment of the call: an upload that ends late must not undo what was changed meanwhile. */
    current: () => form.getValues(),
    forget: (): void => {
      forgetDraft(window.localStorage, memberId);
      form.reset(emptyDraft);
      setKeptAt(null);
    },
  };
}
export type DraftForm = ReturnType<typeof useDraft>;
