/** The form of a signature: which lines stand, how sure, the lesson, and the number that is typed to confirm. */
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { useMoveCase } from '@/components/api/cases';
import type { Case, Finding } from '@/server/contract/cases';
import { numberFault, type AttestLine } from './attest-lines';

export function useSignOff(found: Case, lines: readonly AttestLine[]) {
  const router = useRouter();
  const move = useMoveCase(found.id);
  const [standing, setStanding] = useState<ReadonlySet<string>>(new Set());
  const [confidence, setConfidence] = useState<Finding['confidence']>(found.finding?.confidence ?? 'not-found');
  const [lesson, setLesson] = useState(found.finding?.lesson ?? '');
  const [number, setNumber] = useState('');
  const fault = numberFault(number, found.number);
  return {
    standing,
    toggle: (line: string, stands: boolean): void =>
      setStanding((before) => new Set(stands ? [...before, line] : [...before].filter((other) => other !== line))),
    confidence,
    setConfidence,
    lesson,
    setLesson,
    number,
    setNumber,
    fault,
    error: move.error,
    busy: move.isPending,
    sign: (): void => {
      if (fault !== null || move.isPending) return;
      move.mutate(
        {
          action: 'sign-off',
          caseNumber: found.number,
          confidence,
          lesson,
          attested: lines.map(({ line }) => ({ line, stands: standing.has(line) })),
        },
        { onSuccess: () => router.replace({ pathname: '/cases/[caseId]', params: { caseId: found.id } }) },
      );
    },
  };
}
export type SignOffForm = ReturnType<typeof useSignOff>;
