/** Images by the series and by the file that they came from. */
import { and, eq, inArray, notExists, sql } from 'drizzle-orm';
import type { Database } from '../client';
import { caseImages } from '../schema/cases';
import { images } from '../schema/images';
import type { ImageRow } from './images';

/** The images that can be slices beside `image`: of its series, component and size. */
export async function listSeriesOf(db: Database, image: ImageRow): Promise<ImageRow[]> {
  if (image.seriesKey === null) return [image];
  return db
    .select()
    .from(images)
    .where(
      and(
        eq(images.departmentId, image.departmentId),
        eq(images.seriesKey, image.seriesKey),
        eq(images.component, image.component),
        eq(images.rows, image.rows),
        eq(images.columns, image.columns),
      ),
    )
    .orderBy(images.uploadedAt, images.id);
}

/** Images of these files that a member sent and that are on no case: what became of an upload that broke off. */
export async function findSent(db: Database, uploaderId: string, fileKeys: string[]): Promise<{ id: string; fileKey: string | null }[]> {
  if (fileKeys.length === 0) return [];
  const onCase = db
    .select({ one: sql`1` })
    .from(caseImages)
    .where(eq(caseImages.imageId, images.id));
  return db
    .select({ id: images.id, fileKey: images.fileKey })
    .from(images)
    .where(and(eq(images.uploaderId, uploaderId), inArray(images.fileKey, fileKeys), notExists(onCase)))
    .orderBy(images.uploadedAt, images.id);
}
