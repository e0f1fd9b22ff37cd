/**
 * Planes on a grid: the one shape of data that the science passes around.
 *
 * Convention: axes are [row, column], row-major; rows are y and grow downwards, columns are x. The origin of an image and the
 * zero frequency of k-space both sit at index floor(N/2) of each axis. Lengths are metres.
 */

import { unwrittenArray } from './spare-arrays';

/** Size and place of a plane. `spacing` [row, column] in metres; `origin` is the position of index [0, 0] in metres, relative to
 *  the centre sample floor(N/2) of the uploaded image, so that planes on different grids can be laid over one another. */
export interface Grid {
  readonly rows: number;
  readonly columns: number;
  readonly spacing: readonly [row: number, column: number];
  readonly origin: readonly [row: number, column: number];
}

/** Real values, [row, column]. */
export interface Plane extends Grid {
  readonly values: Float64Array;
}

/** Complex values as two arrays, [row, column] each. */
export interface ComplexPlane extends Grid {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** The grid with its origin such that index floor(N/2) lies at 0 on both axes. */
export function centredGrid(rows: number, columns: number, spacing: readonly [number, number]): Grid {
  return { rows, columns, spacing, origin: [-Math.floor(rows / 2) * spacing[0], -Math.floor(columns / 2) * spacing[1]] };
}

/** Complex zeros on `grid`. */
export function complexZeros({ rows, columns, spacing, origin }: Grid): ComplexPlane {
  return { rows, columns, spacing, origin, re: new Float64Array(rows * columns), im: new Float64Array(rows * columns) };
}

/** |z| of every sample. */
export function magnitude(plane: ComplexPlane): Plane {
  const { rows, columns, spacing, origin, re, im } = plane;
  const values = unwrittenArray(re.length);
  for (let i = 0; i < values.length; i++) {
    const a = re[i] as number;
    const b = im[i] as number;
    values[i] = Math.sqrt(a * a + b * b);
  }
  return { rows, columns, spacing, origin, values };
}

/** A real plane as a complex one with zero imaginary part. */
export function asComplex(plane: Plane): ComplexPlane {
  const { rows, columns, spacing, origin, values } = plane;
  return { rows, columns, spacing, origin, re: Float64Array.from(values), im: new Float64Array(values.length) };
}
