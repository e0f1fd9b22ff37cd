/** The summary, and the form that changes it. */
import { useState } from 'react';
import { LinkText } from '@/components/ui/link-text';
import type { Case } from '@/server/contract/cases';
import { EditForm } from './edit-form';
import { Section } from './section';
import { SummarySection } from './summary-section';

export function EditableSummary({ found }: { found: Case }) {
  const [editing, setEditing] = useState(false);
  if (editing) {
    return (
      <Section title="Summary">
        <EditForm found={found} onDone={() => setEditing(false)} />
      </Section>
    );
  }
  return (
    <SummarySection
      found={found}
      aside={found.may.edit ? <LinkText label="change" name="change the summary" onPress={() => setEditing(true)} /> : null}
    />
  );
}
