/**
 * Phase-encode lines of a plane: the unit in which k-space is acquired. A line runs along the readout; lines are counted along
 * the phase-encode axis from index 0, the line of zero phase encoding at floor(n/2).
 */
import type { Acquisition } from './acquisition';
import { phaseEncodeAxis } from './acquisition';
import type { Encoded } from './cause';
import type { ComplexPlane, Grid } from './grid';
import { copyOf, copyOfBytes, unwrittenArray, unwrittenBytes } from './spare-arrays';

/** Where the lines of a plane lie in memory. */
export interface Lines {
  readonly nLines: number;
  readonly centre: number;
  readonly samplesPerLine: number;
  /** Index of a sample: line · lineStride + sample · sampleStride. */
  readonly lineStride: number;
  readonly sampleStride: number;
}

export function linesOf({ rows, columns }: Pick<Grid, 'rows' | 'columns'>, { phaseEncode }: Acquisition): Lines {
  return phaseEncodeAxis(phaseEncode) === 0
    ? { nLines: rows, centre: Math.floor(rows / 2), samplesPerLine: columns, lineStride: columns, sampleStride: 1 }
    : { nLines: columns, centre: Math.floor(columns / 2), samplesPerLine: rows, lineStride: 1, sampleStride: columns };
}

/** The two directions of a plane, as a form names them. */
export type EncodingDirection = 'phase-encode' | 'readout';

/** The "lines" that are counted along `direction`: along the readout they are the samples of equal kx of all phase-encode lines. */
export function linesAlong(grid: Pick<Grid, 'rows' | 'columns'>, { phaseEncode }: Acquisition, direction: EncodingDirection): Lines {
  const readout = phaseEncode === 'row' ? 'column' : 'row';
  return linesOf(grid, { phaseEncode: direction === 'readout' ? readout : phaseEncode });
}

/** The record of `length` samples that were all taken. */
export const allTaken = (length: number): Uint8Array => unwrittenBytes(length).fill(1);

/** k-space with every sample taken; the samples are copied, so that a cached transform stays as it is. */
export function fullyTaken(kspace: ComplexPlane): Encoded {
  return { ...kspace, re: copyOf(kspace.re), im: copyOf(kspace.im), taken: allTaken(kspace.re.length) };
}

/** For each line whether any of its samples was taken. */
export function takenLines(kspace: Encoded, lines: Lines): readonly boolean[] {
  return Array.from({ length: lines.nLines }, (_, line) => {
    for (let sample = 0; sample < lines.samplesPerLine; sample++) {
      if (kspace.taken[line * lines.lineStride + sample * lines.sampleStride] === 1) return true;
    }
    return false;
  });
}

/** For each line its number among the lines that are taken, from 0; −1 where it is not taken: a skipped line takes no time. */
export function takenOrder(kspace: Encoded, lines: Lines): Int32Array {
  let n = 0;
  return Int32Array.from(takenLines(kspace, lines), (isTaken) => (isTaken ? n++ : -1));
}

/** A copy in which the lines that `keep` refuses are zero and not taken. */
export function keepLines(kspace: Encoded, lines: Lines, keep: (line: number) => boolean): Encoded {
  const kept = { ...kspace, re: copyOf(kspace.re), im: copyOf(kspace.im), taken: copyOfBytes(kspace.taken) };
  for (let line = 0; line < lines.nLines; line++) {
    if (keep(line)) continue;
    const end = line * lines.lineStride + lines.samplesPerLine * lines.sampleStride;
    for (let i = line * lines.lineStride; i < end; i += lines.sampleStride) {
      kept.re[i] = 0;
      kept.im[i] = 0;
      kept.taken[i] = 0;
    }
  }
  return kept;
}

/** A copy in which line n is multiplied by re[n] + i·im[n]. */
export function weightLines<P extends ComplexPlane>(kspace: P, lines: Lines, weight: { re: Float64Array; im: Float64Array }): P {
  const re = unwrittenArray(kspace.re.length);
  const im = unwrittenArray(kspace.im.length);
  for (let line = 0; line < lines.nLines; line++) {
    const wr = weight.re[line] as number;
    const wi = weight.im[line] as number;
    for (let sample = 0; sample < lines.samplesPerLine; sample++) {
      const i = line * lines.lineStride + sample * lines.sampleStride;
      const a = kspace.re[i] as number;
      const b = kspace.im[i] as number;
      re[i] = a * wr - b * wi;
      im[i] = a * wi + b * wr;
    }
  }
  return { ...kspace, re, im };
}
