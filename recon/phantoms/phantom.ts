/**
 * Phantoms of materials: each shape says how much of which material it adds to what lies beneath, so that one drawing serves every
 * sequence, and the image and its k-space are of the same shapes.
 */
import type { ComplexPlane, Grid } from '../grid';
import { centredGrid } from '../grid';
import type { Sequence, Signal } from './contrast';
import { signalOf } from './contrast';
import type { FieldStrength, Material } from './material';
import type { Outline, Shape } from './shape';
import { shapeImage, shapeKspace } from './shape';

/** An amount may be negative: what is displaced. */
export type Amounts = readonly (readonly [material: Material, amount: number])[];

export interface MaterialShape {
  readonly outline: Outline;
  readonly adds: Amounts;
}

export const phantomIds = ['head', 'abdomen', 'resolution', 'vials'] as const;
export type PhantomId = (typeof phantomIds)[number];

export interface Phantom {
  readonly id: PhantomId;
  readonly title: string;
  /** Metres along both axes in which it stands with air around it. */
  readonly fieldOfView: number;
  readonly shapes: readonly MaterialShape[];
}

export interface Scan {
  readonly sequence: Sequence;
  readonly fieldStrength: FieldStrength;
}

/** `part` of what was `below` gives way to `material`. */
export const replaces = (material: Material, below: Material, part = 1): Amounts => [
  [material, part],
  [below, -part],
];

/** The shapes with a density of `weigh` for each unit of material. */
export const weighted = (shapes: readonly MaterialShape[], weigh: (material: Material) => number): Shape[] =>
  shapes.map(({ outline, adds }) => ({ ...outline, density: adds.reduce((sum, [material, amount]) => sum + amount * weigh(material), 0) }));

/** A centred square grid over the phantom's own field of view, or over `fieldOfView` metres. */
export const phantomGrid = ({ fieldOfView: own }: Phantom, matrix: number, fieldOfView = own): Grid =>
  centredGrid(matrix, matrix, [fieldOfView / matrix, fieldOfView / matrix]);

/** Shapes that give the real part of the signal, and those that give the imaginary part. */
function partsOf({ shapes }: Phantom, { sequence, fieldStrength }: Scan): Record<keyof Signal, Shape[]> {
  const part = (name: keyof Signal) => weighted(shapes, (material) => signalOf(material, sequence, fieldStrength)[name]);
  // A shape without an imaginary part is not drawn there.
  return { re: part('re'), im: part('im').filter(({ density }) => density !== 0) };
}

/** The phantom as `scan` sees it, complex where fat is out of phase with water; each pixel the mean over its area. */
export function phantomImage(phantom: Phantom, grid: Grid, scan: Scan): ComplexPlane {
  const parts = partsOf(phantom, scan);
  const { values: re, ...place } = shapeImage(parts.re, grid);
  return { ...place, re, im: shapeImage(parts.im, grid).values };
}

/** Exact k-space of the same shapes, on the reciprocal of `image`, in the scale of the orthonormal transform. */
export function phantomKspace(phantom: Phantom, image: Grid, scan: Scan): ComplexPlane {
  const parts = partsOf(phantom, scan);
  const kspace = shapeKspace(parts.re, image);
  if (parts.im.length === 0) return kspace;
  const turned = shapeKspace(parts.im, image);
  return {
    ...kspace,
    re: kspace.re.map((value, i) => value - (turned.im[i] as number)),
    im: kspace.im.map((value, i) => value + (turned.re[i] as number)),
  };
}

/** How much of all materials together a pixel holds: 0 in air, 1 inside. */
export const fillOf = ({ shapes }: Phantom, grid: Grid): Float64Array =>
  shapeImage(
    weighted(shapes, () => 1),
    grid,
  ).values;
