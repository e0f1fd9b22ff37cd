/** Images of a department. */
import { and, eq, inArray } from 'drizzle-orm';
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
