/** Draws from a seeded stream, for choosing where and how a file is broken. */
import { randomOf, type Random } from '../../recon/random';

export interface Chance {
  /** A whole number from 0 to `count` − 1. */
  below(count: number): number;
  oneOf<Value>(list: readonly Value[]): Value;
  bytes(count: number): Uint8Array;
}

/** The stream of one file: the same, whichever files come before it. */
export function chanceOf(seed: number, stream: string): Chance {
  const random: Random = randomOf(seed, stream);
  const below = (count: number): number => Math.floor(random.uniform() * count);
  return {
    below,
    oneOf<Value>(list: readonly Value[]): Value {
      if (list.length === 0) throw new RangeError('list must have a value, got none');
      return list[below(list.length)] as Value;
    },
    bytes: (count) => Uint8Array.from({ length: count }, () => below(256)),
  };
}
