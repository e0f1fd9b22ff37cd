/**
 * How far k-space was taken along one direction, on either side of zero: what partial Fourier reconstructions and filters go by.
 */
import type { Encoded } from './cause';
import type { Lines } from './lines';
import { takenLines } from './lines';

export interface Reach {
  /** Lines from the centre to the furthest that is taken, below and above it. */
  readonly below: number;
  readonly above: number;
  /** Most lines in a row that were skipped between two that are taken. */
  readonly gap: number;
}

export function reachOf(kspace: Encoded, lines: Lines): Reach {
  const taken = takenLines(kspace, lines);
  const first = taken.indexOf(true);
  const last = taken.lastIndexOf(true);
  if (first === -1) return { below: 0, above: 0, gap: 0 };
  let gap = 0;
  for (let line = first, previous = first; line <= last; line++) {
    if (!taken[line]) continue;
    gap = Math.max(gap, line - previous - 1);
    previous = line;
  }
  return { below: Math.max(0, lines.centre - first), above: Math.max(0, last - lines.centre), gap };
}

/** Lines that one side lacks and that are to be made up from the other; 0 where both reach equally far. Lines skipped evenly may end
 *  one step apart, and an even count has one line, −N/2, without a mirror image: neither makes a side short. */
export function shortfall({ below, above, gap }: Reach): number {
  const difference = Math.abs(above - below);
  return difference > gap + 1 ? difference : 0;
}
