/** Structural similarity of a simulated image and a bad one, by separable windows: fast enough to follow a slider. */
import type { Plane } from '../grid';
import { percentile } from '../statistics';
import { leastSquaresGain } from './nrmse';

const windowSize = 11;
const windowSigma = 1.5;

/** The Gaussian window of `ssim` along one axis, sum 1. */
export function gaussianWindow(): Float64Array {
  const half = (windowSize - 1) / 2;
  const weights = Float64Array.from({ length: windowSize }, (_, i) => Math.exp(-((i - half) ** 2) / (2 * windowSigma ** 2)));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  return weights.map((weight) => weight / total);
}

/** Local means where the window fits wholly: (rows − 10) × (columns − 10), the window applied along rows, then along columns. */
function localMean(values: Float64Array, rows: number, columns: number, weights: Float64Array): Float64Array {
  const innerRows = rows - windowSize + 1;
  const innerColumns = columns - windowSize + 1;
  const along = new Float64Array(rows * innerColumns);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < innerColumns; column++) {
      let sum = 0;
      for (let w = 0; w < windowSize; w++) sum += (weights[w] as number) * (values[row * columns + column + w] as number);
      along[row * innerColumns + column] = sum;
    }
  }
  const means = new Float64Array(innerRows * innerColumns);
  for (let row = 0; row < innerRows; row++) {
    for (let w = 0; w < windowSize; w++) {
      const weight = weights[w] as number;
      const from = (row + w) * innerColumns;
      const to = row * innerColumns;
      for (let column = 0; column < innerColumns; column++) {
        means[to + column] = (means[to + column] as number) + weight * (along[from + column] as number);
      }
    }
  }
  return means;
}

const product = (a: Float64Array, b: Float64Array): Float64Array => a.map((value, i) => value * (b[i] as number));

/**
 * Structural similarity after the least-squares gain: the mean over all places of an 11 × 11 Gaussian window, σ 1.5, of
 *   (2μ_s μ_b + c1)(2σ_sb + c2) / ((μ_s² + μ_b² + c1)(σ_s² + σ_b² + c2)),  c1 = (0.01 L)², c2 = (0.03 L)²,
 * with L the 99.9th percentile of b. Throws where a side is shorter than the window.
 * Source: Wang, Bovik, Sheikh, Simoncelli, IEEE Trans Image Process 2004;13:600, doi 10.1109/TIP.2003.819861 (eq. 13, from memory).
 */
export function ssim(s: Plane, b: Plane): number {
  const { rows, columns } = b;
  const g = leastSquaresGain(s, b);
  if (Math.min(rows, columns) < windowSize) throw RangeError(`ssim needs at least ${windowSize} rows and columns, got ${rows}×${columns}`);
  const L = percentile(b.values, 99.9);
  const c1 = (0.01 * L) ** 2;
  const c2 = (0.03 * L) ** 2;
  const weights = gaussianWindow();
  const scaled = s.values.map((value) => g * value);
  const mean = (values: Float64Array) => localMean(values, rows, columns, weights);
  const meanS = mean(scaled);
  const meanB = mean(b.values);
  const meanSS = mean(product(scaled, scaled));
  const meanBB = mean(product(b.values, b.values));
  const meanSB = mean(product(scaled, b.values));
  let sum = 0;
  for (let i = 0; i < meanS.length; i++) {
    const ms = meanS[i] as number;
    const mb = meanB[i] as number;
    const varianceS = (meanSS[i] as number) - ms * ms;
    const varianceB = (meanBB[i] as number) - mb * mb;
    const covariance = (meanSB[i] as number) - ms * mb;
    sum += ((2 * ms * mb + c1) * (2 * covariance + c2)) / ((ms * ms + mb * mb + c1) * (varianceS + varianceB + c2));
  }
  return sum / meanS.length;
}
