/**
 * An axial head of ellipses, T1-like, our own: skin, scalp fat, the two tables of the skull with marrow between, cerebrospinal fluid,
 * cortex with sulci, white matter, ventricles, deep grey matter, and a comb of fine bars for judging resolution. Densities add, so
 * each shape carries the difference from what it lies on. Millimetres in the tables below, metres outside.
 */
import type { ComplexPlane, Grid, Plane } from '../grid';
import { centredGrid } from '../grid';
import type { Random } from '../random';
import { randomOf } from '../random';
import type { Ellipse } from './ellipse';
import { ellipseImage, ellipseKspace } from './ellipse';

/** Densities of the tissues, between air at 0 and fat at 1. */
const tissue = { skin: 0.5, fat: 1, bone: 0.08, marrow: 0.46, fluid: 0.15, grey: 0.5, white: 0.74 } as const;

/** Millimetres and degrees. */
const ellipse = (density: number, [a, b]: readonly [number, number], [x, y]: readonly [number, number], degrees = 0): Ellipse => ({
  density,
  a: a / 1000,
  b: b / 1000,
  x: x / 1000,
  y: y / 1000,
  angle: (degrees * Math.PI) / 180,
});

/** One shape on the right of the picture and its mirror image on the left. */
const pair = (density: number, size: readonly [number, number], [x, y]: readonly [number, number], degrees = 0): Ellipse[] => [
  ellipse(density, size, [x, y], degrees),
  ellipse(density, size, [-x, y], -degrees),
];

/** From the skin inwards. The skull is thicker at the back. */
const shells: readonly Ellipse[] = [
  ellipse(tissue.skin, [75, 95], [0, 0]),
  ellipse(tissue.fat - tissue.skin, [73.4, 93.4], [0, 0]),
  ellipse(tissue.bone - tissue.fat, [69.6, 88.8], [0, -0.2]),
  ellipse(tissue.marrow - tissue.bone, [67.9, 86.9], [0, -0.4]),
  ellipse(tissue.bone - tissue.marrow, [65.3, 83.4], [0, -1]),
  ellipse(tissue.fluid - tissue.bone, [63.6, 81.4], [0, -1.2]),
  ellipse(tissue.grey - tissue.fluid, [62, 79.6], [0, -1.2]),
];

/** Frontal sinus, and the vein in the fold of the dura behind. */
const midlineOfSkull: readonly Ellipse[] = [
  ellipse(tissue.bone - tissue.marrow, [6.5, 1.3], [3, -85.9], 3),
  ellipse(tissue.skin - tissue.fluid, [3.4, 1.9], [0, 77.6]),
];

/** White matter of both hemispheres; the cortex is what is left between it and the shells. */
const white = { a: 56, b: 73, y: -1.2 } as const;

/** The fold between the hemispheres, before and behind the corpus callosum: cortex on both sides, fluid between. */
const fissure: readonly Ellipse[] = [
  ellipse(tissue.grey - tissue.white, [5.2, 23], [0, -54]),
  ellipse(tissue.fluid - tissue.grey, [0.9, 22], [0, -57]),
  ellipse(tissue.grey - tissue.white, [5.4, 20.5], [0, 53.5]),
  ellipse(tissue.fluid - tissue.grey, [0.9, 20], [0, 56]),
  ...pair(-0.2, [5.5, 1.5], [7.5, -45], -20), // cingulate sulci
  ...pair(-0.2, [6, 1.6], [8, 44], 24),
];

const ventricles: readonly Ellipse[] = [
  ...pair(tissue.fluid - tissue.white, [3.7, 12], [8.6, -17], 20),
  ...pair(tissue.fluid - tissue.white, [4, 13.5], [20.5, 32], -22),
  ellipse(tissue.fluid - tissue.white, [1.5, 9.5], [0, 6]),
  ...pair(0.12, [1.8, 4], [18.8, 27], -22), // choroid plexus
];

const deepGrey: readonly Ellipse[] = [
  ...pair(-0.19, [4.6, 9.4], [15.6, -15], 21), // caudate
  ...pair(-0.15, [7.2, 12.5], [9.6, 8], -22), // thalamus
  ...pair(-0.18, [5.6, 16.5], [28.2, -2], 10), // putamen
  ...pair(0.08, [2.9, 10], [25, 0], 14), // pallidum
  ...pair(tissue.grey - tissue.white, [2.6, 20], [40.5, -2], 5), // insula
  ...pair(tissue.fluid - tissue.white, [1.1, 15], [44.2, -2], 5),
  ...pair(-0.24, [8.4, 3.4], [50, 9.5], 14), // Sylvian fissure
  ...pair(0.7 * (tissue.fluid - tissue.grey), [7.4, 0.8], [53.4, 10.4], 14),
];

