/** The question before a step: to whom a case is assigned, or why it is returned or reopened. */
import { useState } from 'react';
import { View } from 'react-native';
import { ApiProblem } from '@/components/api/api-problem';
import type { useMoveCase } from '@/components/api/cases';
import { useMembers } from '@/components/api/registry';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { Dialog } from '@/components/ui/dialog';
import { Notice } from '@/components/ui/notice';
import { ProblemNotice } from '@/components/ui/problem-notice';
import type { Case } from '@/server/contract/cases';
import { ProseField } from '../new/prose-field';
import { caseNumber, roleWords } from '../words';
import type { AskedStep } from './use-case-steps';

interface StepDialogProps {
  found: Case;
  step: AskedStep;
  move: ReturnType<typeof useMoveCase>;
  onClose: () => void;
}

const reasons: Record<Exclude<AskedStep, 'assign'>, { verb: string; stay: string; text: string }> = {
  return: { verb: 'return', stay: 'keep it here', text: 'It goes back under investigation. Say what is missing.' },
  reopen: { verb: 'reopen', stay: 'leave it closed', text: 'It was signed. The signature stays in the trail.' },
};

function ReasonDialog({ found, step, move, onClose }: StepDialogProps & { step: Exclude<AskedStep, 'assign'> }) {
  const [reason, setReason] = useState('');
  const { verb, stay, text } = reasons[step];
  const atField = move.error instanceof ApiProblem ? move.error.issueAt('reason') : undefined;
  const capital = verb.charAt(0).toUpperCase() + verb.slice(1);
  return (
    <Dialog
      title={`${capital} case ${caseNumber(found.number)}?`}
      text={text}
      onClose={onClose}
      actions={
        <>
          <Button label={stay} onPress={onClose} />
          <Button
            label={verb}
            kind="first"
            grow
            disabled={reason.trim() === ''}
            busy={move.isPending}
            onPress={() => move.mutate({ action: step, reason: reason.trim() }, { onSuccess: onClose })}
          />
        </>
      }
    >
      <ProseField label="reason" value={reason} onChange={setReason} lines={2} error={atField} autoFocus maxLength={1000} />
      {move.error && !atField ? <Notice kind="failed" text={move.error.message} /> : null}
    </Dialog>
  );
}

function AssignDialog({ found, move, onClose }: StepDialogProps) {
  const members = useMembers();
  const [memberId, setMemberId] = useState(found.assignee?.id ?? null);
  const options = (members.data ?? []).map(({ id, name, role }) => ({ value: id, label: `${name}, ${roleWords[role]}` }));
  return (
    <Dialog
      title={`Assign case ${caseNumber(found.number)}`}
      text={found.state === 'reported' ? 'It then is under investigation.' : 'It stays in its state.'}
      onClose={onClose}
      actions={
        <>
          <Button label="not now" onPress={onClose} />
          <Button
            label="assign"
            kind="first"
            grow
            disabled={memberId === null}
            busy={move.isPending}
            onPress={() => {
              if (memberId !== null) move.mutate({ action: 'assign', memberId }, { onSuccess: onClose });
            }}
          />
        </>
      }
    >
      {members.error ? <ProblemNotice error={members.error} onRetry={() => void members.refetch()} /> : null}
      <View>
        <Choice label="to" options={options} value={memberId} onChange={setMemberId} />
      </View>
      {move.error ? <Notice kind="failed" text={move.error.message} /> : null}
    </Dialog>
  );
}

export function StepDialog(props: StepDialogProps) {
  const { step } = props;
  return step === 'assign' ? <AssignDialog {...props} /> : <ReasonDialog {...props} step={step} />;
}
