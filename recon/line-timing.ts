/**
 * When the lines of a plane are acquired. One line each T = TR · averages, in order from one edge of k-space to the other; with echo
 * trains, train s of S takes the lines s, s + S, s + 2S …, so that neighbouring lines are one TR apart and each echo fills a band of its
 * own. Where the header gives no TR, 500 ms is assumed; where it gives no averages, one. Common practice.
 */
import type { Acquisition } from './acquisition';

const assumedRepetitionTime = 0.5;

/** Seconds. */
export const repetitionTimeOf = ({ repetitionTime }: Acquisition): number => repetitionTime ?? assumedRepetitionTime;

/** Seconds from one line to the next, averages taken before the next line. */
export const lineInterval = (acquisition: Acquisition): number => repetitionTimeOf(acquisition) * (acquisition.averages ?? 1);

/** Echo trains that it takes to acquire `nLines`. */
export const shotsOf = (nLines: number, linesPerShot: number): number => Math.max(1, Math.ceil(nLines / linesPerShot));
