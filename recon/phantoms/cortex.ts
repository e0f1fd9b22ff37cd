/**
 * The folded cortex of one slice of brain, our own: two closed outlines, the surface and the border to the white matter, that follow the
 * same sulci. Each sulcus is a bay of the surface; the cortex is what lies between the two outlines, about equally thick on the crowns and
 * in the depths. Millimetres; turns are clockwise from the front. Measures from memory: cortex 2 to 4 mm thick, sulci 5 to 20 mm deep.
 */
import type { Random } from '../random';
import { closedCurve, type Pair } from './outline';
import type { Outline } from './shape';
import type { Sulcus } from './sulcus';
import { fissure, foldAt, lateralSulcus } from './sulcus';
import { lengthBetween, surfacePoint, surfaceSpeed } from './surface';

const cortexThickness = 2.8;
/** How far the corners between crown and sulcus are rounded. */
const rounding = 0.9;
/** Mean distance of two sulci along the surface. */
const usualSpacing = 10.6;

/** Where the lateral sulcus begins. */
const lateralTurn = 1.47;
/** Left free on either side of the fold between the hemispheres, and of the lateral sulcus. */
const [fissureMargin, lateralMargin] = [0.19, 0.17];

/** Sulci from `from` to `to` of the right half of the surface, evenly spaced but for chance. */
function sulciBetween(from: number, to: number, random: Random): Sulcus[] {
  const n = Math.round(lengthBetween(from, to) / usualSpacing);
  return Array.from({ length: n + 1 }, (_, i) => {
    const jitter = i === 0 || i === n ? 0 : 0.12 * (random.uniform() - 0.5);
    const turn = from + ((i + jitter) / n) * (to - from);
    // Deep and shallow ones by turns; in front of the insula none is deep.
    const { y } = surfacePoint(turn, 0);
    const isOverInsula = Math.abs(y + 3) < 27;
    const depth = isOverInsula ? 5.2 + random.uniform() : i % 2 === 0 ? 6.5 + 2 * random.uniform() : 13 + 5 * random.uniform();
    return foldAt(turn, { depth, bend: Math.sin(5 * turn) + 0.8 * (random.uniform() - 0.5), halfWidth: 0.55 + 0.35 * random.uniform() });
  });
}

/** Of one half, from the front to the back: seen on the right of the picture. */
const hemisphere = (random: Random): Sulcus[] => [
  ...sulciBetween(fissureMargin, lateralTurn - lateralMargin, random),
  lateralSulcus(lateralTurn),
  ...sulciBetween(lateralTurn + lateralMargin, Math.PI - fissureMargin, random),
];

/** The same on the other side: what came last clockwise comes first. */
const mirroredSulcus = ({ turn, halfWidth, bay }: Sulcus): Sulcus => ({
  turn: 2 * Math.PI - turn,
  halfWidth,
  bay: (inset) =>
    bay(inset)
      .map(([x, y]): Pair => [-x, y])
      .reverse(),
});

/** The surface, or with `inset` what lies so far beneath it. */
function outlineBeneath(sulci: readonly Sulcus[], inset: number): Outline {
  const edgeOf = ({ turn, halfWidth }: Sulcus) => (halfWidth + inset + rounding) / surfaceSpeed(turn);
  const points = sulci.flatMap((sulcus, i): Pair[] => {
    const next = sulci[(i + 1) % sulci.length] ?? sulcus;
    const from = sulcus.turn + edgeOf(sulcus);
    const to = next.turn + (next.turn <= sulcus.turn ? 2 * Math.PI : 0) - edgeOf(next);
    const crown = (turn: number, beneath: number): Pair => {
      const { x, y } = surfacePoint(turn, inset + beneath);
      return [x, y];
    };
    return [...sulcus.bay(inset), crown(from, rounding), crown((from + to) / 2, 0), crown(to, rounding)];
  });
  return closedCurve(points.flat(), 3);
}

/** Outline of the brain, and of the white matter within it. The two halves are not alike. */
export function cortexOutlines(random: Random): { surface: Outline; whiteMatter: Outline } {
  const left = hemisphere(random).map(mirroredSulcus).reverse();
  const sulci = [fissure('front'), ...hemisphere(random), fissure('back'), ...left];
  return { surface: outlineBeneath(sulci, 0), whiteMatter: outlineBeneath(sulci, cortexThickness) };
}
