/** Members and their sessions. */
import { and, asc, eq, gt, sql } from 'drizzle-orm';
import type { Database } from '../client';
import { departments, members, sessions } from '../schema/people';

const memberColumns = { id: members.id, name: members.name, email: members.email, role: members.role };
const departmentColumns = { departmentId: departments.id, departmentName: departments.name };

/** The member with this e-mail in any case of letters, with the password hash. */
export async function findMemberByEmail(db: Database, email: string) {
  const [row] = await db
    .select({ ...memberColumns, ...departmentColumns, passwordHash: members.passwordHash })
    .from(members)
    .innerJoin(departments, eq(departments.id, members.departmentId))
    .where(eq(sql`lower(${members.email})`, email.toLowerCase()));
  return row;
}

/** The member whose session this is, while it lasts. */
export async function findMemberBySession(db: Database, sessionId: string) {
  const [row] = await db
    .select({ ...memberColumns, ...departmentColumns })
    .from(sessions)
    .innerJoin(members, eq(members.id, sessions.memberId))
    .innerJoin(departments, eq(departments.id, members.departmentId))
    .where(and(eq(sessions.id, sessionId), gt(sessions.expiresAt, sql`now()`)));
  return row;
}

export async function addSession(db: Database, session: { memberId: string; expiresAt: Date }): Promise<string> {
  const [row] = await db.insert(sessions).values(session).returning({ id: sessions.id });
  if (row === undefined) throw new Error('the session was not stored');
  return row.id;
}

export async function removeSession(db: Database, sessionId: string): Promise<void> {
  await db.delete(sessions).where(eq(sessions.id, sessionId));
}

/** Sessions that have ended leave at the next sign-in of their member. */
export async function removeEndedSessions(db: Database, memberId: string): Promise<void> {
  await db.delete(sessions).where(and(eq(sessions.memberId, memberId), sql`${sessions.expiresAt} <= now()`));
}

export async function listMembersOf(db: Database, departmentId: string) {
  return db.select(memberColumns).from(members).where(eq(members.departmentId, departmentId)).orderBy(asc(members.name));
}

export async function findMemberOf(db: Database, departmentId: string, memberId: string) {
  const [row] = await db
    .select(memberColumns)
    .from(members)
    .where(and(eq(members.departmentId, departmentId), eq(members.id, memberId)));
  return row;
}
