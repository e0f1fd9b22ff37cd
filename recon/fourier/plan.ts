/** Plans by length, made once: twiddles, passes, chirps. A worker sees few matrix sizes, so that the store stays small. */
import { bluestein } from './bluestein';
import type { LineTransform } from './lanes';
import { mixedRadix, smallFactors } from './mixed-radix';

const plans = new Map<number, LineTransform>();

export function planOf(length: number): LineTransform {
  const known = plans.get(length);
  if (known) return known;
  const factors = smallFactors(length);
  const plan = factors ? mixedRadix(length, factors) : bluestein(length);
  plans.set(length, plan);
  return plan;
}
