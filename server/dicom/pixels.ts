/**
 * A frame to values: bits masked and sign-extended, padding made zero, rescaled. Sources: DICOM PS3.3 C.7.6.3 and C.11.1, PS3.5 section 8.
 */
import type { Header } from './header';
import type { Warning } from './warnings';
import { count, refuse, type Refused } from './refusal';

export interface Pixels {
  readonly rows: number;
  readonly columns: number;
  /** Rescaled, [row, column]. */
  readonly values: Float32Array<ArrayBuffer>;
  /** 1st and 99.8th percentile of the values, padding left out. */
  readonly range: readonly [number, number];
  /** Share of pixels that are exactly zero as stored, or padding. */
  readonly zeroFraction: number;
  readonly warnings: readonly Warning[];
}

/** Sides in pixels. MR matrices end at 2048 in practice; smaller than 8 is no image (common practice). */
const smallestSide = 8;
const largestSide = 4096;
/** Slopes of MR are within a few powers of ten of 1; far beyond, float32 would overflow. */
const largestRescale = 1e12;
const rangePercentiles = [0.01, 0.998] as const;

/** How the pixels of a frame are written. */
export interface Layout {
  readonly rows: number;
  readonly columns: number;
  readonly bytesPerPixel: 1 | 2;
  readonly bitsStored: number;
  readonly shift: number;
  readonly signed: boolean;
}

/** `frame` as it comes from `framesOf`. */
export const readPixels = (frame: Uint8Array, layout: Layout, header: Header): Pixels =>
  rescaled(storedValues(frame, layout), layout, header);

export function layoutOf(header: Header): Layout | Refused {
  const rows = header.number('rows');
  const columns = header.number('columns');
  if (rows === undefined || columns === undefined) return refuse('size', 'The header does not say how many rows and columns there are.');
  const fits = (side: number) => Number.isInteger(side) && side >= smallestSide && side <= largestSide;
  if (!fits(rows) || !fits(columns)) {
    const claim = `The header claims ${count(columns)} columns and ${count(rows)} rows`;
    return refuse('size', `${claim}; images from ${smallestSide} to ${largestSide} pixels a side are read.`);
  }
  const bitsAllocated = header.number('bitsAllocated');
  if (bitsAllocated !== 8 && bitsAllocated !== 16) {
    return refuse('bit-depth', `The header claims pixels of ${count(bitsAllocated)} bits; 8 and 16 are read.`);
  }
  const bitsStored = header.number('bitsStored') ?? bitsAllocated;
  const highBit = header.number('highBit') ?? bitsStored - 1;
  const possible = Number.isInteger(bitsStored) && Number.isInteger(highBit) && highBit >= bitsStored - 1 && highBit < bitsAllocated;
  if (!possible || bitsStored < 8) {
    return refuse(
      'bit-depth',
      `The header claims ${count(bitsStored)} bits of ${bitsAllocated}, which cannot be, or is not read; 8 to 16 are.`,
    );
  }
  const signed = header.number('pixelRepresentation') === 1;
  return { rows, columns, bytesPerPixel: bitsAllocated === 8 ? 1 : 2, bitsStored, shift: highBit + 1 - bitsStored, signed };
}

/** Stored values as the integers they stand for. Bits outside BitsStored, where old files kept overlays, are masked away. */
function storedValues(frame: Uint8Array, { rows, columns, bytesPerPixel, bitsStored, shift, signed }: Layout): Int32Array {
  const view = new DataView(frame.buffer, frame.byteOffset, frame.byteLength);
  const stored = new Int32Array(rows * columns);
  const unused = 32 - bitsStored;
  for (let i = 0; i < stored.length; i++) {
    const word = bytesPerPixel === 1 ? view.getUint8(i) : view.getUint16(2 * i, true);
    const top = (word >>> shift) << unused;
    stored[i] = signed ? top >> unused : top >>> unused;
  }
  return stored;
}

/** Stored values reach from −32768 (signed) to 65535 (unsigned). */
const signOffset = 1 << 15;
const nStoredValues = 3 << 15;

function rescaled(stored: Int32Array, layout: Layout, header: Header): Pixels {
  const { slope, intercept, warning } = rescaleOf(header);
  const padding = paddingValue(header, layout);
  // Padding that stands for zero anyway needs no care of its own.
  const mapped = padding === 0 && intercept === 0 ? undefined : padding;
  const values = new Float32Array(stored.length);
  const counts = new Uint32Array(nStoredValues);
  let padded = 0;
  let negative = 0;
  for (let i = 0; i < stored.length; i++) {
    const value = stored[i] as number;
    if (value === mapped) {
      padded++;
      continue;
    }
    if (value < 0) negative++;
    counts[value + signOffset] = (counts[value + signOffset] as number) + 1;
    values[i] = slope * value + intercept;
  }
  const { rows, columns } = layout;
  const range = rangeOf(counts, stored.length - padded, (value) => slope * value + intercept);
  const zeroFraction = ((counts[signOffset] as number) + padded) / stored.length;
  const warnings = [warning, paddingWarning(padded), negativeWarning(negative)].filter((found) => found !== undefined);
  return { rows, columns, values, range, zeroFraction, warnings };
}

/** The value that marks places without an image, read with the sign of the pixels whatever VR the file gave it. */
function paddingValue(header: Header, { signed }: Layout): number | undefined {
  const value = header.number('pixelPaddingValue');
  if (value === undefined) return undefined;
  return signed ? (value << 16) >> 16 : value & 0xffff;
}

function rescaleOf(header: Header): { slope: number; intercept: number; warning?: Warning } {
  const [slope = 1] = header.numbers('rescaleSlope');
  const [intercept = 0] = header.numbers('rescaleIntercept');
  // NaN, which stands for what is no number, fails both.
  if (slope >= 1 / largestRescale && slope <= largestRescale && Math.abs(intercept) <= largestRescale) return { slope, intercept };
  const text = 'The rescale slope and intercept in the header make no sense and were left out: values are as stored.';
  return { slope: 1, intercept: 0, warning: { code: 'rescale-ignored', text } };
}

/** Percentiles by counting; the two ends are kept apart, so that a window can be made of them. */
function rangeOf(counts: Uint32Array, total: number, rescale: (stored: number) => number): readonly [number, number] {
  const [low, high] = rangePercentiles.map((fraction) => rescale(storedPercentile(counts, total * fraction)));
  const from = Math.fround(low ?? 0);
  const to = Math.fround(high ?? 0);
  return to > from ? [from, to] : [from, from + 1];
}

/** The smallest stored value at which more than `rank` values are counted, or the largest that occurs. */
function storedPercentile(counts: Uint32Array, rank: number): number {
  let seen = 0;
  let last = 0;
  for (let index = 0; index < counts.length; index++) {
    const count = counts[index] as number;
    if (count === 0) continue;
    seen += count;
    last = index - signOffset;
    if (seen > rank) break;
  }
  return last;
}

function paddingWarning(padded: number): Warning | undefined {
  if (padded === 0) return undefined;
  return { code: 'padding', text: `${padded} pixels held the padding value, which marks places without an image; they were set to zero.` };
}

function negativeWarning(negative: number): Warning | undefined {
  if (negative === 0) return undefined;
  return {
    code: 'negative-values',
    text: `${negative} pixels are negative, which a magnitude cannot be: a filter, an interpolation or a subtraction made them.`,
  };
}
