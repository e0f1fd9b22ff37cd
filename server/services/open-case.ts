/** The gate before every change of a case: it is the department's own, it is locked for this transaction, and it is not closed. */
import type { Database } from '../../db/client';
import { findCaseOf, lockCaseOf, type CaseRow } from '../../db/queries/cases';
import { AppError } from '../errors';
import type { Caller } from './sessions';

/** Locks a case of the caller's department. Throws `not-found`. */
export async function lockCase(db: Database, caller: Caller, caseId: string): Promise<CaseRow> {
  const row = await lockCaseOf(db, caller.departmentId, caseId);
  if (row === undefined) throw new AppError('not-found');
  return row;
}

/** Locks a case that may be changed. A closed one is as it was signed. */
export async function lockOpenCase(db: Database, caller: Caller, caseId: string): Promise<CaseRow> {
  const row = await lockCase(db, caller, caseId);
  if (row.state === 'closed') {
    throw new AppError('transition-not-possible', { detail: 'The case is closed; it must be reopened before it can be changed' });
  }
  return row;
}

/** Throws `not-found` unless the case is one of the caller's department. */
export async function requireCase(db: Database, caller: Caller, caseId: string): Promise<void> {
  if ((await findCaseOf(db, caller.departmentId, caseId)) === undefined) throw new AppError('not-found');
}
