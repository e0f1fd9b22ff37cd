/** The steps of a case's life: assign, investigate, ask for sign-off, return, sign off, reopen. */
import type { Database } from '../../db/client';
import { changeCaseRow, findFinding, type CaseRow } from '../../db/queries/cases';
import { addEvents, type NewEvent } from '../../db/queries/case-parts';
import { findMemberOf } from '../../db/queries/members';
import type { Transition } from '../contract/case-parts';
import type { Case } from '../contract/cases';
import { AppError, invalidAt } from '../errors';
import { obstacleTo, roleMayTake, steps } from './case-life';
import { lockCase } from './open-case';
import { readCase } from './read-case';
import type { Caller } from './sessions';
import { signCase } from './sign-case';

/** Takes one step, or refuses it: `not-allowed` by role, `transition-not-possible` by state. */
export async function moveCase(db: Database, caller: Caller, caseId: string, transition: Transition): Promise<Case> {
  if (!roleMayTake(transition.action, caller.role)) throw new AppError('not-allowed');
  return db.transaction(async (tx) => {
    const row = await lockCase(tx, caller, caseId);
    const finding = await findFinding(tx, caseId);
    const obstacle = obstacleTo(transition.action, { state: row.state, hasFinding: finding !== undefined });
    if (obstacle !== undefined) throw new AppError('transition-not-possible', { detail: obstacle });

    const assigneeId = transition.action === 'assign' ? transition.memberId : undefined;
    const events = await takeStep(tx, caller, row, transition);
    const to = steps[transition.action].to(row.state);
    await changeCaseRow(tx, caseId, { state: to, ...(assigneeId === undefined ? {} : { assigneeId }) });
    await addEvents(tx, [...events, ...stateChange(caller, row, to, transition)]);
    return readCase(tx, caller, caseId);
  });
}

/** What a step does besides moving the case, and the events that it leaves. */
async function takeStep(db: Database, caller: Caller, row: CaseRow, transition: Transition): Promise<NewEvent[]> {
  if (transition.action === 'assign') {
    const assignee = await findMemberOf(db, caller.departmentId, transition.memberId);
    if (assignee === undefined) throw invalidAt(['memberId'], 'there is no such member');
    return [{ caseId: row.id, actorId: caller.memberId, kind: 'assigned', text: `Assigned to ${assignee.name}` }];
  }
  if (transition.action === 'sign-off') {
    const digest = await signCase(db, caller, row, transition);
    return [{ caseId: row.id, actorId: caller.memberId, kind: 'signed', text: `Signed; SHA-256 ${digest}` }];
  }
  return [];
}

function stateChange(caller: Caller, row: CaseRow, to: CaseRow['state'], transition: Transition): NewEvent[] {
  if (to === row.state) return [];
  const text = 'reason' in transition ? transition.reason : '';
  return [{ caseId: row.id, actorId: caller.memberId, kind: 'state-changed', from: row.state, to, text }];
}
