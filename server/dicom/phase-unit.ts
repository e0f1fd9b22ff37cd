/**
 * What a phase image counts in. Radians are worked out only where the header says how: by the name of the unit, or because the lowest value
 * that can be stored is rescaled to half a turn in one of the three units in use: radians, thousandths of them, 4096ths of half a turn
 * (common practice). Everything else would be a guess, and such an image is shown in its own numbers.
 */
import type { Header } from './header';
import type { Layout } from './pixels';
import { rescaleOf } from './rescale';

const named: Readonly<Record<string, number>> = { RAD: 1, MRAD: 1e-3 };

/** Half a turn in a unit, and what to multiply by. */
const halfTurns: readonly (readonly [lowest: number, factor: number])[] = [
  [Math.PI, 1],
  [1000 * Math.PI, 1e-3],
  [4096, Math.PI / 4096],
];
/** Decimal strings hold 3142 for 3141.59: 1.3e-4. */
const tolerance = 1e-3;

/** The factor that makes radians of rescaled values; undefined where the header does not tell. */
export function radiansPerUnit(header: Header, { bitsStored, signed }: Layout): number | undefined {
  const unit = (header.text('rescaleType') ?? '').replaceAll(/[[\]\s]/g, '').toUpperCase();
  if (named[unit] !== undefined) return named[unit];
  const { slope, intercept } = rescaleOf(header);
  const lowest = intercept - (signed ? slope * 2 ** (bitsStored - 1) : 0);
  return halfTurns.find(([halfTurn]) => Math.abs(-lowest / halfTurn - 1) < tolerance)?.[1];
}
