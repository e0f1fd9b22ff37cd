/**
 * Storing what the door accepted. Values are noted as discarded before they are written, and an image that then has them takes that back, so
 * that whatever breaks in between leaves nothing behind for longer than until the next sweep (server/push/retention.ts).
 */
import { addImages, type NewImage } from '../../db/queries/images';
import { noteDiscarded } from '../../db/queries/inbox';
import type { UploadResult } from '../contract/images';
import type { Dependencies } from '../dependencies';
import type { AcceptedImage } from '../dicom/read';
import { sha256 } from '../storage/disk-objects';
import { describeImage } from './image-source';

/** Whose images they are, and through which door they came: a member's upload, unless it says that a scanner sent them. */
export interface Origin {
  readonly departmentId: string;
  readonly memberId: string | null;
  readonly arrival?: NewImage['arrival'];
  readonly scannerId?: string;
}

/** An image with the key of the file that it came in, if it came in one. */
export interface ImageToStore extends AcceptedImage {
  readonly fileKey?: string;
}

/** Stores images that came through the door: values first, then all rows in one statement. */
export async function storeImages(
  { db, objects }: Pick<Dependencies, 'db' | 'objects'>,
  origin: Origin,
  accepted: readonly ImageToStore[],
): Promise<UploadResult['images']> {
  const values = accepted.map((image) => bytesOf(image.values));
  const digests = values.map(sha256);
  await noteDiscarded(db, digests);
  for (const bytes of values) await objects.put(bytes);
  return (
    await addImages(
      db,
      accepted.map((image, i) => rowOf(image, digests[i] ?? '', origin)),
    )
  ).map(describeImage);
}

const bytesOf = ({ buffer, byteOffset, byteLength }: Float32Array): Uint8Array => new Uint8Array(buffer, byteOffset, byteLength);

function rowOf(image: ImageToStore, valuesDigest: string, { departmentId, memberId, arrival, scannerId }: Origin): NewImage {
  const { rows, columns, frames, component, use, kspace, confirmedNoText, spacingMm, range } = image;
  const { facts, frameFacts, identifiers, warnings, deidentification } = image;
  return {
    ...{ departmentId, uploaderId: memberId, arrival, scannerId },
    ...{ rows, columns, frames, component, use, kspace, confirmedNoText, spacingMm, valuesDigest },
    ...{ frameFacts, warnings },
    rangeLow: range[0],
    rangeHigh: range[1],
    headerFacts: facts,
    removedTags: deidentification.removed,
    replacedTags: deidentification.replaced,
    studyKey: identifiers.study,
    seriesKey: identifiers.series,
    frameOfReferenceKey: identifiers.frameOfReference,
    imageKey: identifiers.image,
    fileKey: image.fileKey ?? null,
  };
}
