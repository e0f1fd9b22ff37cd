/**
 * A Stockham pass of any odd radix r, equation in `butterflies.ts`. The inputs are taken in pairs j and r−j: their sum meets the
 * cosines of the small transform, their difference its sines, so that outputs k and r−k share the work.
 */
import type { Butterfly } from './butterflies';
import { emptyLanes, rootsOfUnity } from './lanes';

export function oddRadix(r: number): Butterfly {
  const pairs = (r - 1) / 2;
  const small = rootsOfUnity(r);
  const sum = emptyLanes(pairs);
  const difference = emptyLanes(pairs);

  return (x, y, { m, stride: s, step, roots }) => {
    const n = roots.re.length;

    const writeTurned = (index: number, re: number, im: number, power: number) => {
      const wr = roots.re[power] as number;
      const wi = roots.im[power] as number;
      y.re[index] = re * wr - im * wi;
      y.im[index] = re * wi + im * wr;
    };

    for (let p = 0; p < m; p++) {
      for (let q = 0; q < s; q++) {
        const from = s * p + q;
        const to = s * r * p + q;
        const firstRe = x.re[from] as number;
        const firstIm = x.im[from] as number;
        let totalRe = firstRe;
        let totalIm = firstIm;
        for (let j = 1; j <= pairs; j++) {
          const near = from + s * m * j;
          const far = from + s * m * (r - j);
          const sumRe = (x.re[near] as number) + (x.re[far] as number);
          const sumIm = (x.im[near] as number) + (x.im[far] as number);
          sum.re[j - 1] = sumRe;
          sum.im[j - 1] = sumIm;
          difference.re[j - 1] = (x.re[near] as number) - (x.re[far] as number);
          difference.im[j - 1] = (x.im[near] as number) - (x.im[far] as number);
          totalRe += sumRe;
          totalIm += sumIm;
        }
        y.re[to] = totalRe;
        y.im[to] = totalIm;
        for (let k = 1; k <= pairs; k++) {
          let evenRe = firstRe;
          let evenIm = firstIm;
          let oddRe = 0;
          let oddIm = 0;
          for (let j = 0, turn = k; j < pairs; j++, turn = (turn + k) % r) {
            const cosine = small.re[turn] as number;
            const minusSine = small.im[turn] as number;
            evenRe += cosine * (sum.re[j] as number);
            evenIm += cosine * (sum.im[j] as number);
            oddRe -= minusSine * (difference.im[j] as number);
            oddIm += minusSine * (difference.re[j] as number);
          }
          writeTurned(to + s * k, evenRe + oddRe, evenIm + oddIm, (p * k * step) % n);
          writeTurned(to + s * (r - k), evenRe - oddRe, evenIm - oddIm, (p * (r - k) * step) % n);
        }
      }
    }
  };
}
