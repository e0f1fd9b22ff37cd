/** The words of a cause: one for every value of the contract, so that a value without a word does not compile. */
import type { CatalogueEntry } from '@/server/contract/catalogue';

export type Along = CatalogueEntry['runsAlong'];
export type Actor = CatalogueEntry['remedies'][number]['who'];

/** In the order of the columns of the sample book. */
export const alongWords: Record<Along, string> = {
  'phase-encode': 'phase encoding',
  readout: 'readout',
  both: 'both',
  none: 'neither',
};
export const alongs = Object.keys(alongWords) as Along[];

/** From the console outwards. */
export const actorWords: Record<Actor, string> = {
  technologist: 'technologist',
  physicist: 'physicist',
  'licensed service': 'licensed service',
};
export const actors = Object.keys(actorWords) as Actor[];
