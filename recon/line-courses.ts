/**
 * A periodic course as the lines see it. Line n (of those taken) is taken `averages` times; with averages as the inner loop at the
 * times (n·A + j)·TR, as the outer loop at (j·N + n)·TR. The mean over j of what happens at those times is what the line holds. For a
 * sine the inner loop leaves |sin(πf·TR·A)/(A·sin(πf·TR))| of it. The third way takes what is given as what averaging has left, once each A·TR.
 */
import type { Acquisition } from './acquisition';
import { lineInterval, repetitionTimeOf } from './line-timing';

export type Averaging = 'left-over' | 'inner-loop' | 'outer-loop';

/** Seconds at which line `n` of `nTaken` is taken, once or once for each average. */
export function timesOf(n: number, nTaken: number, averaging: Averaging, acquisition: Acquisition): number[] {
  if (averaging === 'left-over') return [n * lineInterval(acquisition)];
  const TR = repetitionTimeOf(acquisition);
  const averages = Math.max(1, Math.round(acquisition.averages ?? 1));
  return Array.from({ length: averages }, (_, j) => (averaging === 'inner-loop' ? n * averages + j : j * nTaken + n) * TR);
}
