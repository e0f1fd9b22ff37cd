/** A field for sentences that asks when something in it looks like a patient's name, date or number. */
import { useState } from 'react';
import { keepText } from '@/components/api/text-question';
import { TextField, type TextFieldProps } from '@/components/ui/text-field';
import { questionOf } from '@/server/contract/questioned-text';

export function ProseField(props: Omit<TextFieldProps, 'question' | 'prose'>) {
  const [kept, setKept] = useState<string | null>(null);
  const question = questionOf(props.value);
  const asked = question !== undefined && kept !== props.value;
  const keep = (): void => {
    setKept(props.value);
    keepText(props.value);
  };
  return <TextField {...props} prose question={asked ? { text: question, onKeep: keep } : undefined} />;
}
