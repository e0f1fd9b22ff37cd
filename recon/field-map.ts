/**
 * Where the main field is off, in hertz. A smooth field is what is left after shimming: a polynomial of second order, as in
 * `object-phase.ts`, drawn from the seed of the recipe. Along phase encoding (p) and readout (q), each −1 to 1 over the picture:
 *   Δf = a·p + b·q + c·pq + d(p² − q²) + e(p² + q²). Common practice.
 */
import type { Acquisition } from './acquisition';
import type { Grid } from './grid';
import { linesOf } from './lines';
import type { Random } from './random';

export interface FieldMap {
  /** [row, column]. */
  readonly hertz: Float64Array;
  /** By how much it changes from one face of the slice to the other, hertz, [row, column]. */
  readonly acrossSlice: Float64Array;
}

const normalised = (index: number, n: number): number => (n === 1 ? 0 : (2 * index) / (n - 1) - 1);

/** A smooth field that spreads over exactly `range` about 0, [row, column] in the unit of `range`. A picture of one pixel has none. */
export function smoothField(grid: Grid, acquisition: Acquisition, random: Random, range: number): Float64Array {
  const { nLines, samplesPerLine, lineStride, sampleStride } = linesOf(grid, acquisition);
  const [a, b, c, d, e] = [random.normal(), random.normal(), random.normal(), random.normal(), random.normal()];
  const field = new Float64Array(nLines * samplesPerLine);
  let low = Infinity;
  let high = -Infinity;
  for (let line = 0; line < nLines; line++) {
    const p = normalised(line, nLines);
    for (let sample = 0; sample < samplesPerLine; sample++) {
      const q = normalised(sample, samplesPerLine);
      const value = a * p + b * q + c * p * q + d * (p * p - q * q) + e * (p * p + q * q);
      field[line * lineStride + sample * sampleStride] = value;
      if (value < low) low = value;
      if (value > high) high = value;
    }
  }
  const scale = high > low ? range / (high - low) : 0;
  const middle = (low + high) / 2;
  for (let i = 0; i < field.length; i++) field[i] = ((field[i] as number) - middle) * scale;
  return field;
}
