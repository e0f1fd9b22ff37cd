/**
 * A disc for resolution and contrast, our own: bars across and along like warp and weft in six widths, a fan of narrowing wedges, a block
 * with edges five degrees off the grid, and two spirals of spots that grow smaller, one of 30 % and one of 8 % less signal. The notch in
 * the rim tells how the picture is turned.
 */
import { material } from './material';
import { disc, outlineOf, rectangle } from './outline';
import type { MaterialShape, Phantom } from './phantom';
import { replaces } from './phantom';

const source = 'chosen';
const filling = material('Filling', { protonDensity: 1, t1Ms: [300, 300], t2Ms: [200, 200], source });
const plastic = material('Plastic', { protonDensity: 0, t1Ms: [1000, 1000], t2Ms: [1, 1], source });

/** Takes up to all of the filling away. */
const cut = (outline: MaterialShape['outline'], part = 1): MaterialShape => ({ outline, adds: replaces(plastic, filling, part) });

/** Widths of the bars in millimetres; they lie as far apart as they are wide. */
const barWidths = [3, 2.4, 1.8, 1.4, 1.1, 0.8];
const barsPerGroup = 5;
const barLength = 22;

/** Two rows of groups: upright bars above, level bars below, the widest on the left. */
function bars(): MaterialShape[] {
  const groups: MaterialShape[] = [];
  let x = -66;
  for (const width of barWidths) {
    const extent = (2 * barsPerGroup - 1) * width;
    for (let bar = 0; bar < barsPerGroup; bar++) {
      const offset = 2 * bar * width + width / 2;
      groups.push(cut(rectangle([width, barLength], [x + offset, -14])));
      groups.push(cut(rectangle([extent, width], [x + extent / 2, 4 + offset])));
    }
    x += extent + 6.5;
  }
  return groups;
}

/** Wedges about (x, y) from an inner to an outer radius, as wide as the gaps between them. */
function fan([x, y]: readonly [number, number], [inner, outer]: readonly [number, number], wedges: number): MaterialShape[] {
  return Array.from({ length: wedges }, (_, i) => {
    const at = (radius: number, step: number): [number, number] => {
      const turn = (Math.PI * (2 * i + step)) / wedges;
      return [x + radius * Math.cos(turn), y + radius * Math.sin(turn)];
    };
    return cut(outlineOf([at(inner, 0), at(outer, 0), at(outer, 0.5), at(outer, 1), at(inner, 1), at(inner, 0.5)]));
  });
}

/** Ten spots on a spiral about (x, y), from 5 mm radius down by a fifth each. */
function spiral([x, y]: readonly [number, number], part: number): MaterialShape[] {
  return Array.from({ length: 10 }, (_, i) => {
    const turn = -Math.PI / 2 + i * 0.78;
    const distance = 17.5 - 1.15 * i;
    return cut(disc(5 * 0.82 ** i, [x + distance * Math.cos(turn), y + distance * Math.sin(turn)]), part);
  });
}

/** 190 mm across. */
export const resolutionPhantom: Phantom = {
  id: 'resolution',
  title: 'Resolution and contrast',
  fieldOfView: 0.22,
  shapes: [
    { outline: disc(95, [0, 0]), adds: [[filling, 1]] },
    cut(rectangle([7, 9], [0, -86])),
    ...bars(),
    ...fan([0, -53], [4, 24], 24),
    cut(rectangle([24, 24], [0, 62], 5)),
    ...spiral([-44, 58], 0.3),
    ...spiral([44, 58], 0.08),
  ],
};
