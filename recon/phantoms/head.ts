/**
 * An axial head, our own, at the level of the basal ganglia, seen from the feet: skin, scalp fat with the temporal muscles, the two tables
 * of the skull with marrow between, cerebrospinal fluid, folded cortex, white matter, ventricles and deep grey matter. At this level no
 * orbits are cut. Amounts of tissue add, so each shape says what gives way to it.
 */
import type { ComplexPlane, Grid, Plane } from '../grid';
import { randomOf } from '../random';
import { cortexOutlines } from './cortex';
import type { Material } from './material';
import { closedCurve, disc, mirrored, oval, type Pair } from './outline';
import type { Amounts, MaterialShape, Phantom } from './phantom';
import { phantomGrid, replaces, weighted } from './phantom';
import { shapeImage, shapeKspace } from './shape';
import { eggPoint } from './surface';
import { tissues } from './tissues';

const { skin, fat, muscle, bone, marrow, fluid, grey, white, blood } = tissues;

/** Brightness of the picture that is drawn without a sequence, between air at 0 and fat at 1. */
const t1Like: ReadonlyMap<Material, number> = new Map([
  [skin, 0.5],
  [fat, 1],
  [muscle, 0.45],
  [bone, 0.08],
  [marrow, 0.6],
  [fluid, 0.15],
  [grey, 0.5],
  [white, 0.74],
  [blood, 0.42],
]);

const shape = (outline: MaterialShape['outline'], adds: Amounts): MaterialShape => ({ outline, adds });
const curve = (points: readonly number[], adds: Amounts): MaterialShape => shape(closedCurve(points), adds);

/** One shape on the right of the picture and its mirror image on the left. */
const pair = (outline: MaterialShape['outline'], adds: Amounts): MaterialShape[] => [shape(outline, adds), shape(mirrored(outline), adds)];

/** An oval of the head's own form. */
function egg(axes: Pair, y = 0): MaterialShape['outline'] {
  const points = Array.from({ length: 40 }, (_, i) => eggPoint(axes, (2 * Math.PI * i) / 40, y));
  return closedCurve(points.flatMap((point) => [point.x, point.y]));
}

/** From the skin inwards. The skull is thicker at the back. */
const shells: readonly MaterialShape[] = [
  shape(egg([75.5, 95]), [[skin, 1]]),
  shape(egg([74, 93.4]), replaces(fat, skin)),
  shape(egg([69.4, 88.6], -0.2), replaces(bone, fat)),
  shape(egg([68, 87.2], -0.4), replaces(marrow, bone)),
  shape(egg([65.6, 83.6], -1), replaces(bone, marrow)),
  shape(egg([64, 81.8], -1.2), replaces(fluid, bone)),
];

/** A band beneath the skin on the right, between two distances from it, over part of the way round: the temporal muscle. */
function temporalMuscle(): MaterialShape['outline'] {
  const [from, to, n] = [0.72, 1.62, 7];
  const at = (i: number, inset: number): Pair => {
    const { x, y } = eggPoint([74 - inset, 93.4 - inset], from + (i / n) * (to - from), -0.1);
    return [x, y];
  };
  const along = Array.from({ length: n + 1 }, (_, i) => i);
  const thick = (i: number): number => 1.35 * Math.sin((Math.PI * (i + 0.4)) / (n + 0.8));
  const outer = along.map((i) => at(i, 2.5 - thick(i)));
  const inner = along.map((i) => at(i, 2.5 + thick(i))).reverse();
  return closedCurve([...outer, ...inner].flat());
}

/** Veins in the fold of the dura behind and in front, the muscles at the temples, and the suture lines left out. */
const aroundTheBrain: readonly MaterialShape[] = [
  ...pair(temporalMuscle(), replaces(muscle, fat)),
  curve([-3.6, 79.6, 0, 80.2, 3.6, 79.6, 1.6, 77.9, 0, 76.2, -1.6, 77.9], replaces(blood, fluid)),
  shape(oval([1.8, 0.7], [0, -82.1]), replaces(blood, fluid)),
];

/** Ventricles with the choroid plexus in them, and the cistern behind the thalami. Right of the picture. */
const frontalHorn = closedCurve([1.1, -13, 1, -22, 1.8, -30, 6, -36, 12.6, -39.6, 14, -37.4, 11.2, -30, 7.6, -22, 4.4, -15, 2.4, -11.6]);
const trigone = closedCurve([16, 29.5, 19.4, 26.5, 23.6, 29.4, 26.8, 36.5, 28, 44.5, 26.6, 49, 24.4, 48, 21.6, 42, 18.4, 36]);
const thirdVentricle = closedCurve([0, -6.5, 1, -2, 1.5, 5, 1.3, 12, 0, 17, -1.3, 12, -1.5, 5, -1, -2]);

