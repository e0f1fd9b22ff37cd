/**
 * What amplitudes of the receive chain are relative to: the largest modulus of k-space, and how bright the object is. Gains of stored
 * images are arbitrary, so that no amplitude is ever absolute.
 *
 * The object is what is brighter than 0.15 of the 99th percentile, as in metrics/ghost-ratio; both are common practice.
 */
import type { Encoded } from './cause';
import { inverse } from './fourier';
import type { ComplexPlane } from './grid';
import { magnitude } from './grid';
import { percentile } from './statistics';

const objectThreshold = 0.15;
/** Half width, as a part of the matrix, of the middle of k-space that holds most of the signal. */
const middle = 1 / 32;

/** max |K|; 0 of an empty plane. */
export function largestModulus({ re, im }: ComplexPlane): number {
  let largest = 0;
  for (let i = 0; i < re.length; i++) {
    const a = re[i] as number;
    const b = im[i] as number;
    largest = Math.max(largest, a * a + b * b);
  }
  return Math.sqrt(largest);
}

/** The part of the samples about the centre of k-space that was taken: zero-filling dims the image by as much. */
function densityAtCentre({ rows, columns, taken }: Encoded): number {
  const [row, column] = [Math.floor(rows / 2), Math.floor(columns / 2)];
  const [height, width] = [Math.ceil(rows * middle), Math.ceil(columns * middle)];
  let nTaken = 0;
  let n = 0;
  for (let y = Math.max(0, row - height); y < Math.min(rows, row + height); y++) {
    for (let x = Math.max(0, column - width); x < Math.min(columns, column + width); x++) {
      nTaken += taken[y * columns + x] as number;
      n++;
    }
  }
  return nTaken === 0 ? 1 : nTaken / n;
}

export interface ObjectLevel {
  /** Of the pixels of the object. */
  readonly mean: number;
  /** Of all pixels. */
  readonly percentile99: number;
}

/** Brightness of the object whose k-space this is, from the zero-filled image, set right for evenly skipped lines. Copies that overlap, or
 *  a lost centre, make it an estimate. */
export function objectLevel(kspace: Encoded): ObjectLevel {
  const { values } = magnitude(inverse(kspace));
  const brightness = percentile(values, 99);
  let sum = 0;
  let n = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i] as number;
    if (value <= objectThreshold * brightness) continue;
    sum += value;
    n++;
  }
  const density = densityAtCentre(kspace);
  return { mean: n === 0 ? 0 : sum / n / density, percentile99: brightness / density };
}
