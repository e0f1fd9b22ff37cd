/** One case: file, read, change, and the images on it. */
import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Database } from '../client';
import { findings, signatures } from '../schema/case-parts';
import { caseImages, cases } from '../schema/cases';
import { images } from '../schema/images';
import { departments, members } from '../schema/people';
import { coils, scanners } from '../schema/scanners';
import { personColumns } from './people';

export type CaseRow = typeof cases.$inferSelect;
export type CaseFields = Partial<Omit<typeof cases.$inferInsert, 'id' | 'departmentId' | 'number' | 'version' | 'reporterId' | 'openedAt'>>;
type ImageRole = (typeof caseImages.$inferSelect)['role'];

const reporters = alias(members, 'reporters');
const assignees = alias(members, 'assignees');

/** The query that reads cases with the names of scanner, coil, reporter and assignee. */
export const selectCases = (db: Database) =>
  db
    .select({
      row: cases,
      scanner: { id: scanners.id, name: scanners.name },
      coil: { id: coils.id, name: coils.name },
      reporter: personColumns(reporters),
      assignee: personColumns(assignees),
    })
    .from(cases)
    .innerJoin(reporters, eq(reporters.id, cases.reporterId))
    .leftJoin(assignees, eq(assignees.id, cases.assigneeId))
    .leftJoin(scanners, eq(scanners.id, cases.scannerId))
    .leftJoin(coils, eq(coils.id, cases.coilId))
    .$dynamic();

/** Stores a case under the next number of its department. To be called in a transaction. */
export async function addCase(
  db: Database,
  fields: CaseFields & { departmentId: string; reporterId: string; title: string },
): Promise<{ id: string; number: number }> {
  const [counter] = await db
    .update(departments)
    .set({ lastCaseNumber: sql`${departments.lastCaseNumber} + 1` })
    .where(eq(departments.id, fields.departmentId))
    .returning({ number: departments.lastCaseNumber });
  if (counter === undefined) throw new Error('the department of a new case does not exist');
  const [row] = await db
    .insert(cases)
    .values({ ...fields, number: counter.number })
    .returning({ id: cases.id, number: cases.number });
  if (row === undefined) throw new Error('the case was not stored');
  return row;
}

export async function findCaseOf(db: Database, departmentId: string, caseId: string) {
  const [found] = await selectCases(db).where(and(eq(cases.departmentId, departmentId), eq(cases.id, caseId)));
  return found;
}

/** The row of a case, locked until the transaction ends: steps of its life and its numbers are taken one at a time. */
export async function lockCaseOf(db: Database, departmentId: string, caseId: string): Promise<CaseRow | undefined> {
  const [row] = await db
    .select()
    .from(cases)
    .where(and(eq(cases.departmentId, departmentId), eq(cases.id, caseId)))
    .for('update');
  return row;
}

/** Writes fields of a case and raises its version. */
export async function changeCaseRow(db: Database, caseId: string, fields: CaseFields): Promise<void> {
  await db
    .update(cases)
    .set({ ...fields, version: sql`${cases.version} + 1`, updatedAt: sql`now()` })
    .where(eq(cases.id, caseId));
}

/** Notes that something was added to a case. */
export async function touchCase(db: Database, caseId: string): Promise<void> {
  await db
    .update(cases)
    .set({ updatedAt: sql`now()` })
    .where(eq(cases.id, caseId));
}

/** Puts images on a case; one that is there already takes the new role. */
export async function addCaseImages(db: Database, caseId: string, added: { imageId: string; role: ImageRole }[]): Promise<void> {
  if (added.length === 0) return;
  await db
    .insert(caseImages)
    .values(added.map((image) => ({ caseId, ...image })))
    .onConflictDoUpdate({ target: [caseImages.caseId, caseImages.imageId], set: { role: sql`excluded.role` } });
}

/** Images of cases, in the order they were added, with the digest of their values. */
export async function listCaseImages(db: Database, caseIds: string[]) {
  if (caseIds.length === 0) return [];
  return db
    .select({
      caseId: caseImages.caseId,
      imageId: caseImages.imageId,
      role: caseImages.role,
      addedAt: caseImages.addedAt,
      valuesDigest: images.valuesDigest,
    })
    .from(caseImages)
    .innerJoin(images, eq(images.id, caseImages.imageId))
    .where(inArray(caseImages.caseId, caseIds))
    .orderBy(asc(caseImages.addedAt), asc(caseImages.imageId));
}

/** Cases of the department that an image is on. */
export async function listCasesWithImage(db: Database, departmentId: string, imageId: string): Promise<string[]> {
  const rows = await db
    .select({ id: cases.id })
    .from(caseImages)
    .innerJoin(cases, eq(cases.id, caseImages.caseId))
    .where(and(eq(cases.departmentId, departmentId), eq(caseImages.imageId, imageId)));
  return rows.map(({ id }) => id);
}

/** The finding that stands, with its author. */
export async function findFinding(db: Database, caseId: string) {
  const [row] = await db
    .select({ finding: findings, author: personColumns(members) })
    .from(findings)
    .innerJoin(members, eq(members.id, findings.authorId))
    .where(eq(findings.caseId, caseId))
    .orderBy(desc(findings.version))
    .limit(1);
  return row;
}

export async function addFinding(db: Database, finding: Omit<typeof findings.$inferInsert, 'version'>): Promise<void> {
  const newest = db
    .select({ version: sql<number>`coalesce(max(${findings.version}), 0) + 1` })
    .from(findings)
    .where(eq(findings.caseId, finding.caseId));
  await db.insert(findings).values({ ...finding, version: sql`(${newest})` });
}

/** The newest signature, with who signed. */
export async function findSignature(db: Database, caseId: string) {
  const [row] = await db
    .select({ signature: signatures, member: personColumns(members) })
    .from(signatures)
    .innerJoin(members, eq(members.id, signatures.memberId))
    .where(eq(signatures.caseId, caseId))
    .orderBy(desc(signatures.at))
    .limit(1);
  return row;
}

export async function addSignature(db: Database, signature: typeof signatures.$inferInsert): Promise<void> {
  await db.insert(signatures).values(signature);
}
