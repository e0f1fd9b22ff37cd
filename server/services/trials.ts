/** Trials: a recipe that was kept. The server runs it, so that numbers, pictures and digest are those of the model and not of a client. */
import type { Database } from '../../db/client';
import { addEvents, addTrial, findTrial, listTrialsOf } from '../../db/queries/case-parts';
import { touchCase } from '../../db/queries/cases';
import type { z } from 'zod';
import { trialSchema, type keepTrial as keepTrialRoute, type Trial } from '../contract/case-parts';
import type { Dependencies } from '../dependencies';
import { AppError } from '../errors';
import type { Binary } from '../serve';
import { lockOpenCase, requireCase } from './open-case';
import { thumbnailHeaders } from './read-image';
import type { Caller } from './sessions';
import { lasting, prepareRun } from './simulate';

type Wish = z.output<typeof keepTrialRoute.body> & { readonly caseId: string };

/** Runs the recipe, keeps its pictures as objects, then the trial under the next number of its case. */
export async function keepTrial(deps: Dependencies, caller: Caller, { caseId, note, ...wish }: Wish, gone: AbortSignal): Promise<Trial> {
  await requireCase(deps.db, caller, caseId);
  const { row, source, compareWith, acquisition, recipe } = await prepareRun(deps, caller, wish);
  const window = [row.rangeLow, row.rangeHigh] as const;
  const result = await deps.workers.trial({ kind: 'trial', source, compareWith, acquisition, recipe, window }, gone);
  const pictures = {
    imageThumbnail: await deps.objects.put(result.imageThumbnail),
    kspaceThumbnail: await deps.objects.put(result.kspaceThumbnail),
  };
  const kept = {
    ...{
      caseId,
      note,
      recipe,
      ...pictures,
      imageId: row.id,
      frame: wish.frame,
      phaseEncode: acquisition.phaseEncode,
      acquisition,
      digest: result.digest,
    },
    compareImageId: wish.compareWith?.imageId,
    compareFrame: wish.compareWith?.frame,
    metrics: { ...lasting(result.numbers) },
    authorId: caller.memberId,
  };
  return deps.db.transaction(async (tx) => {
    await lockOpenCase(tx, caller, caseId);
    const { id, number } = await addTrial(tx, kept);
    await touchCase(tx, caseId);
    await addEvents(tx, [
      { caseId, actorId: caller.memberId, kind: 'trial-kept', text: `Trial ${number}${note === '' ? '' : `: ${note}`}` },
    ]);
    return requireTrial(tx, caseId, id);
  });
}

/** Newest first. */
export async function listTrials(db: Database, caller: Caller, caseId: string): Promise<Trial[]> {
  await requireCase(db, caller, caseId);
  return (await listTrialsOf(db, caseId)).map(describeTrial);
}

export async function readTrialThumbnail(
  { db, objects }: Pick<Dependencies, 'db' | 'objects'>,
  caller: Caller,
  { caseId, trialId, domain }: { caseId: string; trialId: string; domain: 'image' | 'kspace' },
): Promise<Binary> {
  await requireCase(db, caller, caseId);
  const found = await findTrial(db, caseId, trialId);
  if (found === undefined) throw new AppError('not-found');
  const bytes = await objects.get(domain === 'image' ? found.trial.imageThumbnail : found.trial.kspaceThumbnail);
  return { mediaType: 'image/png', bytes, headers: thumbnailHeaders };
}

async function requireTrial(db: Database, caseId: string, trialId: string): Promise<Trial> {
  const found = await findTrial(db, caseId, trialId);
  if (found === undefined) throw new AppError('not-found');
  return describeTrial(found);
}

function describeTrial({ trial, author }: NonNullable<Awaited<ReturnType<typeof findTrial>>>): Trial {
  const { id, number, note, imageId, frame, compareImageId, compareFrame, phaseEncode, recipe, metrics, digest, createdAt } = trial;
  return trialSchema.parse({
    ...{ id, number, note, imageId, frame, phaseEncode, recipe, metrics, digest, author },
    compareWith: compareImageId === null ? null : { imageId: compareImageId, frame: compareFrame ?? 0 },
    createdAt: createdAt.toISOString(),
  });
}
