/**
 * Stockham passes of radix 3 and 5, equation in `butterflies.ts`, written out: 320 and 384 are common matrix sizes, and the general odd
 * radix costs them twice the time. Inputs meet in pairs j and r − j, as in `odd-radix.ts`.
 */
import type { Butterfly } from './butterflies';

const sine3 = Math.sin((2 * Math.PI) / 3);

export const radix3: Butterfly = (x, y, { m, stride: s, step, roots }) => {
  const { re: xr, im: xi } = x;
  const { re: yr, im: yi } = y;
  const part = s * m;
  for (let p = 0; p < m; p++) {
    const w1r = roots.re[p * step] as number;
    const w1i = roots.im[p * step] as number;
    const w2r = roots.re[2 * p * step] as number;
    const w2i = roots.im[2 * p * step] as number;
    const from = s * p;
    const to = s * 3 * p;
    for (let q = 0; q < s; q++) {
      const i = from + q;
      const o = to + q;
      const ar = xr[i] as number;
      const ai = xi[i] as number;
      const br = xr[i + part] as number;
      const bi = xi[i + part] as number;
      const cr = xr[i + 2 * part] as number;
      const ci = xi[i + 2 * part] as number;
      const sumr = br + cr;
      const sumi = bi + ci;
      // −i·sin(2π/3)·(b − c)
      const turnr = sine3 * (bi - ci);
      const turni = sine3 * (cr - br);
      const evenr = ar - 0.5 * sumr;
      const eveni = ai - 0.5 * sumi;
      yr[o] = ar + sumr;
      yi[o] = ai + sumi;
      const t1r = evenr + turnr;
      const t1i = eveni + turni;
      yr[o + s] = t1r * w1r - t1i * w1i;
      yi[o + s] = t1r * w1i + t1i * w1r;
      const t2r = evenr - turnr;
      const t2i = eveni - turni;
      yr[o + 2 * s] = t2r * w2r - t2i * w2i;
      yi[o + 2 * s] = t2r * w2i + t2i * w2r;
    }
  }
};

const cosine1 = Math.cos((2 * Math.PI) / 5);
const cosine2 = Math.cos((4 * Math.PI) / 5);
const sine1 = Math.sin((2 * Math.PI) / 5);
const sine2 = Math.sin((4 * Math.PI) / 5);

export const radix5: Butterfly = (x, y, { m, stride: s, step, roots }) => {
  const { re: xr, im: xi } = x;
  const { re: yr, im: yi } = y;
  const part = s * m;
  for (let p = 0; p < m; p++) {
    const w1r = roots.re[p * step] as number;
    const w1i = roots.im[p * step] as number;
    const w2r = roots.re[2 * p * step] as number;
    const w2i = roots.im[2 * p * step] as number;
    const w3r = roots.re[3 * p * step] as number;
    const w3i = roots.im[3 * p * step] as number;
    const w4r = roots.re[4 * p * step] as number;
    const w4i = roots.im[4 * p * step] as number;
    const from = s * p;
    const to = s * 5 * p;
    for (let q = 0; q < s; q++) {
      const i = from + q;
      const o = to + q;
      const ar = xr[i] as number;
      const ai = xi[i] as number;
      const br = xr[i + part] as number;
      const bi = xi[i + part] as number;
      const cr = xr[i + 2 * part] as number;
      const ci = xi[i + 2 * part] as number;
      const dr = xr[i + 3 * part] as number;
      const di = xi[i + 3 * part] as number;
      const er = xr[i + 4 * part] as number;
      const ei = xi[i + 4 * part] as number;
      const outerr = br + er;
      const outeri = bi + ei;
      const innerr = cr + dr;
      const inneri = ci + di;
      // −i(b − e) and −i(c − d)
      const turnBEr = bi - ei;
      const turnBEi = er - br;
      const turnCDr = ci - di;
      const turnCDi = dr - cr;
      yr[o] = ar + outerr + innerr;
      yi[o] = ai + outeri + inneri;
      const even1r = ar + cosine1 * outerr + cosine2 * innerr;
      const even1i = ai + cosine1 * outeri + cosine2 * inneri;
      const odd1r = sine1 * turnBEr + sine2 * turnCDr;
      const odd1i = sine1 * turnBEi + sine2 * turnCDi;
      const even2r = ar + cosine2 * outerr + cosine1 * innerr;
      const even2i = ai + cosine2 * outeri + cosine1 * inneri;
      const odd2r = sine2 * turnBEr - sine1 * turnCDr;
      const odd2i = sine2 * turnBEi - sine1 * turnCDi;
      const t1r = even1r + odd1r;
      const t1i = even1i + odd1i;
      yr[o + s] = t1r * w1r - t1i * w1i;
      yi[o + s] = t1r * w1i + t1i * w1r;
      const t2r = even2r + odd2r;
      const t2i = even2i + odd2i;
      yr[o + 2 * s] = t2r * w2r - t2i * w2i;
      yi[o + 2 * s] = t2r * w2i + t2i * w2r;
      const t3r = even2r - odd2r;
      const t3i = even2i - odd2i;
      yr[o + 3 * s] = t3r * w3r - t3i * w3i;
      yi[o + 3 * s] = t3r * w3i + t3i * w3r;
      const t4r = even1r - odd1r;
      const t4i = even1i - odd1i;
      yr[o + 4 * s] = t4r * w4r - t4i * w4i;
      yi[o + 4 * s] = t4r * w4i + t4i * w4r;
    }
  }
};
