/**
 * Signal that is imaged elsewhere: the mass of each pixel, taken as even over the pixel, is laid out between the places where its two edges
 * come to lie, x' = x + u(x). Mass is kept: where the map stretches the image is darker by 1/|1 + ∂u/∂x|, where it presses together or
 * folds over it piles up. Complex values add, each with its own phase.
 */
import type { ComplexPlane } from './grid';
import { complexZeros } from './grid';

/** What leaves the picture is lost, as to the filter of the receiver, or comes in again on the other side, as along phase encoding. */
export type Beyond = 'lost' | 'folded';

/** One row or column in memory: index of its first pixel, distance of neighbours, number of pixels. */
interface Strand {
  readonly start: number;
  readonly stride: number;
  readonly n: number;
}

/** Spreads (re, im) evenly from `low` to `high`, in pixels, pixel j reaching from j − ½ to j + ½. */
function lay(
  target: ComplexPlane,
  { start, stride, n }: Strand,
  [re, im]: readonly [number, number],
  [low, high]: readonly [number, number],
  beyond: Beyond,
): void {
  const length = high - low;
  const first = beyond === 'lost' ? Math.max(0, Math.round(low)) : Math.round(low);
  const last = beyond === 'lost' ? Math.min(n - 1, Math.round(high)) : Math.round(high);
  for (let j = first; j <= last; j++) {
    const covered = Math.min(high, j + 0.5) - Math.max(low, j - 0.5);
    // An interval of no length lies whole in the one pixel that it falls in.
    const part = length > 1e-12 ? covered / length : j === first ? 1 : 0;
    if (!(part > 0)) continue;
    const i = start + (((j % n) + n) % n) * stride;
    target.re[i] = (target.re[i] as number) + part * re;
    target.im[i] = (target.im[i] as number) + part * im;
  }
}

/** `plane` with every pixel moved by `pixels` [row, column] towards larger indices of `axis`; edges of pixels move by the mean of the two
 *  pixels that meet there. */
export function displaced(plane: ComplexPlane, axis: 0 | 1, pixels: Float64Array, beyond: Beyond): ComplexPlane {
  const target = complexZeros(plane);
  const { rows, columns } = plane;
  const [nStrands, n, stride, across] = axis === 0 ? [columns, rows, columns, 1] : [rows, columns, 1, columns];
  for (let strand = 0; strand < nStrands; strand++) {
    const start = strand * across;
    const at = (j: number): number => pixels[start + Math.min(n - 1, Math.max(0, j)) * stride] as number;
    for (let j = 0; j < n; j++) {
      const i = start + j * stride;
      const re = plane.re[i] as number;
      const im = plane.im[i] as number;
      if (re === 0 && im === 0) continue;
      const left = j - 0.5 + (at(j - 1) + at(j)) / 2;
      const right = j + 0.5 + (at(j) + at(j + 1)) / 2;
      lay(target, { start, stride, n }, [re, im], [Math.min(left, right), Math.max(left, right)], beyond);
    }
  }
  return target;
}
