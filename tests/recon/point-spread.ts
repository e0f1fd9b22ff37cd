/** Point spreads and edges on a fine grid: one column of many rows, of which k-space holds few. */
import type { Encoded } from '../../recon/cause';
import { centredGrid, complexZeros } from '../../recon/grid';
import type { Plane } from '../../recon/grid';
import { fullyTaken } from '../../recon/lines';

/** k-space of one column with K(k) for k from −n/2 to n/2 − 1 in the middle of `rows`. */
export function column(rows: number, kspace: (k: number) => number): Encoded {
  const plane = complexZeros(centredGrid(rows, 1, [1e-3, 1e-3]));
  plane.re.forEach((_, row) => (plane.re[row] = kspace(row - rows / 2)));
  return fullyTaken(plane);
}

/** A box of half the field of view, exact Fourier coefficients ½·sinc(k/2), in the scale of the orthonormal transform. */
export const boxColumn = (rows: number): Encoded =>
  column(rows, (k) => Math.sqrt(rows) * (k === 0 ? 0.5 : Math.sin((Math.PI * k) / 2) / (Math.PI * k)));

/** Full width at half maximum about the largest value, in samples, linear between them. */
export function fullWidth({ values }: Plane): number {
  const peak = values.indexOf(Math.max(...values));
  const half = (values[peak] ?? NaN) / 2;
  const side = (step: 1 | -1): number => {
    let i = peak;
    while ((values[i] ?? NaN) > half) i += step;
    const [outer, inner] = [values[i] ?? NaN, values[i - step] ?? NaN];
    return Math.abs(i - peak) - (half - outer) / (inner - outer);
  };
  return side(1) + side(-1);
}
