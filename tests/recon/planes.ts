/** Planes that tests are made of, and measures on them. Seeded: the same on every run. */
import type { ComplexPlane } from '../../recon/grid';
import { centredGrid, complexZeros } from '../../recon/grid';
import { randomOf } from '../../recon/random';

/** Complex white noise, standard deviation 1 in each part, 1 mm pixels. */
export function noisePlane(rows: number, columns: number, seed = 1): ComplexPlane {
  const random = randomOf(seed, 'test plane');
  const plane = complexZeros(centredGrid(rows, columns, [1e-3, 1e-3]));
  for (let i = 0; i < plane.re.length; i++) {
    plane.re[i] = random.normal();
    plane.im[i] = random.normal();
  }
  return plane;
}

/** 1 in rows and columns from the first to before the last, 1 mm pixels. */
export function box(size: number, [firstRow, lastRow]: [number, number], [firstColumn, lastColumn]: [number, number]): ComplexPlane {
  const plane = complexZeros(centredGrid(size, size, [1e-3, 1e-3]));
  for (let row = firstRow; row < lastRow; row++) plane.re.fill(1, row * size + firstColumn, row * size + lastColumn);
  return plane;
}

export const absolute = (plane: ComplexPlane, row: number, column: number): number => {
  const i = row * plane.columns + column;
  return Math.hypot(plane.re[i] ?? NaN, plane.im[i] ?? NaN);
};

/** Largest modulus of the difference of two planes of the same size. */
export function largestDifference(a: ComplexPlane, b: ComplexPlane): number {
  if (a.rows !== b.rows || a.columns !== b.columns) return Infinity;
  return a.re.reduce(
    (largest, value, i) => Math.max(largest, Math.hypot(value - (b.re[i] ?? NaN), (a.im[i] ?? NaN) - (b.im[i] ?? NaN))),
    0,
  );
}

export const energy = ({ re, im }: ComplexPlane): number => re.reduce((sum, value, i) => sum + value ** 2 + (im[i] ?? NaN) ** 2, 0);

/** Rows become columns. */
export function transposed(plane: ComplexPlane): ComplexPlane {
  const { rows, columns, spacing, origin } = plane;
  const result = complexZeros({ rows: columns, columns: rows, spacing: [spacing[1], spacing[0]], origin: [origin[1], origin[0]] });
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      result.re[column * rows + row] = plane.re[row * columns + column] ?? NaN;
      result.im[column * rows + row] = plane.im[row * columns + column] ?? NaN;
    }
  }
  return result;
}
