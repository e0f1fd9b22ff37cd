/** A scanner's inbox: what it sent and nobody has taken yet, by series, the newest first. */
import { countInbox, discardFromInbox, listInbox } from '../../db/queries/inbox';
import { scanFactsSchema } from '../contract/facts';
import type { Inbox, InboxImage } from '../contract/push';
import type { Dependencies } from '../dependencies';
import { requireScanner } from './scanner-push';
import type { Caller } from './sessions';

/** More than a page can show; what is older comes up as the newer is taken or discarded. */
const mostShown = 1000;

export async function readInbox({ db, env }: Pick<Dependencies, 'db' | 'env'>, caller: Caller, scannerId: string): Promise<Inbox> {
  await requireScanner(db, caller, scannerId);
  const rows = await listInbox(db, scannerId, mostShown);
  const series = new Map<string, InboxImage[]>();
  for (const { seriesKey, receivedAt, headerFacts, ...image } of rows) {
    const key = seriesKey ?? image.id;
    const { timeOfDay } = scanFactsSchema.parse(headerFacts);
    const images = series.get(key) ?? [];
    images.unshift({ ...image, receivedAt: receivedAt.toISOString(), timeOfDay: timeOfDay.value });
    series.set(key, images);
  }
  const total = rows.length < mostShown ? rows.length : await countInbox(db, scannerId);
  return { series: [...series.values()].map((images) => ({ images })), total, keptDays: env.inboxDays };
}

export async function discardImages(
  { db }: Pick<Dependencies, 'db'>,
  caller: Caller,
  scannerId: string,
  imageIds: string[],
): Promise<{ discarded: number }> {
  await requireScanner(db, caller, scannerId);
  return { discarded: await discardFromInbox(db, scannerId, imageIds) };
}
