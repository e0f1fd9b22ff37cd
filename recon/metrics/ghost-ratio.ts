/**
 * Ghost ÷ signal of a magnitude image: the mean of the air that the object's ghosts can reach, over the mean of the object. Object:
 * I > 0.15 × the 99th percentile, its holes filled. Ghost region: the air that lies before or behind the object along the phase
 * encoding. Other air: the rest, which only noise reaches. The thresholds are common practice.
 */
import type { PhaseEncode } from '../acquisition';
import { phaseEncodeAxis } from '../acquisition';
import type { Plane } from '../grid';
import { giveBackBytes, unwrittenBytes } from '../spare-arrays';
import { percentile } from '../statistics';

export interface RegionMean {
  readonly nPixels: number;
  /** null where the region is empty. */
  readonly mean: number | null;
}

export interface GhostRatio {
  /** null where it cannot be measured; `because` then says why. */
  readonly value: number | null;
  readonly because?: string;
  readonly regions: { readonly object: RegionMean; readonly ghost: RegionMean; readonly otherAir: RegionMean };
}

const objectThreshold = 0.15;
/** Pixels about the object that count as neither: its edge is blurred. */
const guard = 3;
/** A smaller region gives a mean that one bright pixel can turn. */
const leastPixels = 200;
/** Scanners that blank the air leave exact zeros in it; noise and ghosts do not. */
const mostZeros = 0.25;

/** Pixels that were reached, in their order; kept, as it is as large as the image. */
let reached = new Int32Array(0);

/** I > 0.15·P99, and everything that it encloses: what cannot be reached from the border over fainter pixels. */
export function objectMask({ rows, columns, values }: Plane): Uint8Array {
  const threshold = objectThreshold * percentile(values, 99);
  const mask = unwrittenBytes(values.length).fill(1);
  // Every pixel is reached once at most.
  if (reached.length < values.length) reached = new Int32Array(values.length);
  let nReached = 0;
  const reach = (i: number): void => {
    if (mask[i] === 0 || (values[i] as number) > threshold) return;
    mask[i] = 0;
    reached[nReached++] = i;
  };
  for (let row = 0; row < rows; row++) for (const column of [0, columns - 1]) reach(row * columns + column);
  for (let column = 0; column < columns; column++) for (const row of [0, rows - 1]) reach(row * columns + column);
  for (let next = 0; next < nReached; next++) {
    const i = reached[next] as number;
    if (i >= columns) reach(i - columns);
    if (i < values.length - columns) reach(i + columns);
    // Beyond the end of a row lies a pixel of the border, at which the search began: it is not reached again.
    if (i > 0) reach(i - 1);
    if (i < values.length - 1) reach(i + 1);
  }
  return mask;
}

/** 1 where the mask has a pixel within `guard` along one strand; how many there are follows from what enters and what leaves. */
function grownAlong(mask: Uint8Array, grown: Uint8Array, { start, stride, n }: { start: number; stride: number; n: number }): void {
  let within = 0;
  for (let j = 0; j < Math.min(guard, n); j++) within += mask[start + j * stride] as number;
  for (let j = 0; j < n; j++) {
    if (j + guard < n) within += mask[start + (j + guard) * stride] as number;
    if (j > guard) within -= mask[start + (j - guard - 1) * stride] as number;
    grown[start + j * stride] = within > 0 ? 1 : 0;
  }
}

/** The mask and all pixels within `guard` of it along rows or columns: a square, grown along one axis after the other. */
function dilated(mask: Uint8Array, rows: number, columns: number): Uint8Array {
  const along = unwrittenBytes(mask.length);
  for (let row = 0; row < rows; row++) grownAlong(mask, along, { start: row * columns, stride: 1, n: columns });
  const grown = unwrittenBytes(mask.length);
  for (let column = 0; column < columns; column++) grownAlong(along, grown, { start: column, stride: columns, n: rows });
  giveBackBytes(along);
  return grown;
}

/** 1 for each line along the phase encoding that meets the object: columns for axis 0, rows for axis 1. */
function linesThrough(object: Uint8Array, rows: number, columns: number, axis: 0 | 1): Uint8Array {
  const meets = new Uint8Array(axis === 0 ? columns : rows);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      if (object[row * columns + column] === 1) meets[axis === 0 ? column : row] = 1;
    }
  }
  return meets;
}

interface Tally {
  sum: number;
  nPixels: number;
  zeros: number;
}

const noPixels = (): Tally => ({ sum: 0, nPixels: 0, zeros: 0 });

function count(entry: Tally, value: number): void {
  entry.sum += value;
  entry.nPixels++;
  if (value === 0) entry.zeros++;
}

/** Sums over the object, over the air that its ghosts reach, and over the rest of the air; the edge of the object is none of them. */
function tally(image: Plane, axis: 0 | 1): Record<'object' | 'ghost' | 'otherAir', Tally> {
  const { rows, columns, values } = image;
  const object = objectMask(image);
  const nearObject = dilated(object, rows, columns);
  const meetsObject = linesThrough(object, rows, columns, axis);
  const tallies = { object: noPixels(), ghost: noPixels(), otherAir: noPixels() };
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const i = row * columns + column;
      const air = meetsObject[axis === 0 ? column : row] === 1 ? tallies.ghost : tallies.otherAir;
      if (object[i] === 1) count(tallies.object, values[i] as number);
      else if (nearObject[i] === 0) count(air, values[i] as number);
    }
  }
  giveBackBytes(object);
  giveBackBytes(nearObject);
  return tallies;
}

const region = ({ nPixels, sum }: Tally): RegionMean => ({ nPixels, mean: nPixels > 0 ? sum / nPixels : null });

/** Mean of the ghost region over mean of the object, 0 upwards. */
export function ghostRatio(image: Plane, phaseEncode: PhaseEncode): GhostRatio {
  const sums = tally(image, phaseEncodeAxis(phaseEncode));
  const regions = { object: region(sums.object), ghost: region(sums.ghost), otherAir: region(sums.otherAir) };
  const { object, ghost } = regions;
  const not = (because: string): GhostRatio => ({ value: null, because, regions });
  if (object.mean === null || !(object.mean > 0)) return not('no object stands out from the background');
  if (ghost.mean === null || ghost.nPixels < leastPixels) return not('the object leaves no air along the phase encoding');
  if (sums.ghost.zeros > mostZeros * ghost.nPixels) return not('the air is blanked: a good part of it is exactly zero');
  return { value: ghost.mean / object.mean, regions };
}
