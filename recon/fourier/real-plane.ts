/**
 * Transform of a real plane by its symmetry. Two rows a and b go through one complex transform as z = a + ib, and come apart again:
 *   A(k) = (Z(k) + conj Z(−k))/2,  B(k) = (Z(k) − conj Z(−k))/2i.
 * Columns are transformed for k ≥ 0 only; the rest of k-space is K(−ky, −kx) = conj K(ky, kx). Common practice.
 */
import { giveBackPlane, unwrittenArray } from '../spare-arrays';
import { transformLines } from './axis';
import type { Lanes } from './lanes';

/** The place of −k where k stands at `index` of n samples; −n/2 of an even count is its own mirror image. */
const mirrored = (index: number, n: number): number => (2 * Math.floor(n / 2) - index) % n;

interface RealPlane {
  readonly rows: number;
  readonly columns: number;
  readonly values: Float64Array;
}

/** Rows 2r as real, rows 2r + 1 as imaginary part of row r, in the first half of the arrays. A last row without another has zeros beside it. */
function paired({ rows, columns, values }: RealPlane): Lanes {
  const nPairs = Math.ceil(rows / 2);
  const pairs = { re: unwrittenArray(rows * columns), im: unwrittenArray(rows * columns) };
  if (rows % 2 === 1) pairs.im.fill(0, (nPairs - 1) * columns);
  for (let row = 0; row < rows; row++) {
    (row % 2 === 0 ? pairs.re : pairs.im).set(values.subarray(row * columns, (row + 1) * columns), (row >> 1) * columns);
  }
  return pairs;
}

/** Row spectra out of those of pairs, at the given columns. */
function takeApart(pairs: Lanes, plane: Lanes, { rows, columns }: RealPlane, kept: Int32Array): void {
  for (let row = 0; row < rows; row++) {
    const start = (row >> 1) * columns;
    for (const column of kept) {
      const near = start + column;
      const far = start + mirrored(column, columns);
      const to = row * columns + column;
      const zr = pairs.re[near] as number;
      const zi = pairs.im[near] as number;
      const mr = pairs.re[far] as number;
      const mi = pairs.im[far] as number;
      plane.re[to] = row % 2 === 0 ? (zr + mr) / 2 : (zi + mi) / 2;
      plane.im[to] = row % 2 === 0 ? (zi - mi) / 2 : (mr - zr) / 2;
    }
  }
}

/** The columns that were passed over, from those at −k. */
function fillMirrored({ re, im }: Lanes, { rows, columns }: RealPlane): void {
  const firstColumn = columns % 2 === 0 ? 1 : 0;
  for (let row = 0; row < rows; row++) {
    const opposite = mirrored(row, rows) * columns;
    for (let column = firstColumn; column < Math.floor(columns / 2); column++) {
      const from = opposite + mirrored(column, columns);
      re[row * columns + column] = re[from] as number;
      im[row * columns + column] = -(im[from] as number);
    }
  }
}

/** Centred, orthonormal transform of `plane`, [row, column]. */
export function transformReal(plane: RealPlane): Lanes {
  const { rows, columns, values } = plane;
  const pairs = paired(plane);
  const allPairs = Int32Array.from({ length: Math.ceil(rows / 2) }, (_, pair) => pair);
  transformLines({ from: pairs, to: pairs }, [allPairs.length, columns], 1, 'forward', allPairs);

  const result = { re: unwrittenArray(values.length), im: unwrittenArray(values.length) };
  const kept = Int32Array.from({ length: columns }, (_, column) => column).filter(
    (column) => column >= Math.floor(columns / 2) || mirrored(column, columns) === column,
  );
  takeApart(pairs, result, plane, kept);
  giveBackPlane(pairs);
  transformLines({ from: result, to: result }, [rows, columns], 0, 'forward', kept);
  fillMirrored(result, plane);
  return result;
}
