/**
 * Small drawings of what can be seen, as SVG parts on a 96 × 60 picture: a head of ellipses with one fault each. They are signs,
 * not simulations: what a fault really looks like is computed on the bench.
 */
import type { Case } from '@/server/contract/cases';

type Sighting = Case['seen'][number];

export interface SightingArt {
  /** The head is drawn at these shifts, brightest first. */
  readonly heads: readonly { readonly shift: number; readonly strength: number }[];
  /** Filter or clip applied to the heads. */
  readonly effect?: 'blur' | 'noise' | 'bend';
  readonly over?: 'line' | 'shade' | 'void' | 'question' | 'fold';
}

const whole = [{ shift: 0, strength: 1 }];

export const sightingArt: Record<Sighting, SightingArt> = {
  ghosts: {
    heads: [
      { shift: 24, strength: 0.3 },
      { shift: -24, strength: 0.3 },
      { shift: 0, strength: 1 },
    ],
  },
  'fold-in': { heads: whole, over: 'fold' },
  lines: { heads: whole, over: 'line' },
  shading: { heads: whole, over: 'shade' },
  distortion: { heads: whole, effect: 'bend' },
  blur: { heads: whole, effect: 'blur' },
  noise: { heads: whole, effect: 'noise' },
  'signal-loss': { heads: whole, over: 'void' },
  other: { heads: [{ shift: 0, strength: 0.4 }], over: 'question' },
};