/** One sulcus at `turn` about the white matter: a bent bay of cortex into it, with a slit of fluid from the surface. */
function sulcus(turn: number, random: Random): Ellipse[] {
  const edge = { x: white.a * Math.cos(turn), y: white.y + white.b * Math.sin(turn) };
  const normal = Math.atan2(white.a * Math.sin(turn), white.b * Math.cos(turn)) + 0.5 * (random.uniform() - 0.5);
  const bend = 0.5 * (random.uniform() - 0.5);
  const depth = 6 + 12 * random.uniform();
  const width = 2.1 + 0.8 * random.uniform();
  const inward = (distance: number): [number, number] => [edge.x - distance * Math.cos(normal), edge.y - distance * Math.sin(normal)];
  const degrees = (normal * 180) / Math.PI;
  const [kneeX, kneeY] = inward(depth - 1);
  const tip: [number, number] = [kneeX - 3 * Math.cos(normal + 2 * bend), kneeY - 3 * Math.sin(normal + 2 * bend)];
  return [
    ellipse(tissue.grey - tissue.white, [depth / 2, width], inward(depth / 2 - 0.8), degrees),
    ellipse(tissue.grey - tissue.white, [3.2, 0.8 * width], tip, degrees + (bend * 360) / Math.PI),
    ellipse(0.8 * (tissue.fluid - tissue.grey), [depth / 2 + 1.4, 0.55], inward(depth / 2 - 3.4), degrees),
  ];
}

/** Sulci all around, left and right not alike; the Sylvian fissure and the fold in the middle are left free. */
function sulci(random: Random): Ellipse[] {
  const steps = 44;
  return Array.from({ length: steps }, (_, i) => (360 * (i + 0.3 * (random.uniform() - 0.5))) / steps)
    .filter((degrees) => Math.abs(((degrees + 90) % 180) - 90) > 5 && Math.abs((degrees % 180) - 90) > 8)
    .flatMap((degrees) => sulcus((degrees * Math.PI) / 180, random));
}

/** Faint blotches, so that tissue is not flat: about one part in a hundred. */
const texture = (random: Random): Ellipse[] =>
  Array.from({ length: 150 }, () => {
    const radius = Math.sqrt(random.uniform());
    const turn = 2 * Math.PI * random.uniform();
    const size: [number, number] = [1.5 + 5 * random.uniform(), 1.5 + 5 * random.uniform()];
    return ellipse(0.013 * random.normal(), size, [52 * radius * Math.cos(turn), 69 * radius * Math.sin(turn)], 180 * random.uniform());
  });

/** Three groups of four bars, 1.8, 1.3 and 0.9 mm wide, as far apart as they are wide. */
const comb: readonly Ellipse[] = [0.9, 0.65, 0.45].flatMap((half, group) =>
  Array.from({ length: 4 }, (_, bar) => ellipse(-0.3, [half, 3.4], [18 + 4 * half * bar, -47 + 8 * group])),
);

const random = randomOf(5, 'head');

/** All shapes, metres from the image centre; the head is 150 mm wide and 190 mm long. */
export const headShapes: readonly Ellipse[] = [
  ...shells,
  ...midlineOfSkull,
  ellipse(tissue.white - tissue.grey, [white.a, white.b], [0, white.y]),
  ...fissure,
  ...ventricles,
  ...deepGrey,
  ...sulci(random),
  ...texture(random),
  ...comb,
];

/** A centred square grid over 240 mm, or over `fieldOfView` metres. */
export const headGrid = (matrix: number, fieldOfView = 0.24): Grid =>
  centredGrid(matrix, matrix, [fieldOfView / matrix, fieldOfView / matrix]);

/** The head as a picture, 0 to about 1. Mixed pixels may fall a little below 0 where shapes cross; a magnitude does not. */
export function headImage(grid: Grid): Plane {
  const plane = ellipseImage(headShapes, grid);
  return { ...plane, values: plane.values.map((value) => Math.max(0, value)) };
}

/** Exact k-space of the same shapes. */
export const headKspace = (grid: Grid): ComplexPlane => ellipseKspace(headShapes, grid);
