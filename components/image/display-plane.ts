/**
 * A plane as it is shown: 16-bit samples between two values. Axes are [row, column], row-major; lengths are millimetres.
 * The position of sample [r, c] is `origin + index · spacing`; a sample covers half a spacing to each side of it.
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

export const sameGrid = (a: PlaneGrid, b: PlaneGrid): boolean =>
  a.rows === b.rows &&
  a.columns === b.columns &&
  a.spacing[0] === b.spacing[0] &&
  a.spacing[1] === b.spacing[1] &&
  a.origin[0] === b.origin[0] &&
  a.origin[1] === b.origin[1];
