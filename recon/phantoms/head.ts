/**
 * An axial head of ellipses, our own: skin, scalp fat, the two tables of the skull with marrow between, cerebrospinal fluid,
 * cortex with sulci, white matter, ventricles, deep grey matter, and a comb of fine bars for judging resolution. Amounts of tissue add,
 * so each shape says what gives way to it.
 */
import type { ComplexPlane, Grid, Plane } from '../grid';
import type { Random } from '../random';
import { randomOf } from '../random';
import type { Material } from './material';
import { mirrored, oval } from './outline';
import type { Amounts, MaterialShape, Phantom } from './phantom';
import { phantomGrid, replaces, weighted } from './phantom';
import { shapeImage, shapeKspace } from './shape';
import { tissues } from './tissues';

const { skin, fat, bone, marrow, fluid, grey, white, blood } = tissues;

/** Brightness of the picture that is drawn without a sequence, between air at 0 and fat at 1. */
const t1Like: ReadonlyMap<Material, number> = new Map([
  [skin, 0.5],
  [fat, 1],
  [bone, 0.08],
  [marrow, 0.46],
  [fluid, 0.15],
  [grey, 0.5],
  [white, 0.74],
  [blood, 0.5],
]);

const ellipse = (adds: Amounts, ...place: Parameters<typeof oval>): MaterialShape => ({ outline: oval(...place), adds });

/** One shape on the right of the picture and its mirror image on the left. */
function pair(adds: Amounts, ...place: Parameters<typeof oval>): MaterialShape[] {
  const outline = oval(...place);
  return [
    { outline, adds },
    { outline: mirrored(outline), adds },
  ];
}

/** From the skin inwards. The skull is thicker at the back. */
const shells: readonly MaterialShape[] = [
  ellipse([[skin, 1]], [75, 95], [0, 0]),
  ellipse(replaces(fat, skin), [73.4, 93.4], [0, 0]),
  ellipse(replaces(bone, fat), [69.6, 88.8], [0, -0.2]),
  ellipse(replaces(marrow, bone), [67.9, 86.9], [0, -0.4]),
  ellipse(replaces(bone, marrow), [65.3, 83.4], [0, -1]),
  ellipse(replaces(fluid, bone), [63.6, 81.4], [0, -1.2]),
  ellipse(replaces(grey, fluid), [62, 79.6], [0, -1.2]),
];

/** Frontal sinus, and the vein in the fold of the dura behind. */
const midlineOfSkull: readonly MaterialShape[] = [
  ellipse(replaces(bone, marrow), [6.5, 1.3], [3, -85.9], 3),
  ellipse(replaces(blood, fluid), [3.4, 1.9], [0, 77.6]),
];

/** White matter of both hemispheres; the cortex is what is left between it and the shells. */
const whiteMatter = { a: 56, b: 73, y: -1.2 } as const;

/** The fold between the hemispheres, before and behind the corpus callosum: cortex on both sides, fluid between. */
const fissure: readonly MaterialShape[] = [
  ellipse(replaces(grey, white), [5.2, 23], [0, -54]),
  ellipse(replaces(fluid, grey), [0.9, 22], [0, -57]),
  ellipse(replaces(grey, white), [5.4, 20.5], [0, 53.5]),
  ellipse(replaces(fluid, grey), [0.9, 20], [0, 56]),
  ...pair(replaces(fluid, grey, 0.57), [5.5, 1.5], [7.5, -45], -20), // cingulate sulci
  ...pair(replaces(fluid, grey, 0.57), [6, 1.6], [8, 44], 24),
];

const ventricles: readonly MaterialShape[] = [
  ...pair(replaces(fluid, white), [3.7, 12], [8.6, -17], 20),
  ...pair(replaces(fluid, white), [4, 13.5], [20.5, 32], -22),
  ellipse(replaces(fluid, white), [1.5, 9.5], [0, 6]),
  ...pair(replaces(grey, fluid, 0.34), [1.8, 4], [18.8, 27], -22), // choroid plexus
];

