/**
 * What the asking member can do with a case now, in the order of importance. The server says what is allowed (`may`); here it only
 * gets its word, and the first step that moves the case on becomes the filled block.
 */
import type { Case } from '@/server/contract/cases';

export type ActionId = 'bench' | 'assign' | 'investigate' | 'ask-for-sign-off' | 'return' | 'sign-off' | 'reopen';

export interface CaseAction {
  readonly id: ActionId;
  readonly label: string;
}

const words: Record<ActionId, string> = {
  bench: 'open on the bench',
  assign: 'assign',
  investigate: 'investigate',
  'ask-for-sign-off': 'ask for sign-off',
  return: 'return',
  'sign-off': 'sign off',
  reopen: 'reopen',
};

/** Steps that may be the filled block, the one that leads furthest first. */
const leading: readonly ActionId[] = ['sign-off', 'ask-for-sign-off', 'investigate'];
const quiet: readonly ActionId[] = ['assign', 'return', 'reopen'];

export interface CaseActions {
  readonly first: CaseAction;
  readonly others: readonly CaseAction[];
}

export function actionsOf({ may, images }: Pick<Case, 'may' | 'images'>): CaseActions {
  const allowed = (id: ActionId): boolean => may.transitions.includes(id);
  const bench: ActionId[] = images.length > 0 ? ['bench'] : [];
  const led = leading.filter(allowed);
  const ordered = [...led, ...bench, ...quiet.filter(allowed)];
  const [first = 'bench', ...others] = ordered;
  const worded = (id: ActionId): CaseAction => ({ id, label: words[id] });
  return { first: worded(first), others: others.map(worded) };
}
