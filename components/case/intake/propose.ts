/**
 * Which of the images that came in go on the case at first. Whoever sends a few pictures means these; of a whole series it is the middle
 * slice until somebody chooses, and the others stay reachable as its neighbours.
 */
import type { Slice } from '@/server/contract/series';

/** More of one series than anybody picks by hand. */
export const handPicked = 4;

/** One series of those that came in, as its slices lie in space. */
export type ReadSlices = (imageId: string) => Promise<readonly Slice[]>;

/** `onCase`: what is chosen already, whose series need no proposal. */
export async function propose(imageIds: readonly string[], onCase: readonly string[], read: ReadSlices): Promise<string[]> {
  const left = new Set(imageIds);
  const proposed: string[] = [];
  for (const imageId of imageIds) {
    if (!left.has(imageId)) continue;
    const series = imagesOf(await read(imageId));
    const came = [imageId, ...series].filter((id, at, all) => left.has(id) && all.indexOf(id) === at);
    for (const id of came) left.delete(id);
    const isHandPicked = came.length <= handPicked;
    if (isHandPicked) proposed.push(...inOrderOf(imageIds, came));
    else if (!series.some((id) => onCase.includes(id))) proposed.push(...middle(series));
  }
  return proposed.filter((id) => !onCase.includes(id));
}

/** The images of a series, each once, in the order of space. */
export const imagesOf = (slices: readonly Slice[]): string[] => [...new Set(slices.map(({ imageId }) => imageId))];

const inOrderOf = (order: readonly string[], ids: readonly string[]): string[] => order.filter((id) => ids.includes(id));

const middle = (ids: readonly string[]): string[] => ids.slice(Math.floor((ids.length - 1) / 2)).slice(0, 1);
