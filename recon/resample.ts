/** A plane on another grid, for comparing images whose pixels or fields of view differ. */
import type { Grid, Plane } from './grid';

/** Whether the areas that the samples of two grids stand for have a part in common. */
function overlaps(a: Grid, b: Grid): boolean {
  const along = (axis: 0 | 1, nA: number, nB: number): boolean => {
    const startA = a.origin[axis] - a.spacing[axis] / 2;
    const startB = b.origin[axis] - b.spacing[axis] / 2;
    return Math.max(startA, startB) < Math.min(startA + nA * a.spacing[axis], startB + nB * b.spacing[axis]);
  };
  return along(0, a.rows, b.rows) && along(1, a.columns, b.columns);
}

/** In samples: positions come from sums of decimal fractions, and an edge that falls on an edge must not flicker. */
const slack = 1e-6;

/** Neighbours of `position` (in samples) and the weight of the second; undefined outside the plane. Within half a sample of the
 *  edge the edge sample holds. */
function neighbours(position: number, n: number): { low: number; high: number; weight: number } | undefined {
  if (position < -0.5 - slack || position > n - 0.5 + slack) return undefined;
  const inside = Math.min(n - 1, Math.max(0, position));
  const low = Math.floor(inside);
  return { low, high: Math.min(n - 1, low + 1), weight: inside - low };
}

/** `plane` at the places of `grid`, bilinear in metres, 0 outside it. Throws RangeError where the two do not overlap. */
export function resample(plane: Plane, grid: Grid): Plane {
  if (!overlaps(plane, grid)) throw RangeError('planes must overlap to be compared, got two that are apart');
  const { rows, columns, spacing, origin } = grid;
  const values = new Float64Array(rows * columns);
  const acrossColumns = Array.from({ length: columns }, (_, column) =>
    neighbours((origin[1] + column * spacing[1] - plane.origin[1]) / plane.spacing[1], plane.columns),
  );
  const at = (row: number, column: number): number => plane.values[row * plane.columns + column] as number;
  for (let row = 0; row < rows; row++) {
    const y = neighbours((origin[0] + row * spacing[0] - plane.origin[0]) / plane.spacing[0], plane.rows);
    if (!y) continue;
    acrossColumns.forEach((x, column) => {
      if (!x) return;
      const upper = at(y.low, x.low) * (1 - x.weight) + at(y.low, x.high) * x.weight;
      const lower = at(y.high, x.low) * (1 - x.weight) + at(y.high, x.high) * x.weight;
      values[row * columns + column] = upper * (1 - y.weight) + lower * y.weight;
    });
  }
  return { rows, columns, spacing, origin, values };
}
