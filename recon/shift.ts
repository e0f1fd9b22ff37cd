/** The shift theorem along one axis: K·exp(−i2πk·d/N) is the image moved by +d pixels, which come in again at the other edge. */
import { inverseAlong, transformAlong } from './fourier';
import type { ComplexPlane } from './grid';

/** `plane` moved by `pixels`, any number, towards larger indices of `axis`; times exp(i·phase). */
export function shifted(plane: ComplexPlane, axis: 0 | 1, pixels: number, phase: number): ComplexPlane {
  const kspace = transformAlong(plane, axis);
  const n = axis === 0 ? plane.rows : plane.columns;
  const turns = Array.from({ length: n }, (_, index) => phase - (2 * Math.PI * (index - Math.floor(n / 2)) * pixels) / n);
  const [cosines, sines] = [Float64Array.from(turns, Math.cos), Float64Array.from(turns, Math.sin)];
  for (let row = 0; row < plane.rows; row++) {
    for (let column = 0; column < plane.columns; column++) {
      const i = row * plane.columns + column;
      const k = axis === 0 ? row : column;
      const a = kspace.re[i] as number;
      const b = kspace.im[i] as number;
      kspace.re[i] = a * (cosines[k] as number) - b * (sines[k] as number);
      kspace.im[i] = a * (sines[k] as number) + b * (cosines[k] as number);
    }
  }
  return inverseAlong(kspace, axis);
}
