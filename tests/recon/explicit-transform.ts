/** The transform by its definition, a sum for every sample: slow, and with nothing in common with the engine. */
import type { ComplexPlane } from '../../recon/grid';

/** K(kx, ky) = 1/√(NM) Σ Σ I exp(∓i2π(kx·x/N + ky·y/M)), all four counted from floor(n/2). */
export function explicitTransform(plane: ComplexPlane, direction: 'forward' | 'inverse'): { re: Float64Array; im: Float64Array } {
  const { rows, columns } = plane;
  const sign = direction === 'forward' ? -1 : 1;
  const re = new Float64Array(rows * columns);
  const im = new Float64Array(rows * columns);
  for (let v = 0; v < rows; v++) {
    for (let u = 0; u < columns; u++) {
      let sumRe = 0;
      let sumIm = 0;
      for (let y = 0; y < rows; y++) {
        for (let x = 0; x < columns; x++) {
          const turns =
            ((u - Math.floor(columns / 2)) * (x - Math.floor(columns / 2))) / columns +
            ((v - Math.floor(rows / 2)) * (y - Math.floor(rows / 2))) / rows;
          const angle = sign * 2 * Math.PI * turns;
          const a = plane.re[y * columns + x] ?? NaN;
          const b = plane.im[y * columns + x] ?? NaN;
          sumRe += a * Math.cos(angle) - b * Math.sin(angle);
          sumIm += a * Math.sin(angle) + b * Math.cos(angle);
        }
      }
      re[v * columns + u] = sumRe / Math.sqrt(rows * columns);
      im[v * columns + u] = sumIm / Math.sqrt(rows * columns);
    }
  }
  return { re, im };
}
