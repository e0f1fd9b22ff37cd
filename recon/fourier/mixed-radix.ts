/** Stockham transform of a length whose prime factors are small: passes of radix 8, at most one of 4 or 2, then 3, 5, 7, 11 and 13. */
import type { Butterfly } from './butterflies';
import { radix2, radix4 } from './butterflies';
import type { Lanes, LineTransform } from './lanes';
import { rootsOfUnity } from './lanes';
import { oddRadix } from './odd-radix';
import { radix3, radix5 } from './radix-three-five';
import { radix8 } from './radix-eight';

const radices = [8, 4, 2, 3, 5, 7, 11, 13] as const;

const writtenOut = new Map<number, Butterfly>([
  [2, radix2],
  [3, radix3],
  [4, radix4],
  [5, radix5],
  [8, radix8],
]);

/** The passes that make up `length`, or undefined where a larger prime is left over. */
export function smallFactors(length: number): readonly number[] | undefined {
  const factors: number[] = [];
  let rest = length;
  for (const radix of radices) {
    while (rest % radix === 0) {
      factors.push(radix);
      rest /= radix;
    }
  }
  return rest === 1 ? factors : undefined;
}

const butterflyOf = (radix: number): Butterfly => writtenOut.get(radix) ?? oddRadix(radix);

export function mixedRadix(length: number, factors: readonly number[]): LineTransform {
  const roots = rootsOfUnity(length);
  const butterflies = new Map([...new Set(factors)].map((radix) => [radix, butterflyOf(radix)]));
  const passes: { radix: number; m: number; step: number; butterfly: Butterfly }[] = [];
  let n = length;
  for (const radix of factors) {
    const butterfly = butterflies.get(radix);
    if (butterfly) passes.push({ radix, m: n / radix, step: length / n, butterfly });
    n /= radix;
  }

  return (data: Lanes, spare: Lanes, lanes: number) => {
    let from = data;
    let to = spare;
    let stride = lanes;
    for (const { radix, m, step, butterfly } of passes) {
      butterfly(from, to, { m, stride, step, roots });
      [from, to] = [to, from];
      stride *= radix;
    }
    return from;
  };
}
