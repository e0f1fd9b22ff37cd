/** Statistics of a plane or of a rectangular region of one, over ndarray views: a region is a slice of the plane, not a copy. */
import ndarray from 'ndarray';
import { assign, inf, norm2squared, subs, sum, sup } from 'ndarray-ops';
import type { Plane } from './grid';

/** Rows and columns from the first to before the last. */
export interface Region {
  readonly firstRow: number;
  readonly lastRow: number;
  readonly firstColumn: number;
  readonly lastColumn: number;
}

export interface Statistics {
  readonly n: number;
  readonly mean: number;
  /** Of the sample: divided by n − 1; 0 for a single value. */
  readonly standardDeviation: number;
  readonly min: number;
  readonly max: number;
  readonly median: number;
}

/** The p-th percentile, 0 to 100, linear between the closest ranks. NaN values do not occur in planes and are not looked for. */
export function percentile(values: ArrayLike<number>, p: number): number {
  if (values.length === 0) throw RangeError('percentile needs at least one value, got none');
  if (!(p >= 0 && p <= 100)) throw RangeError(`p must be 0 to 100, got ${p}`);
  const sorted = Float64Array.from(values).sort();
  const rank = (p / 100) * (sorted.length - 1);
  const below = sorted[Math.floor(rank)] as number;
  const above = sorted[Math.ceil(rank)] as number;
  return below + (above - below) * (rank - Math.floor(rank));
}

function requireWithin(plane: Plane, { firstRow, lastRow, firstColumn, lastColumn }: Region): void {
  const isWithin = firstRow >= 0 && firstRow < lastRow && lastRow <= plane.rows;
  if (isWithin && firstColumn >= 0 && firstColumn < lastColumn && lastColumn <= plane.columns) return;
  throw RangeError(
    `region must be a rectangle within ${plane.rows}×${plane.columns}, got rows ${firstRow}–${lastRow}, columns ${firstColumn}–${lastColumn}`,
  );
}

/** Statistics of `plane`, or of `region` of it. */
export function statistics(plane: Plane, region?: Region): Statistics {
  const within = region ?? { firstRow: 0, lastRow: plane.rows, firstColumn: 0, lastColumn: plane.columns };
  requireWithin(plane, within);
  const { firstRow, lastRow, firstColumn, lastColumn } = within;
  const view = ndarray(plane.values, [plane.rows, plane.columns]).hi(lastRow, lastColumn).lo(firstRow, firstColumn);
  const n = view.size;
  const values = new Float64Array(n);
  assign(ndarray(values, view.shape), view);
  const mean = sum(view) / n;
  const centred = ndarray(new Float64Array(n), view.shape);
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
