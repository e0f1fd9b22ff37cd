/**
 * Ghost ÷ signal of a magnitude image: the mean of the air that the object's ghosts can reach, over the mean of the object. Object:
 * I > 0.15 × the 99th percentile, its holes filled. Ghost region: the air that lies before or behind the object along the phase
 * encoding. Other air: the rest, which only noise reaches. The thresholds are common practice.
 */
import type { PhaseEncode } from '../acquisition';
import { phaseEncodeAxis } from '../acquisition';
import type { Plane } from '../grid';
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

/** I > 0.15·P99, and everything that it encloses: what cannot be reached from the border over fainter pixels. */
export function objectMask({ rows, columns, values }: Plane): Uint8Array {
  const threshold = objectThreshold * percentile(values, 99);
  const mask = new Uint8Array(values.length).fill(1);
  const reached: number[] = [];
  const reach = (row: number, column: number): void => {
    if (row < 0 || column < 0 || row >= rows || column >= columns) return;
    const i = row * columns + column;
    if (mask[i] === 0 || (values[i] as number) > threshold) return;
    mask[i] = 0;
    reached.push(i);
  };
  for (let row = 0; row < rows; row++) for (const column of [0, columns - 1]) reach(row, column);
  for (let column = 0; column < columns; column++) for (const row of [0, rows - 1]) reach(row, column);
  for (let i = reached.pop(); i !== undefined; i = reached.pop()) {
    const row = Math.floor(i / columns);
    const column = i % columns;
    reach(row - 1, column);
    reach(row + 1, column);
    reach(row, column - 1);
    reach(row, column + 1);
  }
  return mask;
}

/** The mask and all pixels within `guard` of it along rows or columns. */
function dilated(mask: Uint8Array, rows: number, columns: number): Uint8Array {
  const grown = new Uint8Array(mask.length);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      if (mask[row * columns + column] === 0) continue;
      for (let r = Math.max(0, row - guard); r <= Math.min(rows - 1, row + guard); r++) {
        grown.fill(1, r * columns + Math.max(0, column - guard), r * columns + Math.min(columns - 1, column + guard) + 1);
      }
    }
  }
  return grown;
}

function meanOver(values: Float64Array, isInside: (i: number) => boolean): RegionMean & { zeros: number } {
  let sum = 0;
  let nPixels = 0;
  let zeros = 0;
  for (let i = 0; i < values.length; i++) {
    if (!isInside(i)) continue;
    nPixels++;
    sum += values[i] as number;
    if (values[i] === 0) zeros++;
  }
  return { nPixels, mean: nPixels > 0 ? sum / nPixels : null, zeros };
}

/** Mean of the ghost region over mean of the object, 0 upwards. */
export function ghostRatio(image: Plane, phaseEncode: PhaseEncode): GhostRatio {
  const { rows, columns, values } = image;
  const object = objectMask(image);
  const nearObject = dilated(object, rows, columns);
  const axis = phaseEncodeAxis(phaseEncode);
  // Lines along the phase encoding that meet the object: columns for axis 0, rows for axis 1.
  const meetsObject = new Uint8Array(axis === 0 ? columns : rows);
  const lineOf = (i: number): number => (axis === 0 ? i % columns : Math.floor(i / columns));
  object.forEach((isObject, i) => {
    if (isObject === 1) meetsObject[lineOf(i)] = 1;
  });
  const inObject = meanOver(values, (i) => object[i] === 1);
  const ghost = meanOver(values, (i) => nearObject[i] === 0 && meetsObject[lineOf(i)] === 1);
  const otherAir = meanOver(values, (i) => nearObject[i] === 0 && meetsObject[lineOf(i)] === 0);
  const region = ({ nPixels, mean }: RegionMean): RegionMean => ({ nPixels, mean });
  const regions = { object: region(inObject), ghost: region(ghost), otherAir: region(otherAir) };
  const not = (because: string): GhostRatio => ({ value: null, because, regions });
  if (inObject.mean === null || !(inObject.mean > 0)) return not('no object stands out from the background');
  if (ghost.mean === null || ghost.nPixels < leastPixels) return not('the object leaves no air along the phase encoding');
  if (ghost.zeros > mostZeros * ghost.nPixels) return not('the air is blanked: a good part of it is exactly zero');
  return { value: ghost.mean / inObject.mean, regions };
}
