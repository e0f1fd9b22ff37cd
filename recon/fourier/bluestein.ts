/**
 * Any length n as a convolution with a chirp: jk = (j² + k² − (k−j)²)/2, so that
 *   X_k = c_k · Σ_j (x_j c_j) · conj(c_{k−j}),  c_j = exp(−iπj²/n),
 * a circular convolution of a length ≥ 2n−1 with small factors.
 * Source: Bluestein, IEEE Trans Audio Electroacoust 1970;18:451–455 (from memory).
 */
import type { Lanes, LineTransform } from './lanes';
import { emptyLanes } from './lanes';
import { mixedRadix, smallFactors } from './mixed-radix';

/** exp(−iπj²/n); j² is reduced modulo 2n first, so that the angle stays exact for long lines. */
function chirpOf(n: number): Lanes {
  const chirp = emptyLanes(n);
  for (let j = 0; j < n; j++) {
    const angle = (Math.PI * ((j * j) % (2 * n))) / n;
    chirp.re[j] = Math.cos(angle);
    chirp.im[j] = -Math.sin(angle);
  }
  return chirp;
}

/** The next power of two that is at least `least`: its passes are all of radix 4 and 2, the fastest there are. */
export function nextPowerOfTwo(least: number): number {
  let length = 1;
  while (length < least) length *= 2;
  return length;
}

/** Transform of conj(c) laid around index 0 of the padded circle, divided by its length for the way back. */
function chirpSpectrum(chirp: Lanes, padded: number, transform: LineTransform): Lanes {
  const n = chirp.re.length;
  const circle = emptyLanes(padded);
  for (let j = 0; j < n; j++) {
    for (const index of j === 0 ? [0] : [j, padded - j]) {
      circle.re[index] = (chirp.re[j] as number) / padded;
      circle.im[index] = -(chirp.im[j] as number) / padded;
    }
  }
  const { re, im } = transform(circle, emptyLanes(padded), 1);
  return { re: re.slice(), im: im.slice() };
}

/** target[j] = source[j] · factor[j], line by line of all lanes. */
function multiplyLines(source: Lanes, target: Lanes, factor: Lanes, lanes: number): void {
  for (let j = 0; j < factor.re.length; j++) {
    const fr = factor.re[j] as number;
    const fi = factor.im[j] as number;
    for (let i = j * lanes; i < (j + 1) * lanes; i++) {
      const sr = source.re[i] as number;
      const si = source.im[i] as number;
      target.re[i] = sr * fr - si * fi;
      target.im[i] = sr * fi + si * fr;
    }
  }
}

export function bluestein(n: number): LineTransform {
  const padded = nextPowerOfTwo(2 * n - 1);
  const transform = mixedRadix(padded, smallFactors(padded) ?? []);
  const chirp = chirpOf(n);
  const spectrum = chirpSpectrum(chirp, padded, transform);
  let work = { data: emptyLanes(0), spare: emptyLanes(0) };

  return (data, _spare, lanes) => {
    if (work.data.re.length < padded * lanes) work = { data: emptyLanes(padded * lanes), spare: emptyLanes(padded * lanes) };
    work.data.re.fill(0, n * lanes);
    work.data.im.fill(0, n * lanes);
    multiplyLines(data, work.data, chirp, lanes);
    const forward = transform(work.data, work.spare, lanes);
    multiplyLines(forward, forward, spectrum, lanes);
    // The inverse transform is the forward one with real and imaginary parts exchanged.
    const swapped = { re: forward.im, im: forward.re };
    const other = forward === work.data ? work.spare : work.data;
    const back = transform(swapped, other, lanes);
    multiplyLines({ re: back.im, im: back.re }, data, chirp, lanes);
    return data;
  };
}