const ventricles: readonly MaterialShape[] = [
  ...pair(frontalHorn, replaces(fluid, white)),
  ...pair(trigone, replaces(fluid, white)),
  shape(thirdVentricle, replaces(fluid, white)),
  ...pair(oval([1.7, 4.2], [21.3, 32.8], -24), replaces(grey, fluid, 0.6)),
  shape(oval([4.4, 1.5], [0, 20.6]), replaces(fluid, white, 0.9)),
  shape(disc(1.3, [0, 24.8]), replaces(blood, white)),
];

/** Grey matter is paler where fibres run through it: thalamus and pallidum. Right of the picture. */
const caudate = closedCurve([12.2, -30.5, 15, -36.2, 18, -34, 18.4, -27, 15.6, -19.5, 11, -14, 7.4, -12.4, 6.2, -14.2, 9, -21.5]);
const thalamus = closedCurve([2.4, -3.5, 5, -6.5, 9.6, -5, 14, 1, 18.6, 8, 20, 15.5, 16.6, 20.5, 10.5, 20.8, 5.2, 17.4, 2.6, 11, 2.4, 3]);
const putamen = closedCurve([20.8, -24, 25.4, -23.4, 29.6, -15, 31.2, -4, 30.2, 7, 27.2, 15.5, 25.2, 15, 25.6, 7, 25.4, -3, 23.8, -13]);
const pallidum = closedCurve([21.8, -12.5, 24, -3, 24.2, 7.5, 21.4, 4.5, 17.4, -1, 15.2, -6, 18, -10]);
const claustrum = closedCurve([31.6, -20, 34.4, -9, 34.9, 0, 33.6, 11, 33, 11, 34.1, 0, 33.6, -9, 31, -19.6]);

const deepGrey: readonly MaterialShape[] = [
  ...pair(caudate, replaces(grey, white)),
  ...pair(thalamus, replaces(grey, white, 0.75)),
  ...pair(putamen, replaces(grey, white, 0.95)),
  ...pair(pallidum, replaces(grey, white, 0.5)),
  ...pair(claustrum, replaces(grey, white, 0.9)),
];

/** Faint blotches in the white matter, so that tissue is not flat: under one part in a hundred. */
function texture(random: ReturnType<typeof randomOf>): MaterialShape[] {
  return Array.from({ length: 70 }, () => {
    const radius = Math.sqrt(random.uniform());
    const turn = 2 * Math.PI * random.uniform();
    const size: Pair = [3 + 7 * random.uniform(), 3 + 7 * random.uniform()];
    return shape(oval(size, [44 * radius * Math.cos(turn), 60 * radius * Math.sin(turn)], 180 * random.uniform()), [
      [white, 0.006 * random.normal()],
    ]);
  });
}

const { surface, whiteMatter } = cortexOutlines(randomOf(5, 'cortex'));

/** 151 mm wide and 190 mm long. */
export const headPhantom: Phantom = {
  id: 'head',
  title: 'Head',
  fieldOfView: 0.24,
  shapes: [
    ...shells,
    ...aroundTheBrain,
    shape(surface, replaces(grey, fluid)),
    shape(whiteMatter, replaces(white, grey)),
    ...ventricles,
    ...deepGrey,
    ...texture(randomOf(5, 'head')),
  ],
};

/** All shapes with the densities of the T1-like picture. */
export const headShapes = weighted(headPhantom.shapes, (material) => t1Like.get(material) ?? 0);

/** A centred square grid over 240 mm, or over `fieldOfView` metres. */
export const headGrid = (matrix: number, fieldOfView?: number): Grid => phantomGrid(headPhantom, matrix, fieldOfView);

/** The T1-like picture, 0 to about 1. Mixed pixels may fall a little below 0 where shapes cross; a magnitude does not. */
export function headImage(grid: Grid): Plane {
  const plane = shapeImage(headShapes, grid);
  return { ...plane, values: plane.values.map((value) => Math.max(0, value)) };
}

/** Exact k-space of the same shapes. */
export const headKspace = (grid: Grid): ComplexPlane => shapeKspace(headShapes, grid);
