/**
 * The point spread of P projections over half a turn, evenly apart, with the ramp |k| as density compensation:
 *   PSF(r) = (π/P) Σ_p h(r·n_p),  h(t) = ∫_{|k| < ½} |k| exp(i2πkt) dk = ½·sinc(t) − ¼·sinc²(t/2),  k in cycles per pixel.
 * Adjoint of the sampling with these weights is a convolution by it, exactly: filtered back projection (Ramachandran & Lakshminarayanan,
 * Proc Natl Acad Sci USA 1971;68:2236). For P → ∞ it is that of the full disc, J1(πr)/(2r), π/4 at r = 0.
 *
 * No grid is interpolated: the projections are taken of the pixels of the object, finely along each spoke.
 */
import type { Plane } from './grid';
import { centredGrid } from './grid';

/** Entries of the table of h per pixel: linear between them is right to 2e-5 of its peak. */
const perPixel = 128;

const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));

/** h(t), t in pixels: the ramp-filtered projection of a point. */
export const rampKernel = (t: number): number => sinc(t) / 2 - sinc(t / 2) ** 2 / 4;

/** PSF on rows × columns pixels, its centre at floor(n/2) of each axis. Even in x and in y, as every spoke has its mirror image among the
 *  others: a quarter of it is worked out. */
export function projectionSpread(rows: number, columns: number, nSpokes: number): Plane {
  const values = new Float64Array(rows * columns);
  const [centreRow, centreColumn] = [Math.floor(rows / 2), Math.floor(columns / 2)];
  const reach = Math.ceil(Math.sqrt(rows * rows + columns * columns) / 2) + 2;
  const table = Float64Array.from({ length: reach * perPixel }, (_, i) => (Math.PI / nSpokes) * rampKernel(i / perPixel));
  for (let spoke = 0; spoke < nSpokes; spoke++) {
    const dx = perPixel * Math.cos((Math.PI * spoke) / nSpokes);
    const dy = perPixel * Math.sin((Math.PI * spoke) / nSpokes);
    for (let row = 0; row <= centreRow; row++) {
      const along = (row - centreRow) * dy;
      for (let column = 0, i = row * columns; column <= centreColumn; column++, i++) {
        const size = Math.abs(along + (column - centreColumn) * dx);
        const below = Math.floor(size);
        const low = table[below] as number;
        values[i] = (values[i] as number) + low + ((table[below + 1] as number) - low) * (size - below);
      }
    }
  }
  for (let row = 0; row < rows; row++) {
    const from = (row <= centreRow ? row : 2 * centreRow - row) * columns;
    for (let column = 0; column < columns; column++) {
      values[row * columns + column] = values[from + (column <= centreColumn ? column : 2 * centreColumn - column)] as number;
    }
  }
  return { ...centredGrid(rows, columns, [1, 1]), values };
}
