/** Structural similarity of a simulated image and a bad one, by separable windows: fast enough to follow a slider. */
import type { Plane } from '../grid';
import { giveBack, unwrittenArray } from '../spare-arrays';
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

/** From the edge of the window to its centre. */
const [w5, w4, w3, w2, w1, w0] = gaussianWindow() as unknown as readonly [number, number, number, number, number, number];

/** The weighted mean of eleven samples `stride` apart, from index i on; those equally far from the centre are added first. */
function weightedMean(samples: Float64Array, i: number, stride: number): number {
  let sum = w0 * (samples[i + 5 * stride] as number);
  sum += w1 * ((samples[i + 4 * stride] as number) + (samples[i + 6 * stride] as number));
  sum += w2 * ((samples[i + 3 * stride] as number) + (samples[i + 7 * stride] as number));
  sum += w3 * ((samples[i + 2 * stride] as number) + (samples[i + 8 * stride] as number));
  sum += w4 * ((samples[i + stride] as number) + (samples[i + 9 * stride] as number));
  return sum + w5 * ((samples[i] as number) + (samples[i + 10 * stride] as number));
}

/** Local means where the window fits wholly: (rows − 10) × (columns − 10) at the start of the array, the window applied along rows, then
 *  along columns. */
function localMean(values: Float64Array, rows: number, columns: number): Float64Array {
  const innerRows = rows - windowSize + 1;
  const innerColumns = columns - windowSize + 1;
  const along = unwrittenArray(values.length);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < innerColumns; column++)
      along[row * innerColumns + column] = weightedMean(values, row * columns + column, 1);
  }
  const means = unwrittenArray(values.length);
  for (let i = 0; i < innerRows * innerColumns; i++) means[i] = weightedMean(along, i, innerColumns);
  giveBack(along);
  return means;
}

/** Local means of a·b. */
function localMeanOfProduct(a: Float64Array, b: Float64Array, rows: number, columns: number): Float64Array {
  const product = unwrittenArray(a.length);
  for (let i = 0; i < product.length; i++) product[i] = (a[i] as number) * (b[i] as number);
  const means = localMean(product, rows, columns);
  giveBack(product);
  return means;
}

/** What SSIM needs of the image to compare with: it stays while a slider moves. */
export interface SsimReference {
  readonly plane: Plane;
  readonly c1: number;
  readonly c2: number;
  readonly mean: Float64Array;
  readonly variance: Float64Array;
}

/** Places where the window fits. */
const nPlaces = ({ rows, columns }: Plane): number => (rows - windowSize + 1) * (columns - windowSize + 1);

/** Throws where a side is shorter than the window. */
export function ssimReference(plane: Plane): SsimReference {
  const { rows, columns, values } = plane;
  if (Math.min(rows, columns) < windowSize) throw RangeError(`ssim needs at least ${windowSize} rows and columns, got ${rows}×${columns}`);
  const L = percentile(values, 99.9);
  const mean = localMean(values, rows, columns);
  const variance = localMeanOfProduct(values, values, rows, columns);
  for (let i = 0; i < nPlaces(plane); i++) variance[i] = (variance[i] as number) - (mean[i] as number) ** 2;
  return { plane, c1: (0.01 * L) ** 2, c2: (0.03 * L) ** 2, mean, variance };
}

/**
 * Structural similarity of s after the least-squares gain g: the mean over all places of an 11 × 11 Gaussian window, σ 1.5, of
 *   (2μ_s μ_b + c1)(2σ_sb + c2) / ((μ_s² + μ_b² + c1)(σ_s² + σ_b² + c2)),  c1 = (0.01 L)², c2 = (0.03 L)²,
 * with L the 99.9th percentile of b. Means are taken of s itself, and g comes in afterwards: they are linear in it.
 * Source: Wang, Bovik, Sheikh, Simoncelli, IEEE Trans Image Process 2004;13:600, doi 10.1109/TIP.2003.819861 (eq. 13, from memory).
 */
export function ssim(s: Plane, b: Plane | SsimReference): number {
  const { plane, c1, c2, mean, variance } = 'plane' in b ? b : ssimReference(b);
  const g = leastSquaresGain(s, plane);
  const { rows, columns } = plane;
  const meanS = localMean(s.values, rows, columns);
  const meanSS = localMeanOfProduct(s.values, s.values, rows, columns);
  const meanSB = localMeanOfProduct(s.values, plane.values, rows, columns);
  let sum = 0;
  for (let i = 0; i < nPlaces(plane); i++) {
    const ms = g * (meanS[i] as number);
    const mb = mean[i] as number;
    const varianceS = g * g * (meanSS[i] as number) - ms * ms;
    const covariance = g * (meanSB[i] as number) - ms * mb;
    sum += ((2 * ms * mb + c1) * (2 * covariance + c2)) / ((ms * ms + mb * mb + c1) * (varianceS + (variance[i] as number) + c2));
  }
  for (const means of [meanS, meanSS, meanSB]) giveBack(means);
  return sum / nPlaces(plane);
}