const deepGrey: readonly MaterialShape[] = [
  ...pair(replaces(grey, white, 0.79), [4.6, 9.4], [15.6, -15], 21), // caudate
  ...pair(replaces(grey, white, 0.62), [7.2, 12.5], [9.6, 8], -22), // thalamus
  ...pair(replaces(grey, white, 0.75), [5.6, 16.5], [28.2, -2], 10), // putamen
  ...pair(replaces(white, grey, 0.33), [2.9, 10], [25, 0], 14), // pallidum
  ...pair(replaces(grey, white), [2.6, 20], [40.5, -2], 5), // insula
  ...pair(replaces(fluid, white), [1.1, 15], [44.2, -2], 5),
  ...pair(replaces(grey, white), [8.4, 3.4], [50, 9.5], 14), // Sylvian fissure
  ...pair(replaces(fluid, grey, 0.7), [7.4, 0.8], [53.4, 10.4], 14),
];

/** One sulcus at `turn` about the white matter: a bent bay of cortex into it, with a slit of fluid from the surface. */
function sulcus(turn: number, random: Random): MaterialShape[] {
  const edge = { x: whiteMatter.a * Math.cos(turn), y: whiteMatter.y + whiteMatter.b * Math.sin(turn) };
  const normal = Math.atan2(whiteMatter.a * Math.sin(turn), whiteMatter.b * Math.cos(turn)) + 0.5 * (random.uniform() - 0.5);
  const bend = 0.5 * (random.uniform() - 0.5);
  const depth = 6 + 12 * random.uniform();
  const width = 2.1 + 0.8 * random.uniform();
  const inward = (distance: number): [number, number] => [edge.x - distance * Math.cos(normal), edge.y - distance * Math.sin(normal)];
  const degrees = (normal * 180) / Math.PI;
  const [kneeX, kneeY] = inward(depth - 1);
  const tip: [number, number] = [kneeX - 3 * Math.cos(normal + 2 * bend), kneeY - 3 * Math.sin(normal + 2 * bend)];
  return [
    ellipse(replaces(grey, white), [depth / 2, width], inward(depth / 2 - 0.8), degrees),
    ellipse(replaces(grey, white), [3.2, 0.8 * width], tip, degrees + (bend * 360) / Math.PI),
    ellipse(replaces(fluid, grey, 0.8), [depth / 2 + 1.4, 0.55], inward(depth / 2 - 3.4), degrees),
  ];
}

/** Sulci all around, left and right not alike; the Sylvian fissure and the fold in the middle are left free. */
function sulci(random: Random): MaterialShape[] {
  const steps = 44;
  return Array.from({ length: steps }, (_, i) => (360 * (i + 0.3 * (random.uniform() - 0.5))) / steps)
    .filter((degrees) => Math.abs(((degrees + 90) % 180) - 90) > 5 && Math.abs((degrees % 180) - 90) > 8)
    .flatMap((degrees) => sulcus((degrees * Math.PI) / 180, random));
}

/** Faint blotches, so that tissue is not flat: about one part in a hundred. */
const texture = (random: Random): MaterialShape[] =>
  Array.from({ length: 150 }, () => {
    const radius = Math.sqrt(random.uniform());
    const turn = 2 * Math.PI * random.uniform();
    const size: [number, number] = [1.5 + 5 * random.uniform(), 1.5 + 5 * random.uniform()];
    return ellipse(
      [[white, 0.018 * random.normal()]],
      size,
      [52 * radius * Math.cos(turn), 69 * radius * Math.sin(turn)],
      180 * random.uniform(),
    );
  });

/** Three groups of four bars, 1.8, 1.3 and 0.9 mm wide, as far apart as they are wide. */
const comb: readonly MaterialShape[] = [0.9, 0.65, 0.45].flatMap((half, group) =>
  Array.from({ length: 4 }, (_, bar) => ellipse(replaces(fluid, white, 0.5), [half, 3.4], [18 + 4 * half * bar, -47 + 8 * group])),
);

const random = randomOf(5, 'head');

/** 150 mm wide and 190 mm long. */
export const headPhantom: Phantom = {
  id: 'head',
  title: 'Head',
  fieldOfView: 0.24,
  shapes: [
    ...shells,
    ...midlineOfSkull,
    ellipse(replaces(white, grey), [whiteMatter.a, whiteMatter.b], [0, whiteMatter.y]),
    ...fissure,
    ...ventricles,
    ...deepGrey,
    ...sulci(random),
    ...texture(random),
    ...comb,
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
