/** Taking an upload: what the reader accepted is stored, what it refused is named with its reason. */
import type { Request } from 'express';
import { addImages, type NewImage } from '../../db/queries/images';
import type { Refusal, UploadResult } from '../contract/images';
import type { Dependencies } from '../dependencies';
import type { AcceptedImage } from '../dicom/read';
import { readingsOf } from './file-reader';
import { describeImage } from './image-source';
import type { Caller } from './sessions';

/** Stores the accepted images of a request: values first, then all rows in one statement. */
export async function takeUpload(
  deps: Pick<Dependencies, 'db' | 'objects'>,
  caller: Pick<Caller, 'memberId' | 'departmentId'>,
  request: Request,
): Promise<UploadResult> {
  const accepted: ImageToStore[] = [];
  const refused: Refusal[] = [];
  for (const { name, outcome } of readingsOf(request)) {
    if ('accepted' in outcome) accepted.push(...outcome.accepted.map((image) => ({ ...image, fileKey: outcome.fileKey })));
    else refused.push({ ...outcome.refused, name });
  }
  return { images: await storeImages(deps, caller, accepted), refused };
}

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

/** Stores images that came through the door. An object whose row then fails is unreachable and holds no identity. */
export async function storeImages(
  { db, objects }: Pick<Dependencies, 'db' | 'objects'>,
  origin: Origin,
  accepted: readonly ImageToStore[],
): Promise<UploadResult['images']> {
  const rows: NewImage[] = [];
  for (const image of accepted) {
    const { values } = image;
    const valuesDigest = await objects.put(new Uint8Array(values.buffer, values.byteOffset, values.byteLength));
    rows.push(rowOf(image, valuesDigest, origin));
  }
  return (await addImages(db, rows)).map(describeImage);
}

function rowOf(
  image: ImageToStore,
  valuesDigest: string,
  { departmentId, memberId, arrival, scannerId }: Origin,
): NewImage {
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
