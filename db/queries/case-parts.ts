/** Trials, marks, comments and the timeline of a case. The caller has made sure that the case is one of the department. */
import { and, asc, desc, eq, sql } from 'drizzle-orm';
import type { Database } from '../client';
import { comments, marks, trials } from '../schema/case-parts';
import { members } from '../schema/people';
import { timelineEvents } from '../schema/timeline';
import { personColumns } from './people';

type NewTrial = Omit<typeof trials.$inferInsert, 'number'>;
export type NewEvent = typeof timelineEvents.$inferInsert;

/** Stores a trial under the next number of its case, whose row the caller has locked. */
export async function addTrial(db: Database, trial: NewTrial): Promise<{ id: string; number: number }> {
  const next = db
    .select({ number: sql<number>`coalesce(max(${trials.number}), 0) + 1` })
    .from(trials)
    .where(eq(trials.caseId, trial.caseId));
  const [row] = await db
    .insert(trials)
    .values({ ...trial, number: sql`(${next})` })
    .returning({ id: trials.id, number: trials.number });
  if (row === undefined) throw new Error('the trial was not stored');
  return row;
}

const selectTrials = (db: Database) =>
  db
    .select({ trial: trials, author: personColumns(members) })
    .from(trials)
    .innerJoin(members, eq(members.id, trials.authorId))
    .$dynamic();

/** Newest first. */
export async function listTrialsOf(db: Database, caseId: string) {
  return selectTrials(db).where(eq(trials.caseId, caseId)).orderBy(desc(trials.number));
}

export async function findTrial(db: Database, caseId: string, trialId: string) {
  const [row] = await selectTrials(db).where(and(eq(trials.caseId, caseId), eq(trials.id, trialId)));
  return row;
}

export async function addMarkRow(db: Database, mark: typeof marks.$inferInsert) {
  const [row] = await db.insert(marks).values(mark).returning();
  if (row === undefined) throw new Error('the mark was not stored');
  return row;
}

export async function listMarksOf(db: Database, caseId: string) {
  return db
    .select({ mark: marks, author: personColumns(members) })
    .from(marks)
    .innerJoin(members, eq(members.id, marks.authorId))
    .where(eq(marks.caseId, caseId))
    .orderBy(asc(marks.createdAt), asc(marks.id));
}

export async function findMark(db: Database, caseId: string, markId: string) {
  const [row] = await db
    .select()
    .from(marks)
    .where(and(eq(marks.caseId, caseId), eq(marks.id, markId)));
  return row;
}

export async function removeMarkRow(db: Database, markId: string): Promise<void> {
  await db.delete(marks).where(eq(marks.id, markId));
}

export async function addCommentRow(db: Database, comment: typeof comments.$inferInsert) {
  const [row] = await db.insert(comments).values(comment).returning();
  if (row === undefined) throw new Error('the comment was not stored');
  return row;
}

/** Oldest first. */
export async function listCommentsOf(db: Database, caseId: string) {
  return db
    .select({ comment: comments, author: personColumns(members) })
    .from(comments)
    .innerJoin(members, eq(members.id, comments.authorId))
    .where(eq(comments.caseId, caseId))
    .orderBy(asc(comments.createdAt), asc(comments.id));
}

export async function addEvents(db: Database, events: NewEvent[]): Promise<void> {
  if (events.length > 0) await db.insert(timelineEvents).values(events);
}

/** Newest first. */
export async function listEventsOf(db: Database, caseId: string) {
  return db
    .select({ event: timelineEvents, actor: personColumns(members) })
    .from(timelineEvents)
    .innerJoin(members, eq(members.id, timelineEvents.actorId))
    .where(eq(timelineEvents.caseId, caseId))
    .orderBy(desc(timelineEvents.sequence));
}
