/** Files with encapsulated pixel data: items as they are given, so that wrong ones can be made. Source: DICOM PS3.5 annex A.4. */
import { joined } from '../../../server/dicom/elements';
import type { Attributes } from '../../../server/dicom/write';
import { madeFile } from './made-image';

export const runLengthSyntax = '1.2.840.10008.1.2.5';
export const jpegFamily = '1.2.840.10008.1.2.4';

export const uint32 = (...values: number[]): Uint8Array => new Uint8Array(Uint32Array.from(values).buffer);

const padded = (bytes: Uint8Array): Uint8Array => (bytes.length % 2 === 0 ? bytes : joined([bytes, new Uint8Array(1)]));
const item = (bytes: Uint8Array): Uint8Array => joined([uint32(0xe000_fffe, padded(bytes).length), padded(bytes)]);
const delimiter = uint32(0xe0dd_fffe, 0);
const openPixelData = joined([uint32(0x0010_7fe0), Uint8Array.of(0x4f, 0x42, 0, 0), uint32(0xffff_ffff)]);

export interface Encapsulated {
  readonly transferSyntax: string;
  readonly fragments: readonly Uint8Array[];
  readonly attributes?: Attributes;
  /** Empty where left out. */
  readonly offsetTable?: readonly number[];
  /** What stands in place of the delimiter and behind it. */
  readonly end?: Uint8Array;
}

export function encapsulatedFile({ transferSyntax, fragments, attributes, offsetTable = [], end = delimiter }: Encapsulated): Uint8Array {
  const header = madeFile({
    without: ['7FE0,0010'],
    extra: [{ tag: '0002,0010', vr: 'UI', value: transferSyntax }],
    ...(attributes && { attributes }),
  });
  return joined([header, openPixelData, item(uint32(...offsetTable)), ...fragments.map(item), end]);
}

/** Attributes of frames of this size. */
export const sized = (rows: number, columns: number, bits: number, signed = false): Attributes => ({
  rows,
  columns,
  bitsAllocated: bits <= 8 ? 8 : 16,
  bitsStored: bits,
  highBit: bits - 1,
  pixelRepresentation: signed ? 1 : 0,
});

/** A segment of literal runs and, where a byte is repeated, of repeats (DICOM PS3.5 G.3.1). */
function runs(bytes: Uint8Array): Uint8Array {
  const out: number[] = [];
  for (let at = 0; at < bytes.length;) {
    let same = 1;
    while (same < 128 && at + same < bytes.length && bytes[at + same] === bytes[at]) same++;
    if (same > 1) out.push(257 - same, bytes[at] ?? 0);
    else out.push(0, bytes[at] ?? 0);
    at += same;
  }
  return padded(Uint8Array.from(out));
}

/** The RLE frame of little endian pixels. */
export function runLengthFrame(pixels: Uint8Array, bytesPerPixel: 1 | 2): Uint8Array {
  const planes = Array.from({ length: bytesPerPixel }, (_, plane) =>
    runs(pixels.filter((_value, index) => index % bytesPerPixel === bytesPerPixel - 1 - plane)),
  );
  const offsets = planes.map((_, plane) => 64 + planes.slice(0, plane).reduce((sum, { length }) => sum + length, 0));
  const header = new Uint32Array(16);
  header.set([planes.length, ...offsets]);
  return joined([new Uint8Array(header.buffer), ...planes]);
}
