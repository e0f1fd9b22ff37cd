/** What the inbox says of a series, and of a sender that was not let in. */
import { dayOf } from '@/components/case/age';
import type { InboxImage, PushRefusal } from '@/server/contract/push';

const images = (count: number): string => (count === 1 ? '1 image' : `${count} images`);

/** `12 images · scanned 09:41 to 09:58 · 256 × 256`. Times are those of the scan: of the day nothing is kept. */
export function seriesWords(series: readonly InboxImage[]): string {
  const [first] = series;
  const times = series.flatMap(({ timeOfDay }) => (timeOfDay === null ? [] : [timeOfDay.slice(0, 5)])).sort();
  const [from, to] = [times.at(0), times.at(-1)];
  const scanned = from === undefined ? '' : from === to ? `scanned ${from}` : `scanned ${from} to ${to}`;
  return [images(series.length), scanned, first && `${first.columns} × ${first.rows}`].filter(Boolean).join(' · ');
}

/** The title of a case that is made in one tap; whoever looks into it gives it a better one. */
export const caseTitle = (scanner: string, receivedAt: string): string =>
  `Sent by ${scanner}, ${dayOf(receivedAt, receivedAt).replace(/^day 0, /, '')}`;

/** Why the scanner itself was not let in, and what to do about it; an object's refusal has words of its own. */
export function refusalWords(refusal: PushRefusal): string {
  if (refusal === 'calling-title') return 'it called itself by another AE title than the one set here';
  if (refusal === 'called-title') return 'it asked for another AE title than ours: correct it at the scanner';
  if (refusal === 'address') return 'it called from an address that is not on the list';
  if (refusal === 'busy') return 'the server was too busy: send again';
  return `an object was refused: ${refusal.replaceAll('-', ' ')}`;
}
