/** Images of a department. */
import { and, count, eq, inArray, ne } from 'drizzle-orm';
import type { Database } from '../client';
import { images } from '../schema/images';

export type ImageRow = typeof images.$inferSelect;
export type NewImage = typeof images.$inferInsert;

/** Stores images in one statement: all of them or none. */
export async function addImages(db: Database, rows: NewImage[]): Promise<ImageRow[]> {
  return rows.length === 0 ? [] : db.insert(images).values(rows).returning();
}

export async function findImageOf(db: Database, departmentId: string, imageId: string): Promise<ImageRow | undefined> {
  const [row] = await db
    .select()
    .from(images)
    .where(and(eq(images.departmentId, departmentId), eq(images.id, imageId)));
  return row;
}

export async function findImagesOf(db: Database, departmentId: string, imageIds: string[]): Promise<ImageRow[]> {
  if (imageIds.length === 0) return [];
  return db
    .select()
    .from(images)
    .where(and(eq(images.departmentId, departmentId), inArray(images.id, imageIds)));
}

/** Replaces the facts that members have set on an image. */
export async function setMemberFacts(db: Database, departmentId: string, imageId: string, memberFacts: Record<string, unknown>) {
  const [row] = await db
    .update(images)
    .set({ memberFacts })
    .where(and(eq(images.departmentId, departmentId), eq(images.id, imageId)))
    .returning();
  return row;
}

/** Images of the same exam that have the same size and show another component. */
export async function listPartners(db: Database, image: ImageRow, component: ImageRow['component']): Promise<ImageRow[]> {
  if (image.studyKey === null) return [];
  return db
    .select()
    .from(images)
    .where(
      and(
        eq(images.departmentId, image.departmentId),
        eq(images.studyKey, image.studyKey),
        eq(images.component, component),
        eq(images.rows, image.rows),
        eq(images.columns, image.columns),
        eq(images.frames, image.frames),
        ne(images.id, image.id),
      ),
    );
}

/** Says that somebody has looked at a secondary capture. */
export async function confirmNoText(db: Database, departmentId: string, imageId: string): Promise<ImageRow | undefined> {
  const [row] = await db
    .update(images)
    .set({ confirmedNoText: true })
    .where(and(eq(images.departmentId, departmentId), eq(images.id, imageId)))
    .returning();
  return row;
}

/** Removes an image that nobody has confirmed; false where there is none, or somebody did meanwhile. */
export async function removeUnconfirmed(db: Database, departmentId: string, imageId: string): Promise<boolean> {
  const removed = await db
    .delete(images)
    .where(and(eq(images.departmentId, departmentId), eq(images.id, imageId), eq(images.confirmedNoText, false)))
    .returning({ id: images.id });
  return removed.length > 0;
}

/** How many images, of any department, have these values. */
export async function countImagesWithValues(db: Database, valuesDigest: string): Promise<number> {
  const [row] = await db.select({ n: count() }).from(images).where(eq(images.valuesDigest, valuesDigest));
  return row?.n ?? 0;
}
