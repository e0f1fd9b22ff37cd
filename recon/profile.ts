/** Line profiles of a plane and their spectra: what a ruler over a stripe or a ghost is read with. */
import { fft } from 'fft-js';
import { nextPowerOfTwo } from './fourier/bluestein';
import type { Plane } from './grid';

/** A place in a plane in samples, [row, column]. */
export interface Place {
  readonly row: number;
  readonly column: number;
}

export interface Profile {
  /** Metres from the start, and the value there. */
  readonly distance: Float64Array;
  readonly values: Float64Array;
}

export interface ProfileSpectrum {
  /** Cycles per metre, from 0 to half the sampling rate. */
  readonly frequency: Float64Array;
  /** Modulus of the transform of the profile less its mean, over the number of samples. */
  readonly amplitude: Float64Array;
}

function bilinear({ rows, columns, values }: Plane, row: number, column: number): number {
  const y = Math.min(rows - 1, Math.max(0, row));
  const x = Math.min(columns - 1, Math.max(0, column));
  const top = Math.floor(y);
  const left = Math.floor(x);
  const bottom = Math.min(rows - 1, top + 1);
  const right = Math.min(columns - 1, left + 1);
  const at = (r: number, c: number): number => values[r * columns + c] as number;
  const upper = at(top, left) * (1 - x + left) + at(top, right) * (x - left);
  const lower = at(bottom, left) * (1 - x + left) + at(bottom, right) * (x - left);
  return upper * (1 - y + top) + lower * (y - top);
}

/** Values along the straight line from `from` to `to`, both ends included, about one sample a pixel, bilinear; outside the plane the
 *  edge holds. Throws where both ends are one place. */
export function lineProfile(plane: Plane, from: Place, to: Place): Profile {
  const dRow = to.row - from.row;
  const dColumn = to.column - from.column;
  const nSteps = Math.ceil(Math.sqrt(dRow * dRow + dColumn * dColumn));
  if (nSteps === 0) throw RangeError('a profile needs two places, got one twice');
  const length = Math.sqrt((dRow * plane.spacing[0]) ** 2 + (dColumn * plane.spacing[1]) ** 2);
  const distance = Float64Array.from({ length: nSteps + 1 }, (_, i) => (length * i) / nSteps);
  const values = distance.map((_, i) => bilinear(plane, from.row + (dRow * i) / nSteps, from.column + (dColumn * i) / nSteps));
  return { distance, values };
}

/** Spectrum of a profile, its mean taken out, padded with zeros to a power of two: what repeats shows as a peak. */
export function profileSpectrum({ distance, values }: Profile): ProfileSpectrum {
  const n = values.length;
  const spacing = (distance[1] ?? 1) - (distance[0] ?? 0);
  const mean = values.reduce((sum, value) => sum + value, 0) / n;
  const padded = nextPowerOfTwo(Math.max(2, n));
  const signal = Array.from({ length: padded }, (_, i) => (i < n ? (values[i] as number) - mean : 0));
  const half = padded / 2 + 1;
  const amplitude = Float64Array.from(fft(signal).slice(0, half), ([re, im]) => Math.sqrt(re * re + im * im) / n);
  return { frequency: Float64Array.from({ length: half }, (_, i) => i / (padded * spacing)), amplitude };
}

/** A repeat along a profile. */
export interface Repeat {
  /** Cycles per metre. */
  readonly frequency: number;
  readonly amplitude: number;
}

/** Fewer cycles along the line than this are the shape of the object, not a repeat. */
const fewestCycles = 2;

/** What repeats most strongly: the highest local maximum of the spectrum at two cycles along the line or more. Anatomy has one too (on
 *  head slices 4 to 15 times the mean of the spectrum), so it means most along a line through air or even tissue. */
export function strongestRepeat({ distance }: Profile, { frequency, amplitude }: ProfileSpectrum): Repeat | undefined {
  const length = distance[distance.length - 1] ?? 0;
  let best: Repeat | undefined;
  for (let i = 1; i < amplitude.length - 1; i++) {
    const [before, here, after] = [amplitude[i - 1] as number, amplitude[i] as number, amplitude[i + 1] as number];
    const isPeak = here > 0 && here >= before && here >= after && (frequency[i] as number) * length >= fewestCycles;
    if (isPeak && (best === undefined || here > best.amplitude)) best = { frequency: frequency[i] as number, amplitude: here };
  }
  return best;
}
