/** An image as services and workers need it: the row of the department, its facts with what members set, its values in shared memory. */
import type { Database } from '../../db/client';
import { findImageOf, type ImageRow } from '../../db/queries/images';
import type { ImageSource } from '../../workers/job';
import { correctableFactsSchema, frameFactsSchema, scanFactsSchema, type CorrectableFacts, type ScanFacts } from '../contract/facts';
import type { Image } from '../contract/images';
import type { Dependencies } from '../dependencies';
import { AppError, invalidAt } from '../errors';
import type { Caller } from './sessions';

/** The image, or `not-found`: also where it is another department's, or for its uploader alone. */
export async function requireImage(db: Database, caller: Caller, imageId: string): Promise<ImageRow> {
  const row = await findImageOf(db, caller.departmentId, imageId);
  if (row === undefined || isHidden(row, caller)) throw new AppError('not-found');
  return row;
}

/** A secondary capture that its uploader has not looked at yet. What a scanner sent has no uploader: whoever opens it looks. */
const isHidden = ({ confirmedNoText, uploaderId }: ImageRow, { memberId }: Caller): boolean =>
  confirmedNoText === false && uploaderId !== null && uploaderId !== memberId;

/** An image that a request names at `path`: where there is none, the answer says at which field. */
export async function requireNamedImage(db: Database, caller: Caller, imageId: string, path: string[]): Promise<ImageRow> {
  const row = await findImageOf(db, caller.departmentId, imageId);
  if (row === undefined || isHidden(row, caller))
    throw new AppError('not-found', { issues: [{ path, message: 'there is no such image' }] });
  return row;
}

/** A frame of an image with its values, which threads share. `path` is the field that named the frame. */
export async function sourceOf(
  { values }: Pick<Dependencies, 'values'>,
  row: ImageRow,
  frame: number,
  path = ['frame'],
): Promise<ImageSource> {
  if (frame >= row.frames)
    throw invalidAt(path, row.frames === 1 ? 'the image has one frame, number 0' : `the last frame is ${row.frames - 1}`);
  const { id: imageId, rows, columns, spacingMm, component } = row;
  return { imageId, frame, rows, columns, spacingMm, isComplex: component === 'complex', values: await values.read(row.valuesDigest) };
}

/** What members set, over what the header said; the header's value stays beside it. */
export function currentFacts(row: Pick<ImageRow, 'headerFacts' | 'memberFacts'>): ScanFacts {
  const facts = scanFactsSchema.parse(row.headerFacts);
  const set = correctableFactsSchema.parse(row.memberFacts);
  const overlaid = Object.entries(set).map(([name, value]) => {
    const header = facts[name as keyof CorrectableFacts];
    return [name, { ...header, value, origin: 'member', headerValue: header.value }];
  });
  return scanFactsSchema.parse({ ...facts, ...Object.fromEntries(overlaid) });
}

/** The facts of one frame: its own echo time, unless a member set another. */
export function factsOfFrame(row: ImageRow, frame: number): ScanFacts {
  const facts = currentFacts(row);
  const own = frameFactsSchema.array().parse(row.frameFacts)[frame];
  if (own === undefined || own.echoTimeMs === null || facts.echoTimeMs.origin === 'member') return facts;
  return { ...facts, echoTimeMs: { ...facts.echoTimeMs, value: own.echoTimeMs } };
}

/** An image as the contract describes it. */
export function describeImage(row: ImageRow): Image {
  const { id, rows, columns, frames, component, use, kspace, confirmedNoText, spacingMm, warnings } = row;
  return {
    ...{ id, rows, columns, frames, component, use, kspace, confirmedNoText, spacingMm, warnings },
    series: row.seriesKey,
    frameFacts: frameFactsSchema.array().parse(row.frameFacts),
    range: [row.rangeLow, row.rangeHigh],
    acquisition: currentFacts(row),
    deidentification: { removed: row.removedTags, replaced: row.replacedTags },
  };
}
