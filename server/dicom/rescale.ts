/** Rescale slope and intercept of a frame, or none where they make no sense. Source: DICOM PS3.3 C.11.1; per frame C.7.6.16.2.9. */
import type { Header } from './header';

export interface Rescale {
  readonly slope: number;
  readonly intercept: number;
  readonly isIgnored: boolean;
}

/** Slopes of MR are within a few powers of ten of 1; far beyond, float32 would overflow. */
const largestRescale = 1e12;

export function rescaleOf(header: Header): Rescale {
  const [slope = 1] = header.numbers('rescaleSlope');
  const [intercept = 0] = header.numbers('rescaleIntercept');
  // NaN, which stands for what is no number, fails both.
  const makesSense = slope >= 1 / largestRescale && slope <= largestRescale && Math.abs(intercept) <= largestRescale;
  return makesSense ? { slope, intercept, isIgnored: false } : { slope: 1, intercept: 0, isIgnored: true };
}
