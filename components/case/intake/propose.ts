/**
 * Which of the images that came in go on the case at first. Whoever sends a few pictures means these; of a whole series it is the middle
 * slice until somebody chooses, and the others stay reachable as its neighbours.
 */
import type { Image } from '@/server/contract/images';
import type { Slice } from '@/server/contract/series';

/** More of one series than anybody picks by hand. */
export const handPicked = 4;

/** A series as its slices lie in space. Where somebody else has sent the same slices before, those stand for them. */
export type ReadSlices = (imageId: string) => Promise<readonly Slice[]>;

export type ImageThatCame = Pick<Image, 'id' | 'series' | 'component' | 'rows' | 'columns'>;

/** `onCase`: what is chosen already, whose series need no proposal. */
export async function propose(came: readonly ImageThatCame[], onCase: readonly string[], read: ReadSlices): Promise<string[]> {
  const proposed: string[] = [];
  for (const ids of bySeries(came)) {
    const [first] = ids;
    if (first === undefined) continue;
    if (ids.length <= handPicked) {
      proposed.push(...ids);
      continue;
    }
    const series = imagesOf(await read(first));
    if (![...ids, ...series].some((id) => onCase.includes(id))) proposed.push(...middle(series));
  }
  return proposed.filter((id) => !onCase.includes(id));
}

function bySeries(came: readonly ImageThatCame[]): string[][] {
  const groups = new Map<string, string[]>();
  for (const { id, series, component, rows, columns } of came) {
    const key = series === null ? id : [series, component, rows, columns].join(' ');
    groups.set(key, [...(groups.get(key) ?? []), id]);
  }
  return [...groups.values()];
}

/** The images of a series, each once, in the order of space. */
export const imagesOf = (slices: readonly Slice[]): string[] => [...new Set(slices.map(({ imageId }) => imageId))];

const middle = (ids: readonly string[]): string[] => ids.slice(Math.floor((ids.length - 1) / 2)).slice(0, 1);
