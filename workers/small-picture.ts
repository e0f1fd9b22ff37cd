/**
 * Small pictures: a plane reduced to at most 192 pixels a side as an 8-bit grey PNG. Sides keep the proportions of the anatomy, so
 * oblong pixels are squared. A simulated picture carries a strip that says so and a dashed frame, burned into its pixels.
 */
import { encode } from 'fast-png';
import type { Grid } from '../recon/grid';
import { burnSimulated } from './simulated-strip';

export const longestSide = 192;

/** Grey levels, row-major. */
export interface Picture {
  readonly width: number;
  readonly height: number;
  readonly levels: Uint8Array;
}

interface Drawing {
  readonly values: Float64Array;
  readonly grid: Pick<Grid, 'rows' | 'columns' | 'spacing'>;
  /** Values drawn black and white. */
  readonly window: readonly [number, number];
  readonly simulated?: boolean;
}

/** A PNG of `values`. */
export function smallPicture({ values, grid, window, simulated = false }: Drawing): Uint8Array {
  const picture = reduce(values, grid, window);
  if (simulated) burnSimulated(picture);
  return encode({ width: picture.width, height: picture.height, data: picture.levels, channels: 1, depth: 8 });
}

/** Each pixel is the mean of the values it covers. */
function reduce(values: Float64Array, { rows, columns, spacing }: Drawing['grid'], [low, high]: Drawing['window']): Picture {
  const { width, height } = sidesOf(rows, columns, spacing);
  const levels = new Uint8Array(width * height);
  const factor = 255 / (high > low ? high - low : 1);
  for (let y = 0; y < height; y++) {
    const [top, bottom] = covered(y, height, rows);
    for (let x = 0; x < width; x++) {
      const [left, right] = covered(x, width, columns);
      let sum = 0;
      for (let row = top; row < bottom; row++) {
        for (let column = left; column < right; column++) sum += values[row * columns + column] as number;
      }
      const level = (sum / ((bottom - top) * (right - left)) - low) * factor;
      levels[y * width + x] = Math.max(0, Math.min(255, Math.round(level)));
    }
  }
  return { width, height, levels };
}

/** First index and the one after the last that output pixel `index` of `n` covers; at least one. */
function covered(index: number, n: number, nSource: number): [number, number] {
  const first = Math.floor((index * nSource) / n);
  return [first, Math.max(first + 1, Math.floor(((index + 1) * nSource) / n))];
}

function sidesOf(rows: number, columns: number, [rowSpacing, columnSpacing]: Grid['spacing']) {
  const pixel = Math.min(rowSpacing, columnSpacing);
  const tall = (rows * rowSpacing) / pixel;
  const wide = (columns * columnSpacing) / pixel;
  const scale = Math.min(1, longestSide / Math.max(tall, wide));
  return { width: Math.max(1, Math.round(wide * scale)), height: Math.max(1, Math.round(tall * scale)) };
}
