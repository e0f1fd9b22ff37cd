/** A text that looks like a patient's is asked about before it is sent, and the answer decides whether it is. */
import { act, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { ApiProblem } from '@/components/api/api-problem';
import { callWithText, keepText } from '@/components/api/text-question';
import { TextQuestionDialog } from '@/components/team/text-question-dialog';
import { addComment, type Comment } from '@/server/contract/case-parts';
import { answerWith } from '../network';
import { show } from '../stage';

const id = '11111111-1111-4111-8111-111111111111';
const saved: Comment = { id, text: '', author: { id, name: 'R', role: 'technologist' }, createdAt: '2026-12-01T12:00:00Z' };

function write(text: string) {
  const asked = answerWith(() => ({ status: 201, json: saved }));
  show(<TextQuestionDialog />);
  const outcome: { error?: unknown; done: boolean } = { done: false };
  const send = () =>
    callWithText(addComment, { params: { caseId: id }, body: { text } }).then(
      () => void (outcome.done = true),
      (error: unknown) => void (outcome.error = error),
    );
  let sending = Promise.resolve();
  act(() => void (sending = send()));
  return { asked, outcome, sending };
}

it('an ordinary text is sent at once', async () => {
  const { asked, sending } = write('The patient moved');
  await act(async () => sending);
  expect(asked.map(({ body }) => body)).toEqual([{ text: 'The patient moved' }]);
});

it('one that looks like a name is sent, and said to be confirmed, when it is kept', async () => {
  const { asked, outcome, sending } = write('Mrs Hale moved');
  expect(await screen.findByText('Is this a name? Say “the patient”.')).toBeTruthy();
  expect(asked).toEqual([]);
  await userEvent.click(screen.getByRole('button', { name: 'keep it' }));
  await act(async () => sending);
  expect(outcome.done).toBe(true);
  expect(asked.map(({ body }) => body)).toEqual([{ text: 'Mrs Hale moved', confirmedText: true }]);
});

it('is not sent when it is to be changed; the question stands at its field', async () => {
  const { asked, outcome, sending } = write('Mrs Gale moved');
  await userEvent.click(await screen.findByRole('button', { name: 'change it' }));
  await act(async () => sending);
  expect(asked).toEqual([]);
  expect(outcome.error instanceof ApiProblem && outcome.error.issueAt('text')).toMatch(/name/);
});

it('is not asked about again when it was kept at the field', async () => {
  keepText('born 1961-04-03');
  const { asked, sending } = write('born 1961-04-03');
  await act(async () => sending);
  expect(asked.map(({ body }) => body)).toEqual([{ text: 'born 1961-04-03', confirmedText: true }]);
});
