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
  const accepted: AcceptedImage[] = [];
  const refused: Refusal[] = [];
  for (const { name, outcome } of readingsOf(request)) {
    if ('accepted' in outcome) accepted.push(...outcome.accepted);
    else refused.push({ ...outcome.refused, name });
  }
  return { images: await storeImages(deps, caller, accepted), refused };
}

/** Stores images that came through the door. An object whose row then fails is unreachable and holds no identity. */
export async function storeImages(
  { db, objects }: Pick<Dependencies, 'db' | 'objects'>,
  caller: Pick<Caller, 'memberId' | 'departmentId'>,
  accepted: readonly AcceptedImage[],
): Promise<UploadResult['images']> {
  const rows: NewImage[] = [];
  for (const image of accepted) {
    const { values } = image;
    const valuesDigest = await objects.put(new Uint8Array(values.buffer, values.byteOffset, values.byteLength));
    rows.push(rowOf(image, valuesDigest, caller));
  }
  return (await addImages(db, rows)).map(describeImage);
}

function rowOf(
  image: AcceptedImage,
  valuesDigest: string,
  { departmentId, memberId }: Pick<Caller, 'memberId' | 'departmentId'>,
): NewImage {
  const { rows, columns, frames, component, use, kspace, spacingMm, range, facts, frameFacts, identifiers, warnings, deidentification } =
    image;
  return {
    ...{ departmentId, uploaderId: memberId, rows, columns, frames, component, use, kspace, spacingMm, valuesDigest },
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
  };
}
