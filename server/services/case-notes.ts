/** Marks, comments and findings of a case, and its timeline. */
import type { z } from 'zod';
import type { Database } from '../../db/client';
import { addFinding, touchCase } from '../../db/queries/cases';
import {
  addCommentRow,
  addEvents,
  addMarkRow,
  findMark,
  listCommentsOf,
  listEventsOf,
  listMarksOf,
  removeMarkRow,
} from '../../db/queries/case-parts';
import { findImageOf } from '../../db/queries/images';
import { causes } from '../../recon/causes';
import type { addComment, addMark, CaseEvent, Comment, Mark } from '../contract/case-parts';
import type { Case, Finding } from '../contract/cases';
import { AppError, invalidAt } from '../errors';
import { lockOpenCase, requireCase } from './open-case';
import { readCase } from './read-case';
import type { Caller } from './sessions';

export const authorOf = ({ memberId, name, role }: Caller) => ({ id: memberId, name, role });

export async function markImage(db: Database, caller: Caller, caseId: string, drawn: z.output<typeof addMark.body>): Promise<Mark> {
  return db.transaction(async (tx) => {
    await lockOpenCase(tx, caller, caseId);
    const image = await findImageOf(tx, caller.departmentId, drawn.imageId);
    if (image === undefined) throw invalidAt(['imageId'], 'there is no such image');
    if (drawn.frame >= image.frames) throw invalidAt(['frame'], `the image has ${image.frames} frames`);
    const row = await addMarkRow(tx, { ...drawn, caseId, authorId: caller.memberId });
    await touchCase(tx, caseId);
    await addEvents(tx, [{ caseId, actorId: caller.memberId, kind: 'mark-added', text: `Marked: ${drawn.kind} on ${drawn.domain}` }]);
    return describeMark(row, authorOf(caller));
  });
}

export async function listMarks(db: Database, caller: Caller, caseId: string): Promise<Mark[]> {
  await requireCase(db, caller, caseId);
  return (await listMarksOf(db, caseId)).map(({ mark, author }) => describeMark(mark, author));
}

/** Takes a mark away: one's own, or any as a lead technologist or physicist. */
export async function unmark(db: Database, caller: Caller, caseId: string, markId: string): Promise<void> {
  await db.transaction(async (tx) => {
    await lockOpenCase(tx, caller, caseId);
    const mark = await findMark(tx, caseId, markId);
    if (mark === undefined) throw new AppError('not-found');
    const leads = caller.role === 'lead-technologist' || caller.role === 'physicist';
    if (mark.authorId !== caller.memberId && !leads) throw new AppError('not-allowed');
    await removeMarkRow(tx, markId);
    await touchCase(tx, caseId);
    await addEvents(tx, [{ caseId, actorId: caller.memberId, kind: 'mark-removed', text: `Mark removed: ${mark.kind} on ${mark.domain}` }]);
  });
}

export async function comment(db: Database, caller: Caller, caseId: string, { text }: z.output<typeof addComment.body>): Promise<Comment> {
  return db.transaction(async (tx) => {
    await lockOpenCase(tx, caller, caseId);
    const row = await addCommentRow(tx, { caseId, text, authorId: caller.memberId });
    await touchCase(tx, caseId);
    await addEvents(tx, [{ caseId, actorId: caller.memberId, kind: 'commented', text: '' }]);
    return { id: row.id, text, author: authorOf(caller), createdAt: row.createdAt.toISOString() };
  });
}

export async function listComments(db: Database, caller: Caller, caseId: string): Promise<Comment[]> {
  await requireCase(db, caller, caseId);
  const rows = await listCommentsOf(db, caseId);
  return rows.map(({ comment: { id, text, createdAt }, author }) => ({ id, text, author, createdAt: createdAt.toISOString() }));
}

/** Writes the finding, or a new version of it; the timeline keeps the words of every version. */
export async function writeFinding(db: Database, caller: Caller, caseId: string, finding: Finding): Promise<Case> {
  const cause = causes.find(({ id }) => id === finding.cause);
  if (finding.cause !== null && cause === undefined) throw invalidAt(['cause'], 'there is no such cause in the catalogue');
  return db.transaction(async (tx) => {
    await lockOpenCase(tx, caller, caseId);
    await addFinding(tx, { ...finding, caseId, authorId: caller.memberId });
    await touchCase(tx, caseId);
    const named = cause?.title ?? 'Cause not found';
    const text = `${named} (${finding.confidence.replaceAll('-', ' ')}): ${finding.text}`;
    await addEvents(tx, [{ caseId, actorId: caller.memberId, kind: 'finding-written', text }]);
    return readCase(tx, caller, caseId);
  });
}

/** Newest first. */
export async function readTimeline(db: Database, caller: Caller, caseId: string): Promise<CaseEvent[]> {
  await requireCase(db, caller, caseId);
  const rows = await listEventsOf(db, caseId);
  return rows.map(({ event: { id, at, kind, from, to, text }, actor }) => ({ id, at: at.toISOString(), actor, kind, from, to, text }));
}

type MarkRow = Awaited<ReturnType<typeof addMarkRow>>;
function describeMark({ id, imageId, frame, domain, kind, points, text, createdAt }: MarkRow, author: Mark['author']): Mark {
  return { id, imageId, frame, domain, kind, points, text, author, createdAt: createdAt.toISOString() };
}
