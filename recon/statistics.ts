/** Statistics of a plane or of a region of one, a rectangle or an ellipse, over ndarray views. */
import ndarray from 'ndarray';
import { assign, inf, norm2squared, subs, sum, sup } from 'ndarray-ops';
import type { Plane } from './grid';
import type { Place } from './profile';
import { copyOf, giveBack } from './spare-arrays';

export interface Statistics {
  readonly n: number;
  readonly mean: number;
  /** Of the sample: divided by n − 1; 0 for a single value. */
  readonly standardDeviation: number;
  readonly min: number;
  readonly max: number;
  readonly median: number;
}

/** Rearranges `values` so that the one of rank `k` stands at index k, none greater before it and none less behind it (Hoare 1961,
 *  from memory). Linear on average, where a sort of a whole image would take longer than its transform. */
function selectRank(values: Float64Array, k: number): number {
  let left = 0;
  let right = values.length - 1;
  while (left < right) {
    const pivot = values[(left + right) >> 1] as number;
    let i = left;
    let j = right;
    while (i <= j) {
      while ((values[i] as number) < pivot) i++;
      while ((values[j] as number) > pivot) j--;
      if (i > j) break;
      const swapped = values[i] as number;
      values[i++] = values[j] as number;
      values[j--] = swapped;
    }
    if (k <= j) right = j;
    else if (k >= i) left = i;
    else break;
  }
  return values[k] as number;
}

/** The p-th percentile, 0 to 100, linear between the closest ranks. NaN values do not occur in planes and are not looked for. */
export function percentile(values: ArrayLike<number>, p: number): number {
  if (values.length === 0) throw RangeError('percentile needs at least one value, got none');
  if (!(p >= 0 && p <= 100)) throw RangeError(`p must be 0 to 100, got ${p}`);
  const ranked = copyOf(values);
  const rank = (p / 100) * (ranked.length - 1);
  const k = Math.floor(rank);
  const below = selectRank(ranked, k);
  let above = rank === k ? below : Infinity;
  for (let i = k + 1; rank > k && i < ranked.length; i++) if ((ranked[i] as number) < above) above = ranked[i] as number;
  giveBack(ranked);
  return below + (above - below) * (rank - k);
}

/** The smallest and largest index whose pixel centre lies from `a` to `b`, within a side of `length`. */
function indicesBetween(a: number, b: number, length: number): [first: number, last: number] {
  return [Math.max(0, Math.ceil(Math.min(a, b))), Math.min(length - 1, Math.floor(Math.max(a, b)))];
}

/** Values of the pixels whose centres lie in the rectangle with the corners `from` and `to`. */
export function valuesInRectangle(plane: Plane, from: Place, to: Place): Float64Array {
  const [top, bottom] = indicesBetween(from.row, to.row, plane.rows);
  const [left, right] = indicesBetween(from.column, to.column, plane.columns);
  if (bottom < top || right < left) return new Float64Array(0);
  const view = ndarray(plane.values, [plane.rows, plane.columns])
    .hi(bottom + 1, right + 1)
    .lo(top, left);
  const values = new Float64Array(view.size);
  assign(ndarray(values, view.shape), view);
  return values;
}

/** Values of the pixels whose centres lie in the ellipse that fills that rectangle. */
export function valuesInEllipse(plane: Plane, from: Place, to: Place): Float64Array {
  const [top, bottom] = indicesBetween(from.row, to.row, plane.rows);
  const [left, right] = indicesBetween(from.column, to.column, plane.columns);
  const centre = { row: (from.row + to.row) / 2, column: (from.column + to.column) / 2 };
  const half = { row: Math.abs(to.row - from.row) / 2, column: Math.abs(to.column - from.column) / 2 };
  const values: number[] = [];
  for (let row = top; row <= bottom; row++) {
    for (let column = left; column <= right; column++) {
      const y = half.row > 0 ? (row - centre.row) / half.row : 0;
      const x = half.column > 0 ? (column - centre.column) / half.column : 0;
      if (x * x + y * y <= 1) values.push(plane.values[row * plane.columns + column] as number);
    }
  }
  return Float64Array.from(values);
}

/** Statistics of the values of a plane or of a region of one. Throws where there is none. */
export function statistics(values: Float64Array): Statistics {
  const n = values.length;
  if (n === 0) throw RangeError('statistics need at least one pixel, got none');
  const view = ndarray(values);
  const mean = sum(view) / n;
  const centred = ndarray(new Float64Array(n));
  subs(centred, view, mean);
  return {
    n,
    mean,
    standardDeviation: n > 1 ? Math.sqrt(norm2squared(centred) / (n - 1)) : 0,
    min: inf(view),
    max: sup(view),
    median: percentile(values, 50),
  };
}
