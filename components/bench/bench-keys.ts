/** Keys of the whole bench: undo and redo as everywhere. Fields keep their own. */
import { useEffect, useEffectEvent, type Dispatch } from 'react';
import type { RecipeAction } from './recipe-history';

/** The action of a key press, or null. */
export function actionOfKey(event: Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'shiftKey'>): RecipeAction | null {
  if (!event.ctrlKey && !event.metaKey) return null;
  const key = event.key.toLowerCase();
  if (key === 'z') return { kind: event.shiftKey ? 'redo' : 'undo' };
  return key === 'y' ? { kind: 'redo' } : null;
}

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && target.matches('input:not([type=range]), textarea, [contenteditable]');

export function useBenchKeys(dispatch: Dispatch<RecipeAction>): void {
  const press = useEffectEvent((event: KeyboardEvent) => {
    const action = isTyping(event.target) ? null : actionOfKey(event);
    if (!action) return;
    event.preventDefault();
    dispatch(action);
  });
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => press(event);
    window.addEventListener('keydown', onKeyDown);
    return () => window.removeEventListener('keydown', onKeyDown);
  }, []);
}
