/**
 * Folding: an object that reaches out of the field of view comes in again on the other side, I'(y) = Σ_m I(y + y0 + m·n) for the n
 * pixels about y0. The sum is complex and comes before any magnitude; the pixel size stays and the new window is centred.
 */
import type { ComplexPlane } from './grid';
import { centredGrid, complexZeros } from './grid';
import { quantity } from './parameter';

/** The part of the full field of view along the phase encoding that an object is folded to. */
export const phaseFieldOfView = quantity({
  label: 'Phase field of view',
  unit: 'of full',
  min: 0.4,
  max: 1,
  step: 0.01,
  initial: 0.75,
  fromHeader: {
    fact: 'Percent phase field of view',
    read: ({ phaseFieldOfViewFraction: r }) => (r !== undefined && r < 1 ? r : undefined),
  },
});

/** Adds the lines of `plane` along `axis` up modulo `n`, about the line `offset` from the centre. What lies outside the window of `n`
 *  lines comes in times `passed`. */
export function fold(plane: ComplexPlane, axis: 0 | 1, n: number, offset: number, passed = 1): ComplexPlane {
  const { rows, columns, spacing } = plane;
  const folded = complexZeros(centredGrid(axis === 0 ? n : rows, axis === 1 ? n : columns, spacing));
  const length = axis === 0 ? rows : columns;
  const positions = Int32Array.from({ length }, (_, index) => index - Math.floor(length / 2) - offset + Math.floor(n / 2));
  const target = positions.map((position) => ((position % n) + n) % n);
  const weight = Float64Array.from(positions, (position) => (position >= 0 && position < n ? 1 : passed));
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const toRow = axis === 0 ? (target[row] as number) : row;
      const toColumn = axis === 1 ? (target[column] as number) : column;
      const factor = weight[axis === 0 ? row : column] as number;
      const from = row * columns + column;
      const to = toRow * folded.columns + toColumn;
      folded.re[to] = (folded.re[to] as number) + factor * (plane.re[from] as number);
      folded.im[to] = (folded.im[to] as number) + factor * (plane.im[from] as number);
    }
  }
  return folded;
}
