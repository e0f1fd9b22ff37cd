/** A field for sentences that asks when something in it looks like a patient's name, date or number. */
import { useState } from 'react';
import { TextField, type TextFieldProps } from '@/components/ui/text-field';
import { suspicionOf } from './suspicion';

export function ProseField(props: Omit<TextFieldProps, 'question' | 'prose'>) {
  const [kept, setKept] = useState<string | null>(null);
  const suspicion = suspicionOf(props.value);
  const asked = suspicion !== undefined && kept !== props.value;
  return <TextField {...props} prose question={asked ? { text: suspicion, onKeep: () => setKept(props.value) } : undefined} />;
}
