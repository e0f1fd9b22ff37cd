/**
 * Seeded randomness as an argument. No model calls Math.random: the same seed gives the same bytes on any machine.
 *
 * Every step of a recipe draws from a stream of its own, made from the recipe's seed and the step's name. So a step that is
 * added, removed or switched off leaves the noise of the others as it was.
 */
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';

export interface Random {
  /** Uniform in [0, 1). */
  uniform(): number;
  /** Normal, mean 0, standard deviation 1. */
  normal(): number;
}

/** 32 bits of `text` mixed into `seed`: FNV-1a, then the finaliser of MurmurHash3, so that near seeds give far streams. */
function mix(seed: number, text: string): number {
  let hash = 0x811c9dc5 ^ seed;
  for (let i = 0; i < text.length; i++) hash = Math.imul(hash ^ text.charCodeAt(i), 0x01000193);
  hash = Math.imul(hash ^ (hash >>> 16), 0x85ebca6b);
  hash = Math.imul(hash ^ (hash >>> 13), 0xc2b2ae35);
  return hash ^ (hash >>> 16);
}

/** The stream called `stream` of `seed`, an integer of 32 bits. */
export function randomOf(seed: number, stream: string): Random {
  const generator = xoroshiro128plus(mix(seed, stream));
  const uniform = () => uniformFloat64(generator);
  let kept: number | undefined;
  return {
    uniform,
    /** Marsaglia's polar method: two normals from one accepted point of the unit disc (SIAM Rev 1964;6:260, from memory). */
    normal() {
      if (kept !== undefined) {
        const value = kept;
        kept = undefined;
        return value;
      }
      for (;;) {
        const u = 2 * uniform() - 1;
        const v = 2 * uniform() - 1;
        const s = u * u + v * v;
        if (s === 0 || s >= 1) continue;
        const factor = Math.sqrt((-2 * Math.log(s)) / s);
        kept = v * factor;
        return u * factor;
      }
    },
  };
}
