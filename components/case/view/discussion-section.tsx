/** The discussion of a case and the note that is being written into it. */
import { useState } from 'react';
import { View } from 'react-native';
import { useAddComment, useComments } from '@/components/api/comments';
import { Button } from '@/components/ui/button';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { dayOf } from '../age';
import { ProseField } from '../new/prose-field';
import { roleWords } from '../words';
import { Section } from './section';

interface DiscussionSectionProps {
  caseId: string;
  openedAt: string;
  /** A closed case takes no more notes. */
  open: boolean;
}

function NoteForm({ caseId }: { caseId: string }) {
  const [text, setText] = useState('');
  const add = useAddComment(caseId);
  const save = (): void => add.mutate(text.trim(), { onSuccess: () => setText('') });
  return (
    <View style={{ gap: space(2), paddingTop: space(3) }}>
      <ProseField
        label="a note"
        value={text}
        onChange={setText}
        lines={2}
        error={add.error?.message}
        maxLength={4000}
        placeholder="what you saw, what you will try"
      />
      <View style={{ alignItems: 'flex-end' }}>
        <Button label="write it down" busy={add.isPending} disabled={text.trim() === ''} onPress={save} />
      </View>
    </View>
  );
}

export function DiscussionSection({ caseId, openedAt, open }: DiscussionSectionProps) {
  const { data, error, refetch } = useComments(caseId);
  return (
    <Section title="Discussion">
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {!data && !error ? <LoadingWarp what="fetching the discussion" rows={2} picture={0} /> : null}
      {data?.map((comment) => (
        <View key={comment.id} style={{ paddingBottom: space(3) }}>
          <Text variant="small" tone="inkFaint">
            {comment.author.name}, {roleWords[comment.author.role]} · {dayOf(comment.createdAt, openedAt)}
          </Text>
          <Text variant="detail">{comment.text}</Text>
        </View>
      ))}
      {data?.length === 0 && !open ? (
        <Text variant="detail" tone="inkSoft">
          Nothing was written.
        </Text>
      ) : null}
      {open ? <NoteForm caseId={caseId} /> : null}
    </Section>
  );
}
