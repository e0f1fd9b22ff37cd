/** Push from the scanner: its settings, its tokens, and what was seen of it. */
import { and, asc, desc, eq, isNull, sql } from 'drizzle-orm';
import type { Database } from '../client';
import { members } from '../schema/people';
import { scannerPush, scannerTokens } from '../schema/push';
import { scanners } from '../schema/scanners';

export type PushRow = typeof scannerPush.$inferSelect;

export async function findPush(db: Database, scannerId: string): Promise<PushRow | undefined> {
  const [row] = await db.select().from(scannerPush).where(eq(scannerPush.scannerId, scannerId));
  return row;
}

/** Sets what a scanner is known by. The caller has made sure that the scanner is one of the department. */
export async function setPush(db: Database, scannerId: string, known: { aeTitle: string | null; addresses: string[] }): Promise<void> {
  await db
    .insert(scannerPush)
    .values({ scannerId, ...known })
    .onConflictDoUpdate({ target: scannerPush.scannerId, set: known });
}

/** Whoever may send, of all departments: a sender says which scanner it is, and thereby which department's. */
export async function listSenders(db: Database) {
  return db
    .select({
      scannerId: scanners.id,
      departmentId: scanners.departmentId,
      aeTitle: scannerPush.aeTitle,
      addresses: scannerPush.addresses,
    })
    .from(scannerPush)
    .innerJoin(scanners, eq(scanners.id, scannerPush.scannerId));
}

export async function noteReceived(db: Database, scannerId: string, images: number): Promise<void> {
  const noted = { receivedCount: sql`${scannerPush.receivedCount} + ${images}`, lastReceivedAt: sql`now()` };
  await db
    .insert(scannerPush)
    .values({ scannerId, receivedCount: images, lastReceivedAt: sql`now()` })
    .onConflictDoUpdate({ target: scannerPush.scannerId, set: noted });
}

export async function noteRefused(db: Database, scannerId: string, lastRefusal: string): Promise<void> {
  const noted = { refusedCount: sql`${scannerPush.refusedCount} + 1`, lastRefusedAt: sql`now()`, lastRefusal };
  await db
    .insert(scannerPush)
    .values({ scannerId, refusedCount: 1, lastRefusedAt: sql`now()`, lastRefusal })
    .onConflictDoUpdate({ target: scannerPush.scannerId, set: noted });
}

/** Tokens of a scanner that are not revoked, newest first, with who drew them. */
export async function listTokens(db: Database, scannerId: string) {
  return db
    .select({
      id: scannerTokens.id,
      drawnAt: scannerTokens.drawnAt,
      drawnBy: members.name,
      lastUsedAt: scannerTokens.lastUsedAt,
    })
    .from(scannerTokens)
    .innerJoin(members, eq(members.id, scannerTokens.drawnById))
    .where(and(eq(scannerTokens.scannerId, scannerId), isNull(scannerTokens.revokedAt)))
    .orderBy(desc(scannerTokens.drawnAt), asc(scannerTokens.id));
}

export async function addToken(db: Database, token: { scannerId: string; tokenHash: string; drawnById: string }): Promise<void> {
  await db.insert(scannerTokens).values(token);
}

/** Says whether there was such a token to revoke. */
export async function revokeTokenOf(db: Database, scannerId: string, tokenId: string): Promise<boolean> {
  const revoked = await db
    .update(scannerTokens)
    .set({ revokedAt: sql`now()` })
    .where(and(eq(scannerTokens.id, tokenId), eq(scannerTokens.scannerId, scannerId), isNull(scannerTokens.revokedAt)))
    .returning({ id: scannerTokens.id });
  return revoked.length > 0;
}

/** The scanner whose token has this hash and is not revoked; the use is noted. */
export async function noteTokenUse(db: Database, tokenHash: string) {
  const [used] = await db
    .update(scannerTokens)
    .set({ lastUsedAt: sql`now()` })
    .where(and(eq(scannerTokens.tokenHash, tokenHash), isNull(scannerTokens.revokedAt)))
    .returning({ scannerId: scannerTokens.scannerId });
  if (used === undefined) return undefined;
  const [scanner] = await db
    .select({ scannerId: scanners.id, departmentId: scanners.departmentId })
    .from(scanners)
    .where(eq(scanners.id, used.scannerId));
  return scanner;
}
