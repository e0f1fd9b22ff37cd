/** The catalogue: every cause and reconstruction, with initial values from the facts of an image where one is named. */
import type { Database } from '../../db/client';
import { describeCause, describeReconstruction } from '../../recon/catalogue';
import { causes } from '../../recon/causes';
import { reconstructions } from '../../recon/reconstructions';
import type { Cause, Method } from '../contract/catalogue';
import { acquisitionOf } from '../dicom/acquisition';
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

export const describeReconstructions = (): Method[] => reconstructions.map((method) => describeReconstruction(method));
