/** Taking a step with a case: some go at once, some ask first, two lead to other screens. */
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { useMoveCase } from '@/components/api/cases';
import type { ActionId } from './case-actions';

export type AskedStep = 'assign' | 'return' | 'reopen';

export function useCaseSteps(caseId: string) {
  const router = useRouter();
  const move = useMoveCase(caseId);
  const [asked, setAsked] = useState<AskedStep | null>(null);
  const take = (id: ActionId): void => {
    move.reset();
    if (id === 'bench') router.push({ pathname: '/cases/[caseId]/bench', params: { caseId } });
    else if (id === 'sign-off') router.push({ pathname: '/cases/[caseId]/sign-off', params: { caseId } });
    else if (id === 'investigate' || id === 'ask-for-sign-off') move.mutate({ action: id });
    else setAsked(id);
  };
  return { take, move, asked, close: () => setAsked(null) };
}
