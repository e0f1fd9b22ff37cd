/**
 * One pass of the Stockham autosort transform (decimation in frequency), radix 2 and 4; odd radices are in `odd-radix.ts`.
 *
 * A pass of radix r on sub-length n = r·m with stride s reads x[q + s(p + m·j)] and writes y[q + s(r·p + k)]:
 *   y_k = w^(pk) · Σ_j x_j exp(−i2πjk/r),  w = exp(−i2π/n),  p = 0 … m−1,  q = 0 … s−1.
 * Source: Van Loan, Computational Frameworks for the Fast Fourier Transform, SIAM 1992, section 1.7 (from memory).
 */
import type { Lanes } from './lanes';

/** One pass from `x` to `y`, with `roots` of the whole length N and `step` = N/n between consecutive powers of w. */
export interface Pass {
  readonly m: number;
  readonly stride: number;
  readonly step: number;
  readonly roots: Lanes;
}
export type Butterfly = (x: Lanes, y: Lanes, pass: Pass) => void;

export const radix2: Butterfly = (x, y, { m, stride: s, step, roots }) => {
  const { re: xr, im: xi } = x;
  const { re: yr, im: yi } = y;
  for (let p = 0; p < m; p++) {
    const wr = roots.re[p * step] as number;
    const wi = roots.im[p * step] as number;
    const from = s * p;
    const half = s * m;
    const to = s * 2 * p;
    for (let q = 0; q < s; q++) {
      const ar = xr[from + q] as number;
      const ai = xi[from + q] as number;
      const br = xr[from + half + q] as number;
      const bi = xi[from + half + q] as number;
      const dr = ar - br;
      const di = ai - bi;
      yr[to + q] = ar + br;
      yi[to + q] = ai + bi;
      yr[to + s + q] = dr * wr - di * wi;
      yi[to + s + q] = dr * wi + di * wr;
    }
  }
};

export const radix4: Butterfly = (x, y, { m, stride: s, step, roots }) => {
  const { re: xr, im: xi } = x;
  const { re: yr, im: yi } = y;
  const quarter = s * m;
  for (let p = 0; p < m; p++) {
    const w1r = roots.re[p * step] as number;
    const w1i = roots.im[p * step] as number;
    const w2r = roots.re[2 * p * step] as number;
    const w2i = roots.im[2 * p * step] as number;
    const w3r = roots.re[3 * p * step] as number;
    const w3i = roots.im[3 * p * step] as number;
    const from = s * p;
    const to = s * 4 * p;
    for (let q = 0; q < s; q++) {
      const i = from + q;
      const ar = xr[i] as number;
      const ai = xi[i] as number;
      const br = xr[i + quarter] as number;
      const bi = xi[i + quarter] as number;
      const cr = xr[i + 2 * quarter] as number;
      const ci = xi[i + 2 * quarter] as number;
      const dr = xr[i + 3 * quarter] as number;
      const di = xi[i + 3 * quarter] as number;
      const sumACr = ar + cr;
      const sumACi = ai + ci;
      const difACr = ar - cr;
      const difACi = ai - ci;
      const sumBDr = br + dr;
      const sumBDi = bi + di;
      // −i(b − d)
      const turnBDr = bi - di;
      const turnBDi = dr - br;
      const o = to + q;
      yr[o] = sumACr + sumBDr;
      yi[o] = sumACi + sumBDi;
      const t1r = difACr + turnBDr;
      const t1i = difACi + turnBDi;
      yr[o + s] = t1r * w1r - t1i * w1i;
      yi[o + s] = t1r * w1i + t1i * w1r;
      const t2r = sumACr - sumBDr;
      const t2i = sumACi - sumBDi;
      yr[o + 2 * s] = t2r * w2r - t2i * w2i;
      yi[o + 2 * s] = t2r * w2i + t2i * w2r;
      const t3r = difACr - turnBDr;
      const t3i = difACi - turnBDi;
      yr[o + 3 * s] = t3r * w3r - t3i * w3i;
      yi[o + 3 * s] = t3r * w3i + t3i * w3r;
    }
  }
};
