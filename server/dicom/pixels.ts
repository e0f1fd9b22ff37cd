/**
 * Frames to values: bits masked and sign-extended, padding made zero, inverted where low values are bright, rescaled frame by frame, phase in
 * radians where its unit is known. Sources: DICOM PS3.3 C.7.6.3 and C.11.1, PS3.5 section 8.
 */
import type { StoredComponent } from './component';
import type { Header } from './header';
import { radiansPerUnit } from './phase-unit';
import { pixelWarnings, type Found } from './pixel-warnings';
import { count, refuse, type Refused } from './refusal';
import { rescaleOf } from './rescale';
import { rangeOf } from './value-range';
import type { Warning } from './warnings';

export interface Pixels {
  readonly rows: number;
  readonly columns: number;
  readonly frames: number;
  /** Rescaled, [frame, row, column]. */
  readonly values: Float32Array<ArrayBuffer>;
  /** 1st and 99.8th percentile of the values of all frames, padding left out. */
  readonly range: readonly [number, number];
  /** Share of pixels of all frames that are exactly zero as stored, or padding. */
  readonly zeroFraction: number;
  readonly warnings: readonly Warning[];
}

/** Sides in pixels. MR matrices end at 2048 in practice; smaller than 8 is no image (common practice). */
const smallestSide = 8;
const largestSide = 4096;

/** How the pixels of a frame are written. */
export interface Layout {
  readonly rows: number;
  readonly columns: number;
  readonly bytesPerPixel: 1 | 2;
  readonly bitsStored: number;
  readonly shift: number;
  readonly signed: boolean;
}

/** One frame as it comes from `framesOf`, with the header seen for it. */
export interface StoredFrame {
  readonly bytes: Uint8Array;
  readonly header: Header;
}

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

/** Pixels that are taken at once: a frame of 4096² would need 64 MB for its integers alone. */
const stripPixels = 1 << 16;

/** Stored values as the integers they stand for, strip by strip; each strip is written over by the next. Bits outside BitsStored, where old files
 *  kept overlays, are masked away. */
function* strips(frame: Uint8Array, { rows, columns, bytesPerPixel, bitsStored, shift, signed }: Layout): Generator<Strip> {
  const view = new DataView(frame.buffer, frame.byteOffset, frame.byteLength);
  const nPixels = rows * columns;
  const whole = new Int32Array(Math.min(stripPixels, nPixels));
  const unused = 32 - bitsStored;
  for (let start = 0; start < nPixels; start += stripPixels) {
    const stored = whole.subarray(0, Math.min(stripPixels, nPixels - start));
    for (let i = 0; i < stored.length; i++) {
      const word = bytesPerPixel === 1 ? view.getUint8(start + i) : view.getUint16(2 * (start + i), true);
      const top = (word >>> shift) << unused;
      stored[i] = signed ? top >> unused : top >>> unused;
    }
    yield { start, stored };
  }
}

interface Strip {
  /** The first of its pixels. */
  readonly start: number;
  readonly stored: Int32Array;
}

/** Values of frames that make one image: the same component, one size. */
export function readPixels(frames: readonly StoredFrame[], layout: Layout, component: StoredComponent): Pixels {
  const { rows, columns } = layout;
  const nPixels = rows * columns;
  const values = new Float32Array(frames.length * nPixels);
  const largest = isInverted(frames) ? largestStored(frames, layout) : undefined;
  const found: Found = { padded: 0, negative: 0, zeros: 0, ignoredRescales: 0, inverted: largest !== undefined, unknownUnit: false };
  const isPadding = frames.some(({ header }) => header.numbers('pixelPaddingValue').length > 0) ? new Uint8Array(values.length) : undefined;
  frames.forEach((frame, index) => {
    const map = mapOf(frame.header, layout, component, largest);
    if (map.isIgnored) found.ignoredRescales++;
    if (map.isUnitUnknown) found.unknownUnit = true;
    for (const { start, stored } of strips(frame.bytes, layout)) {
      const part = [index * nPixels + start, index * nPixels + start + stored.length] as const;
      mapStrip({ stored, values: values.subarray(...part), isPadding: isPadding?.subarray(...part) }, map, found);
    }
  });
  const zeroFraction = (found.zeros + found.padded) / values.length;
  return {
    rows,
    columns,
    frames: frames.length,
    values,
    range: rangeOf(values, isPadding),
    zeroFraction,
    warnings: pixelWarnings(found, component),
  };
}

interface Mapped {
  readonly stored: Int32Array;
  readonly values: Float32Array;
  readonly isPadding: Uint8Array | undefined;
}

/** The loop over pixels: millions of them, so it calls nothing. */
function mapStrip({ stored, values, isPadding }: Mapped, { slope, intercept, zero, padding }: ValueMap, found: Found): void {
  for (let pixel = 0; pixel < stored.length; pixel++) {
    const level = stored[pixel] as number;
    if (level === padding) {
      if (isPadding !== undefined) isPadding[pixel] = 1;
      found.padded++;
      continue;
    }
    const value = slope * level + intercept;
    if (level === zero) found.zeros++;
    if (value < 0) found.negative++;
    values[pixel] = value;
  }
}

/** What becomes of a stored value: a straight line, and which of them stands for no signal. */
interface ValueMap {
  readonly slope: number;
  readonly intercept: number;
  readonly zero: number;
  /** The stored value that marks a place without an image. */
  readonly padding: number | undefined;
  readonly isIgnored: boolean;
  readonly isUnitUnknown: boolean;
}

function mapOf(header: Header, layout: Layout, component: StoredComponent, largest: number | undefined): ValueMap {
  const { slope, intercept, isIgnored } = rescaleOf(header);
  const radians = component === 'phase' ? radiansPerUnit(header, layout) : undefined;
  const isUnitUnknown = component === 'phase' && radians === undefined;
  const padding = paddingValue(header, layout);
  // Bright and dark are turned about the largest value that is stored, which so becomes zero, wherever the intercept would put it.
  if (largest !== undefined) return { slope: -slope, intercept: slope * largest, zero: largest, padding, isIgnored, isUnitUnknown };
  const factor = radians ?? 1;
  // Padding that stands for zero anyway needs no care of its own.
  const isZero = padding === 0 && intercept === 0;
  return {
    ...{ slope: factor * slope, intercept: factor * intercept, zero: 0 },
    ...{ padding: isZero ? undefined : padding, isIgnored, isUnitUnknown },
  };
}

const isInverted = (frames: readonly StoredFrame[]): boolean => frames[0]?.header.text('photometricInterpretation') === 'MONOCHROME1';

function largestStored(frames: readonly StoredFrame[], layout: Layout): number {
  let largest = -Infinity;
  for (const { bytes, header } of frames) {
    const padding = paddingValue(header, layout);
    for (const { stored } of strips(bytes, layout)) {
      for (const level of stored) if (level > largest && level !== padding) largest = level;
    }
  }
  return Number.isFinite(largest) ? largest : 0;
}

/** The value that marks places without an image, read with the sign of the pixels whatever VR the file gave it. */
function paddingValue(header: Header, { signed }: Layout): number | undefined {
  const value = header.number('pixelPaddingValue');
  if (value === undefined) return undefined;
  return signed ? (value << 16) >> 16 : value & 0xffff;
}
