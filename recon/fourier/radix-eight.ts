/**
 * A Stockham pass of radix 8, equation in `butterflies.ts`: two radix-4 transforms, of the even and of the odd inputs, joined by the eighth
 * roots of unity. A line of 512 samples takes three passes over memory instead of five.
 */
import type { Butterfly } from './butterflies';

export const radix8: Butterfly = (x, y, { m, stride: s, step, roots }) => {
  const { re: xr, im: xi } = x;
  const { re: yr, im: yi } = y;
  const { re: rootRe, im: rootIm } = roots;
  const part = s * m;
  const half = Math.SQRT1_2;
  for (let p = 0; p < m; p++) {
    const w = p * step;
    const w1r = rootRe[w] as number;
    const w1i = rootIm[w] as number;
    const w2r = rootRe[2 * w] as number;
    const w2i = rootIm[2 * w] as number;
    const w3r = rootRe[3 * w] as number;
    const w3i = rootIm[3 * w] as number;
    const w4r = rootRe[4 * w] as number;
    const w4i = rootIm[4 * w] as number;
    const w5r = rootRe[5 * w] as number;
    const w5i = rootIm[5 * w] as number;
    const w6r = rootRe[6 * w] as number;
    const w6i = rootIm[6 * w] as number;
    const w7r = rootRe[7 * w] as number;
    const w7i = rootIm[7 * w] as number;
    const from = s * p;
    const to = s * 8 * p;
    for (let q = 0; q < s; q++) {
      const i = from + q;
      const o = to + q;
      const x0r = xr[i] as number;
      const x0i = xi[i] as number;
      const x4r = xr[i + 4 * part] as number;
      const x4i = xi[i + 4 * part] as number;
      const x2r = xr[i + 2 * part] as number;
      const x2i = xi[i + 2 * part] as number;
      const x6r = xr[i + 6 * part] as number;
      const x6i = xi[i + 6 * part] as number;
      const sum04r = x0r + x4r;
      const sum04i = x0i + x4i;
      const dif04r = x0r - x4r;
      const dif04i = x0i - x4i;
      const sum26r = x2r + x6r;
      const sum26i = x2i + x6i;
      // −i(x2 − x6)
      const turn26r = x2i - x6i;
      const turn26i = x6r - x2r;
      const e0r = sum04r + sum26r;
      const e0i = sum04i + sum26i;
      const e2r = sum04r - sum26r;
      const e2i = sum04i - sum26i;
      const e1r = dif04r + turn26r;
      const e1i = dif04i + turn26i;
      const e3r = dif04r - turn26r;
      const e3i = dif04i - turn26i;

      const x1r = xr[i + part] as number;
      const x1i = xi[i + part] as number;
      const x5r = xr[i + 5 * part] as number;
      const x5i = xi[i + 5 * part] as number;
      const x3r = xr[i + 3 * part] as number;
      const x3i = xi[i + 3 * part] as number;
      const x7r = xr[i + 7 * part] as number;
      const x7i = xi[i + 7 * part] as number;
      const sum15r = x1r + x5r;
      const sum15i = x1i + x5i;
      const dif15r = x1r - x5r;
      const dif15i = x1i - x5i;
      const sum37r = x3r + x7r;
      const sum37i = x3i + x7i;
      const turn37r = x3i - x7i;
      const turn37i = x7r - x3r;
      // The odd half, each output k turned by exp(−iπk/4).
      const o0r = sum15r + sum37r;
      const o0i = sum15i + sum37i;
      const o2r = sum15i - sum37i;
      const o2i = sum37r - sum15r;
      const g1r = dif15r + turn37r;
      const g1i = dif15i + turn37i;
      const o1r = half * (g1r + g1i);
      const o1i = half * (g1i - g1r);
      const g3r = dif15r - turn37r;
      const g3i = dif15i - turn37i;
      const o3r = half * (g3i - g3r);
      const o3i = -half * (g3i + g3r);

      yr[o] = e0r + o0r;
      yi[o] = e0i + o0i;
      const t1r = e1r + o1r;
      const t1i = e1i + o1i;
      yr[o + s] = t1r * w1r - t1i * w1i;
      yi[o + s] = t1r * w1i + t1i * w1r;
      const t2r = e2r + o2r;
      const t2i = e2i + o2i;
      yr[o + 2 * s] = t2r * w2r - t2i * w2i;
      yi[o + 2 * s] = t2r * w2i + t2i * w2r;
      const t3r = e3r + o3r;
      const t3i = e3i + o3i;
      yr[o + 3 * s] = t3r * w3r - t3i * w3i;
      yi[o + 3 * s] = t3r * w3i + t3i * w3r;
      const t4r = e0r - o0r;
      const t4i = e0i - o0i;
      yr[o + 4 * s] = t4r * w4r - t4i * w4i;
      yi[o + 4 * s] = t4r * w4i + t4i * w4r;
      const t5r = e1r - o1r;
      const t5i = e1i - o1i;
      yr[o + 5 * s] = t5r * w5r - t5i * w5i;
      yi[o + 5 * s] = t5r * w5i + t5i * w5r;
      const t6r = e2r - o2r;
      const t6i = e2i - o2i;
      yr[o + 6 * s] = t6r * w6r - t6i * w6i;
      yi[o + 6 * s] = t6r * w6i + t6i * w6r;
      const t7r = e3r - o3r;
      const t7i = e3i - o3i;
      yr[o + 7 * s] = t7r * w7r - t7i * w7i;
      yi[o + 7 * s] = t7r * w7i + t7i * w7r;
    }
  }
};
