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

/** Each pixel is the mean over the area it covers, parts of samples included: a fine texture gives no moiré. */
function reduce(values: Float64Array, { rows, columns, spacing }: Drawing['grid'], [low, high]: Drawing['window']): Picture {
  const { width, height } = sidesOf(rows, columns, spacing);
  const across = Array.from({ length: width }, (_, x) => shares(x, width, columns));
  const narrowed = new Float64Array(rows * width);
  for (let row = 0; row < rows; row++) {
    across.forEach((parts, x) => {
      narrowed[row * width + x] = parts.reduce((sum, [column, share]) => sum + share * (values[row * columns + column] as number), 0);
    });
  }
  const levels = new Uint8Array(width * height);
  const factor = 255 / (high > low ? high - low : 1);
  for (let y = 0; y < height; y++) {
    const parts = shares(y, height, rows);
    for (let x = 0; x < width; x++) {
      const mean = parts.reduce((sum, [row, share]) => sum + share * (narrowed[row * width + x] as number), 0);
      levels[y * width + x] = Math.max(0, Math.min(255, Math.round((mean - low) * factor)));
    }
  }
  return { width, height, levels };
}

/** Which of `nSource` samples output sample `index` of `n` covers, and by what share of itself; the shares add up to 1. */
function shares(index: number, n: number, nSource: number): [sample: number, share: number][] {
  const from = (index * nSource) / n;
  const to = ((index + 1) * nSource) / n;
  const parts: [number, number][] = [];
  for (let sample = Math.floor(from); sample < to && sample < nSource; sample++) {
    const share = (Math.min(to, sample + 1) - Math.max(from, sample)) / (to - from);
    if (share > 0) parts.push([sample, share]);
  }
  return parts;
}

function sidesOf(rows: number, columns: number, [rowSpacing, columnSpacing]: Grid['spacing']) {
  const pixel = Math.min(rowSpacing, columnSpacing);
  const tall = (rows * rowSpacing) / pixel;
  const wide = (columns * columnSpacing) / pixel;
  const scale = Math.min(1, longestSide / Math.max(tall, wide));
  return { width: Math.max(1, Math.round(wide * scale)), height: Math.max(1, Math.round(tall * scale)) };
}
