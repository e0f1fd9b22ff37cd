/**
 * Bays of the surface of the brain. A bay is a run of points: in along the side that comes first clockwise, round the depth, and back
 * along the other; `inset` draws the same bay so far beneath the surface. Millimetres.
 */
import type { Pair } from './outline';
import { around } from './stroke';
import { inwardsAt, surfacePoint } from './surface';

export interface Sulcus {
  /** Where it opens, radians clockwise from the front. */
  readonly turn: number;
  /** Half its width at the surface. */
  readonly halfWidth: number;
  bay(inset: number): Pair[];
}

/** The first points of a bay lie so deep that the border of the white matter has turned in by then. */
const firstDepth = 4;
const narrowing = 0.5;

/** A plain sulcus, `bend` of which is 1 where its depth lies 2.5 mm aside of its mouth. */
export function foldAt(turn: number, { depth, bend, halfWidth }: { depth: number; bend: number; halfWidth: number }): Sulcus {
  const [inX, inY] = inwardsAt(turn);
  const mouth = surfacePoint(turn, 0);
  const at = (distance: number): Pair => {
    const aside = 2.5 * bend * (distance / depth) ** 2 * Math.min(1, depth / 12);
    return [mouth.x + inX * distance + inY * aside, mouth.y + inY * distance - inX * aside];
  };
  const course = [at(0), ...[0, 1, 2, 3].map((i) => at(firstDepth + (i / 3) * (depth - firstDepth)))];
  return { turn, halfWidth, bay: (inset) => around(course, (part) => inset + halfWidth * (1 - narrowing * part)) };
}

/** The fold between the hemispheres, before and behind the corpus callosum. */
export function fissure(end: 'front' | 'back'): Sulcus {
  const [turn, from, to] = end === 'front' ? ([0, -80.6, -43] as const) : ([Math.PI, 78.2, 34] as const);
  const course = Array.from({ length: 6 }, (_, i): Pair => [0, from + (i === 0 ? 0 : 0.12 + (0.88 * (i - 1)) / 4) * (to - from)]);
  return { turn, halfWidth: 1, bay: (inset) => around(course, (part) => inset + 1 - 0.4 * part) };
}

/** The lateral sulcus: a stem from the side, and across its end the cleft over the insula. On the right of the picture. */
export function lateralSulcus(turn: number): Sulcus {
  const halfWidth = 1;
  const stem = surfacePoint(turn, 0).y;
  const cleft = (y: number): number => 41.5 - 0.007 * (y + 2) ** 2;
  const bay = (inset: number): Pair[] => {
    const reach = inset + halfWidth;
    const lateral = (y: number): Pair => [cleft(y) + reach, y];
    const medial = (y: number): Pair => [cleft(y) - reach, y];
    return [
      [55, stem - reach],
      [50, stem - reach],
      [cleft(stem) + reach + 1, stem - reach - 0.4],
      ...[stem - reach - 3, -18, -22].map(lateral),
      [cleft(-24), -24 - reach],
      ...[-22, -14, -5, 4, 12, 17].map(medial),
      [cleft(19), 19 + reach],
      ...[17, 11, 5, stem + reach + 3].map(lateral),
      [cleft(stem) + reach + 1, stem + reach + 0.4],
      [50, stem + reach],
      [55, stem + reach],
    ];
  };
  return { turn, halfWidth, bay };
}
