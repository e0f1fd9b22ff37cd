/** Stockham transform of a length whose prime factors are small: passes of radix 4, then 2, 3, 5, 7, 11 and 13. */
import type { Butterfly } from './butterflies';
import { radix2, radix4 } from './butterflies';
import type { Lanes, LineTransform } from './lanes';
import { rootsOfUnity } from './lanes';
import { oddRadix } from './odd-radix';

const radices = [4, 2, 3, 5, 7, 11, 13] as const;

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

function butterflyOf(radix: number): Butterfly {
  if (radix === 4) return radix4;
  return radix === 2 ? radix2 : oddRadix(radix);
}

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
