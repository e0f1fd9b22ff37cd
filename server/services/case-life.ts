/**
 * The life of a case as one table: reported → under investigation → awaiting sign-off → closed, and back with a reason. Which
 * steps there are, from which states, for which roles, and where they lead.
 */
import type { Transition } from '../contract/case-parts';
import type { CaseState } from '../contract/cases';
import type { Role } from '../contract/route';

type Action = Transition['action'];

interface Step {
  readonly from: readonly CaseState[];
  readonly roles: readonly Role[];
  /** The state it leads to from `state`. */
  readonly to: (state: CaseState) => CaseState;
  readonly needsFinding?: boolean;
}

const leaders: readonly Role[] = ['lead-technologist', 'physicist'];

export const steps: Readonly<Record<Action, Step>> = {
  assign: {
    from: ['reported', 'under-investigation', 'awaiting-sign-off'],
    roles: leaders,
    to: (state) => (state === 'reported' ? 'under-investigation' : state),
  },
  investigate: { from: ['reported'], roles: leaders, to: () => 'under-investigation' },
  'ask-for-sign-off': { from: ['under-investigation'], roles: leaders, to: () => 'awaiting-sign-off', needsFinding: true },
  return: { from: ['awaiting-sign-off'], roles: leaders, to: () => 'under-investigation' },
  'sign-off': { from: ['awaiting-sign-off'], roles: ['physicist'], to: () => 'closed', needsFinding: true },
  reopen: { from: ['closed'], roles: leaders, to: () => 'under-investigation' },
};

export const actions = Object.keys(steps) as Action[];

export interface Standing {
  readonly state: CaseState;
  readonly hasFinding: boolean;
}

export const roleMayTake = (action: Action, role: Role): boolean => steps[action].roles.includes(role);

/** Why a case that stands so cannot take a step, in words, or undefined when it can. */
export function obstacleTo(action: Action, { state, hasFinding }: Standing): string | undefined {
  const { from, needsFinding } = steps[action];
  if (!from.includes(state)) return `A case that is ${state.replaceAll('-', ' ')} cannot take the step ‘${action.replaceAll('-', ' ')}’`;
  if (needsFinding && !hasFinding) return 'A finding must be written first';
  return undefined;
}

/** What a member with `role` may do with a case that stands so. A closed case is as it was signed: nobody edits it. */
export function permissions(role: Role, standing: Standing) {
  const open = standing.state !== 'closed';
  const transitions = actions.filter((action) => roleMayTake(action, role) && obstacleTo(action, standing) === undefined);
  return {
    edit: open,
    assign: transitions.includes('assign'),
    writeFinding: open && leaders.includes(role),
    transitions,
  };
}
