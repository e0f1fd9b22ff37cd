/** A scanner's inbox: images that it sent and that are on no case. */
import { and, count, desc, eq, inArray, lt, lte, notExists, sql, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Database } from '../client';
import { caseImages } from '../schema/cases';
import { images } from '../schema/images';
import { discardedValues } from '../schema/push';

const onNoCase = (db: Database) =>
  notExists(
    db
      .select({ one: sql`1` })
      .from(caseImages)
      .where(eq(caseImages.imageId, images.id)),
  );

const inInbox = (db: Database, scannerId?: string): SQL | undefined =>
  and(
    inArray(images.arrival, ['scanner', 'web-push']),
    onNoCase(db),
    ...(scannerId === undefined ? [] : [eq(images.scannerId, scannerId)]),
  );

/** The newest images of an inbox. */
export async function listInbox(db: Database, scannerId: string, limit: number) {
  return db
    .select({
      id: images.id,
      rows: images.rows,
      columns: images.columns,
      frames: images.frames,
      component: images.component,
      use: images.use,
      seriesKey: images.seriesKey,
      headerFacts: images.headerFacts,
      receivedAt: images.uploadedAt,
    })
    .from(images)
    .where(inInbox(db, scannerId))
    .orderBy(desc(images.uploadedAt), desc(images.id))
    .limit(limit);
}

export async function countInbox(db: Database, scannerId: string): Promise<number> {
  const [row] = await db.select({ images: count() }).from(images).where(inInbox(db, scannerId));
  return row?.images ?? 0;
}

/** Whether the very same file waits in the inbox already. */
export async function isInInbox(db: Database, scannerId: string, fileKey: string): Promise<boolean> {
  const found = await db
    .select({ id: images.id })
    .from(images)
    .where(and(inInbox(db, scannerId), eq(images.fileKey, fileKey)))
    .limit(1);
  return found.length > 0;
}

/**
 * Deletes images of an inbox and notes their values as discarded. One that is put on a case at the same moment stays: the case's
 * reference holds it.
 */
async function discard(db: Database, which: SQL | undefined): Promise<number> {
  return db.transaction(async (tx) => {
    const locked = await tx.select({ id: images.id }).from(images).where(which).for('update', { skipLocked: true });
    if (locked.length === 0) return 0;
    // A case that took an image between the two statements is seen by this one.
    const stillThere = and(
      inArray(
        images.id,
        locked.map(({ id }) => id),
      ),
      onNoCase(tx),
    );
    const gone = await tx.delete(images).where(stillThere).returning({ valuesDigest: images.valuesDigest });
    await noteDiscarded(
      tx,
      gone.map(({ valuesDigest }) => valuesDigest),
    );
    return gone.length;
  });
}

/** Notes values that no image may have: what sweeps looks whether one has. */
export async function noteDiscarded(db: Database, valuesDigests: string[]): Promise<void> {
  // One statement must not touch a row twice, and two that go in the same order do not wait for each other.
  const digests = [...new Set(valuesDigests)].sort();
  if (digests.length === 0) return;
  await db
    .insert(discardedValues)
    .values(digests.map((valuesDigest) => ({ valuesDigest })))
    .onConflictDoUpdate({ target: discardedValues.valuesDigest, set: { discardedAt: sql`now()` } });
}

export const discardFromInbox = (db: Database, scannerId: string, imageIds: string[]): Promise<number> =>
  discard(db, and(inInbox(db, scannerId), inArray(images.id, imageIds)));

/** Discards what a member has just sent. */
export const discardUploaded = (db: Database, uploaderId: string, imageIds: string[]): Promise<number> =>
  imageIds.length === 0 ? Promise.resolve(0) : discard(db, and(eq(images.uploaderId, uploaderId), inArray(images.id, imageIds)));

/** Discards what has waited in any inbox since before `days` ago; the neighbours of a slice that is on a case stay to be looked at beside it. */
export const discardOlderThan = (db: Database, days: number): Promise<number> =>
  discard(db, and(inInbox(db), lt(images.uploadedAt, sql`now() - make_interval(days => ${days})`), noNeighbourOnCase(db)));

function noNeighbourOnCase(db: Database): SQL {
  const neighbours = alias(images, 'neighbours');
  return notExists(
    db
      .select({ one: sql`1` })
      .from(neighbours)
      .innerJoin(caseImages, eq(caseImages.imageId, neighbours.id))
      .where(and(eq(neighbours.departmentId, images.departmentId), eq(neighbours.seriesKey, images.seriesKey))),
  );
}

/** Values that were discarded at least `unusedForMs` ago, and whether an image has them still or again. Younger ones may be on their way in. */
export async function listDiscardedValues(db: Database, unusedForMs: number): Promise<{ digest: string; inUse: boolean }[]> {
  return db
    .select({ digest: discardedValues.valuesDigest, inUse: sql<boolean>`count(${images.id}) > 0` })
    .from(discardedValues)
    .leftJoin(images, eq(images.valuesDigest, discardedValues.valuesDigest))
    .where(lte(discardedValues.discardedAt, sql`now() - make_interval(secs => ${unusedForMs / 1000})`))
    .groupBy(discardedValues.valuesDigest);
}

export async function forgetDiscarded(db: Database, digest: string): Promise<void> {
  await db.delete(discardedValues).where(eq(discardedValues.valuesDigest, digest));
}
