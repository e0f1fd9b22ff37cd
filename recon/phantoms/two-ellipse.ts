/**
 * Two ellipses drawn without smooth edges, and the smooth phase with which partial Fourier is tried: I = 1 within (x/40)² + (y/50)² < 1,
 * plus 0.7 within (x−10)² + (y+12)² < 90, in pixels of a 128 × 128 plane; θ = 0.6 cos(2πx/N) + 0.5 sin(2πy/N).
 */
import type { ComplexPlane } from '../grid';
import { centredGrid, complexZeros } from '../grid';

const n = 128;

/** [row, column], 128 × 128, 1 mm pixels; with `phase`, times exp(iθ). */
export function twoEllipse({ phase }: { phase: boolean }): ComplexPlane {
  const plane = complexZeros(centredGrid(n, n, [1e-3, 1e-3]));
  for (let row = 0; row < n; row++) {
    const y = row - n / 2;
    for (let column = 0; column < n; column++) {
      const x = column - n / 2;
      const large = (x / 40) ** 2 + (y / 50) ** 2 < 1 ? 1 : 0;
      const small = (x - 10) ** 2 + (y + 12) ** 2 < 90 ? 0.7 : 0;
      const theta = phase ? 0.6 * Math.cos((2 * Math.PI * x) / n) + 0.5 * Math.sin((2 * Math.PI * y) / n) : 0;
      plane.re[row * n + column] = (large + small) * Math.cos(theta);
      plane.im[row * n + column] = (large + small) * Math.sin(theta);
    }
  }
  return plane;
}
