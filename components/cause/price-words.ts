/**
 * The price of a remedy as a word in each column: what it does to time, signal and contrast, and what it asks of the patient's safety. A
 * column that is not named stays as it is.
 */
import type { Moves } from '@/server/contract/catalogue';

export type Price = keyof Moves;

type Words = { readonly [P in Price]: { readonly head: string; readonly said: Readonly<Record<NonNullable<Moves[P]>, string>> } };

const ofAmount = { rises: 'more', falls: 'less', changes: 'varies' } as const;

const words: Words = {
  time: { head: 'time', said: { rises: 'longer', falls: 'shorter', changes: 'varies', once: 'once' } },
  snr: { head: 'SNR', said: ofAmount },
  contrast: { head: 'contrast', said: { changes: 'other' } },
  sar: { head: 'SAR', said: ofAmount },
  nerveStimulation: { head: 'nerve stimulation', said: ofAmount },
  implantConditions: { head: 'implant', said: { changes: 'check' } },
};

export const prices = Object.keys(words) as Price[];
export const priceHead = (price: Price): string => words[price].head;

/** What a column says of a remedy; null where it stays as it is. */
export function priceWord(price: Price, moves: Moves): string | null {
  const said: Readonly<Record<string, string>> = words[price].said;
  const move = moves[price];
  return move === undefined ? null : (said[move] ?? move);
}

/** It may leave an operating mode or the conditions of an implant. */
export function needsCare(price: Price, moves: Moves): boolean {
  if (price === 'implantConditions') return moves.implantConditions !== undefined;
  return (price === 'sar' || price === 'nerveStimulation') && (moves[price] === 'rises' || moves[price] === 'changes');
}

/** What the words stand for that do not say it themselves. */
export const priceLegend =
  'once: at the table or for an adjustment, then the scan is as long as before · varies: up or down, as it is done';
