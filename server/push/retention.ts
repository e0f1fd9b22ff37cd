/**
 * What nobody took goes: images that have waited in an inbox for longer than the site says, and the values of discarded images, once no
 * image has them. Values are shared by digest, so an object is left alone for an hour after anybody kept the same bytes: an upload writes
 * its values first and the rows that name them a little later.
 */
import type { Logger } from 'pino';
import { discardOlderThan, forgetDiscarded, listDiscardedValues } from '../../db/queries/inbox';
import type { Dependencies } from '../dependencies';

type SweepDependencies = Pick<Dependencies, 'db' | 'objects' | 'env'>;

const graceMs = 3_600_000;
const betweenSweepsMs = 3_600_000;

/** One round. Returns how many images and how many objects went. */
export async function sweep({ db, objects, env }: SweepDependencies, unusedForMs = graceMs): Promise<{ images: number; objects: number }> {
  const images = await discardOlderThan(db, env.inboxDays);
  let removed = 0;
  for (const { digest, inUse } of await listDiscardedValues(db, unusedForMs)) {
    if (!inUse && !(await objects.remove(digest, unusedForMs))) continue;
    if (!inUse) removed++;
    await forgetDiscarded(db, digest);
  }
  return { images, objects: removed };
}

/** Sweeps now and every hour. Returns how to stop it. */
export function keepSweeping(deps: SweepDependencies & { readonly log: Logger }): () => Promise<void> {
  let round: Promise<void> = Promise.resolve();
  const start = (): void => {
    round = sweep(deps).then(
      (swept) => {
        if (swept.images + swept.objects > 0) deps.log.info(swept, 'swept the inboxes');
      },
      (error: unknown) => deps.log.warn({ err: error }, 'the inboxes could not be swept; the next round tries again'),
    );
  };
  start();
  const timer = setInterval(start, betweenSweepsMs);
  return async () => {
    clearInterval(timer);
    await round;
  };
}
