/** The fast separable similarity against its definition, window by window, and against the ssim.js package. */
import packageSsim from 'ssim.js';
import type { Plane } from '../../../recon/grid';
import { centredGrid } from '../../../recon/grid';
import { leastSquaresGain } from '../../../recon/metrics/nrmse';
import { ssim } from '../../../recon/metrics/ssim';
import { randomOf } from '../../../recon/random';
import { percentile } from '../../../recon/statistics';

/** A disc with a ripple, whole numbers up to 255, and noise of the given size. */
function picture(rows: number, columns: number, noise: number, seed: number): Plane {
  const random = randomOf(seed, 'picture');
  const values = Float64Array.from({ length: rows * columns }, (_, i) => {
    const y = Math.floor(i / columns) - rows / 2;
    const x = (i % columns) - columns / 2;
    const disc = x * x + y * y < (0.35 * Math.min(rows, columns)) ** 2 ? 190 + 40 * Math.sin(x / 3) : 12;
    return Math.round(Math.min(255, Math.max(0, disc + noise * random.normal())));
  });
  return { ...centredGrid(rows, columns, [1, 1]), values };
}

/** Wang et al. 2004, eq. 13 (from memory), with the full 11 × 11 window at each place where it fits. */
function explicitSsim(s: Plane, b: Plane): number {
  const g = leastSquaresGain(s, b);
  const L = percentile(b.values, 99.9);
  const weights: number[] = [];
  for (let y = -5; y <= 5; y++) for (let x = -5; x <= 5; x++) weights.push(Math.exp(-(x * x + y * y) / (2 * 1.5 ** 2)));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  let sum = 0;
  let n = 0;
  for (let row = 5; row < b.rows - 5; row++) {
    for (let column = 5; column < b.columns - 5; column++) {
      const places = weights.map((weight, w) => {
        const i = (row - 5 + Math.floor(w / 11)) * b.columns + column - 5 + (w % 11);
        return { weight: weight / total, p: g * (s.values[i] ?? NaN), q: b.values[i] ?? NaN };
      });
      const mean = (of: (place: { p: number; q: number }) => number) => places.reduce((m, place) => m + place.weight * of(place), 0);
      const mp = mean(({ p }) => p);
      const mq = mean(({ q }) => q);
      const vp = mean(({ p }) => (p - mp) ** 2);
      const vq = mean(({ q }) => (q - mq) ** 2);
      const cov = mean(({ p, q }) => (p - mp) * (q - mq));
      const c1 = (0.01 * L) ** 2;
      const c2 = (0.03 * L) ** 2;
      sum += ((2 * mp * mq + c1) * (2 * cov + c2)) / ((mp ** 2 + mq ** 2 + c1) * (vp + vq + c2));
      n++;
    }
  }
  return sum / n;
}

describe('Structural similarity', () => {
  test('equals its definition, window by window', () => {
    const s = picture(30, 41, 25, 1);
    const b = picture(30, 41, 10, 2);
    // E[x²] − μ² loses about 1e-16 · 255² ≈ 1e-11 of a variance, against c2 = 58.
    expect(ssim(s, b)).toBeCloseTo(explicitSsim(s, b), 11);
  });

  test.each([5, 20, 60])('equals the ssim.js package, noise %i', (noise) => {
    const b = picture(64, 64, 0, 2);
    // The package works on whole numbers of 8 bits with L = 255; a white corner brings P99.9 of b to 255 as well.
    b.values.fill(255, 0, 12);
    const s = picture(64, 64, noise, 3);
    const scaled = { ...s, values: s.values.map((value) => Math.round(Math.min(255, leastSquaresGain(s, b) * value))) };
    const rgba = ({ values, rows, columns }: Plane) => ({
      width: columns,
      height: rows,
      data: Uint8ClampedArray.from({ length: 4 * values.length }, (_, i) => (i % 4 === 3 ? 255 : (values[Math.floor(i / 4)] ?? NaN))),
    });
    const { mssim } = packageSsim(rgba(scaled), rgba(b), { ssim: 'original', downsample: false, windowSize: 11 });
    expect(percentile(b.values, 99.9)).toBe(255);
    // Its grey is a weighted sum of R, G and B, rounded to 8 bits: equal here. Rounding to whole numbers moves the gain of what we are given
    // by about 1e-4, and its luminance weights add up to 0.9999: together below 2e-4.
    expect(Math.abs(ssim(scaled, b) - mssim)).toBeLessThan(2e-4);
  });

  test('is 1 for an image and itself at another gain, and falls with noise', () => {
    const b = picture(40, 40, 0, 1);
    expect(ssim({ ...b, values: b.values.map((value) => 3 * value) }, b)).toBeCloseTo(1, 12);
    expect(ssim(picture(40, 40, 40, 1), b)).toBeLessThan(ssim(picture(40, 40, 10, 1), b));
  });

  test('refuses planes that are smaller than its window', () => {
    const small = { ...centredGrid(10, 20, [1, 1]), values: new Float64Array(200) };
    expect(() => ssim(small, small)).toThrow('ssim needs at least 11 rows and columns, got 10×20');
  });
});
