/** The catalogue: every cause and reconstruction, with initial values from the facts of an image where one is named. */
import type { Database } from '../../db/client';
import { describeCause, describeReconstruction } from '../../recon/catalogue';
import { causes } from '../../recon/causes';
import { reconstructions } from '../../recon/reconstructions';
import { entryOf } from '../../recon/recipe-check';
import type { z } from 'zod';
import type { Cause, readSwatch, Reconstruction } from '../contract/catalogue';
import type { Dependencies } from '../dependencies';
import { acquisitionOf } from '../dicom/acquisition';
import { AppError } from '../errors';
import type { Binary } from '../serve';
import { currentFacts, requireNamedImage } from './image-source';
import type { Caller } from './sessions';

/** Stands in where the axis is not known: no initial value depends on it. */
const anyAxis = 'column';

export async function describeCauses(db: Database, caller: Caller, imageId: string | undefined): Promise<Cause[]> {
  if (imageId === undefined) return causes.map((cause) => describeCause(cause));
  const row = await requireNamedImage(db, caller, imageId, ['imageId']);
  const { phaseEncode = anyAxis, ...acquisition } = acquisitionOf(currentFacts(row));
  return causes.map((cause) => describeCause(cause, { ...acquisition, phaseEncode }));
}

export const describeReconstructions = (): Reconstruction[] => reconstructions.map((method) => describeReconstruction(method));

/** The same for everybody and every time; an update of the models may change it. */
const swatchHeaders = { 'Cache-Control': 'private, max-age=3600' };

/** The swatch of a cause or a reconstruction, or `not-found`. */
export async function drawSwatch(
  { workers }: Pick<Dependencies, 'workers'>,
  causeId: string,
  { strength, domain, side }: z.output<typeof readSwatch.query>,
  gone: AbortSignal,
): Promise<Binary> {
  if (entryOf(causeId) === undefined) throw new AppError('not-found');
  const { bytes } = await workers.swatch({ kind: 'swatch', causeId, strength, domain, side: Number(side) }, gone);
  return { mediaType: 'image/png', bytes, headers: swatchHeaders };
}
