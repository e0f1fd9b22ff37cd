/** Keys of the table: up and down choose a row, Enter opens it, b opens it on the bench, n files a new case. */
import { useRouter } from 'expo-router';
import { useEffect, useState } from 'react';

/** Whether a key belongs to what has the focus: a field, a control, a menu or a dialog. */
export function isTaken(target: EventTarget | null, key: string): boolean {
  if (!(target instanceof HTMLElement)) return false;
  if (target.closest('input, textarea, select, [role=dialog], [role=menu], [role=tablist], [role=radiogroup]')) return true;
  return key === 'Enter' && target.closest('a, button, [role=button]') !== null;
}

export const chosenAfter = (key: string, chosen: number, count: number): number | null => {
  if (count === 0) return null;
  if (key === 'ArrowDown') return Math.min(count - 1, chosen + 1);
  if (key === 'ArrowUp') return Math.max(0, chosen - 1);
  return null;
};

/** The index of the chosen row, −1 before the first key. */
export function useListKeys(ids: readonly string[], active: boolean): number {
  const router = useRouter();
  const [chosen, setChosen] = useState(-1);
  useEffect(() => {
    if (!active) return undefined;
    const onKey = (event: KeyboardEvent): void => {
      if (event.altKey || event.ctrlKey || event.metaKey || isTaken(event.target, event.key)) return;
      const next = chosenAfter(event.key, chosen, ids.length);
      const caseId = ids[chosen];
      if (next !== null) setChosen(next);
      else if (event.key === 'n') router.push('/cases/new');
      else if (event.key === 'Enter' && caseId) router.push({ pathname: '/cases/[caseId]', params: { caseId } });
      else if (event.key === 'b' && caseId) router.push({ pathname: '/cases/[caseId]/bench', params: { caseId } });
      else return;
      event.preventDefault();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [active, chosen, ids, router]);
  return chosen;
}
