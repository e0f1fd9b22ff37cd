/**
 * A plane as it is shown: 16-bit samples between two values. Axes are [row, column], row-major; lengths are millimetres
 * (cycles per metre on a grid of k-space). The position of sample [r, c] is `origin + index · spacing`; a sample covers half a spacing to each side of it.
 */

export interface PlaneGrid {
  readonly rows: number;
  readonly columns: number;
  readonly spacing: readonly [row: number, column: number];
  readonly origin: readonly [row: number, column: number];
}

export interface DisplayPlane extends PlaneGrid {
  readonly name: string;
  /** Value of sample 0. */
  readonly low: number;
  /** Value of sample 65535. */
  readonly high: number;
  readonly samples: Uint16Array;
}

export const fullScale = 65535;

/** The value at an index, or null outside the plane. */
export function valueAt(plane: DisplayPlane, row: number, column: number): number | null {
  if (row < 0 || column < 0 || row >= plane.rows || column >= plane.columns) return null;
  const sample = plane.samples[row * plane.columns + column] ?? 0;
  return plane.low + ((plane.high - plane.low) * sample) / fullScale;
}

/** The value of the sample nearest to a position in the units of the grid, or null where the plane does not reach. */
export const valueNear = (plane: DisplayPlane, y: number, x: number): number | null =>
  valueAt(plane, Math.round((y - plane.origin[0]) / plane.spacing[0]), Math.round((x - plane.origin[1]) / plane.spacing[1]));

/** The grid of an image as it was uploaded: floor(N/2) lies at zero. */
export const centredGrid = (rows: number, columns: number, spacing: readonly [number, number]): PlaneGrid => ({
  rows,
  columns,
  spacing,
  origin: [-Math.floor(rows / 2) * spacing[0], -Math.floor(columns / 2) * spacing[1]],
});

export const sameGrid = (a: PlaneGrid, b: PlaneGrid): boolean =>
  a.rows === b.rows &&
  a.columns === b.columns &&
  a.spacing[0] === b.spacing[0] &&
  a.spacing[1] === b.spacing[1] &&
  a.origin[0] === b.origin[0] &&
  a.origin[1] === b.origin[1];
