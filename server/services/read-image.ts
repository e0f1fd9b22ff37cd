/** What is asked of one image: its facts, its values and their transform, a small picture, what the facts imply. */
import type { z } from 'zod';
import { addEvents } from '../../db/queries/case-parts';
import { listCasesWithImage } from '../../db/queries/cases';
import { setMemberFacts } from '../../db/queries/images';
import type { Database } from '../../db/client';
import { implications } from '../../recon/implications';
import { fromMillimetres } from '../../recon/units';
import type { PixelsJob } from '../../workers/job';
import type { CorrectableFacts } from '../contract/facts';
import type { Image, implicationSchema } from '../contract/images';
import type { Dependencies } from '../dependencies';
import { acquisitionOf } from '../dicom/acquisition';
import { AppError } from '../errors';
import type { Binary } from '../serve';
import { describeImage, currentFacts, requireImage, sourceOf } from './image-source';
import { planesAnswer } from './planes-answer';
import type { Caller } from './sessions';

export async function readImage(db: Database, caller: Caller, imageId: string): Promise<Image> {
  return describeImage(await requireImage(db, caller, imageId));
}

/** Sets facts over those of the header, and says so in the timeline of every case that the image is on. */
export async function correctFacts(db: Database, caller: Caller, imageId: string, set: CorrectableFacts): Promise<Image> {
  return db.transaction(async (tx) => {
    const before = await requireImage(tx, caller, imageId);
    const after = await setMemberFacts(tx, caller.departmentId, imageId, { ...before.memberFacts, ...set });
    if (after === undefined) throw new AppError('not-found');
    const text = Object.entries(set)
      .map(([name, value]) => `${name} set to ${value}`)
      .join(', ');
    const cases = await listCasesWithImage(tx, caller.departmentId, imageId);
    await addEvents(
      tx,
      cases.map((caseId) => ({ caseId, actorId: caller.memberId, kind: 'fact-set' as const, text })),
    );
    return describeImage(after);
  });
}

interface Asked {
  readonly imageId: string;
  readonly domain: 'image' | 'kspace';
}

/** The stored values as they are, or their transform. */
export async function readPixels(
  deps: Dependencies,
  caller: Caller,
  { imageId, frame, domain, form }: Pick<PixelsJob, 'domain' | 'form'> & { imageId: string; frame: number },
  gone: AbortSignal,
): Promise<Binary> {
  const row = await requireImage(deps.db, caller, imageId);
  const source = await sourceOf(deps, row, frame);
  return planesAnswer(await deps.workers.pixels({ kind: 'pixels', source, domain, form }, gone), form);
}

export async function readThumbnail(
  deps: Dependencies,
  caller: Caller,
  { imageId, frame, domain }: Asked & { frame: number },
  gone: AbortSignal,
): Promise<Binary> {
  const row = await requireImage(deps.db, caller, imageId);
  const source = await sourceOf(deps, row, frame);
  const { bytes } = await deps.workers.thumbnail({ kind: 'thumbnail', source, domain, window: [row.rangeLow, row.rangeHigh] }, gone);
  return { mediaType: 'image/png', bytes, headers: thumbnailHeaders };
}

/** A picture of an image never changes; it is the member's own to keep. */
export const thumbnailHeaders = { 'Cache-Control': 'private, max-age=86400' };

/** What the facts imply. Where the phase-encode axis is unknown, a value that depends on it is not given. */
export async function readImplications(
  db: Database,
  caller: Caller,
  imageId: string,
  ghostFrequency: number | undefined,
): Promise<z.input<typeof implicationSchema>[]> {
  const row = await requireImage(db, caller, imageId);
  const spacing = row.spacingMm && ([fromMillimetres(row.spacingMm[0]), fromMillimetres(row.spacingMm[1])] as const);
  const size = { rows: row.rows, columns: row.columns, spacing: spacing ?? undefined };
  return implications(acquisitionOf(currentFacts(row)), size, ghostFrequency);
}
