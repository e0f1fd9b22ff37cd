/**
 * What every codestream must agree on with the header before it is decoded, so that nothing is allocated for sizes that cannot be, and
 * after, since decoders return too little or too much without a word. Depths: DICOM PS3.5 section 8.2.
 */
import type { Layout } from '../pixels';
import { refuse, type Refused } from '../refusal';

/** What a codestream says of itself. */
export interface Coded {
  readonly rows: number;
  readonly columns: number;
  readonly components: number;
  /** Bits of a sample. */
  readonly precision: number;
  /** Undefined where the code knows bit patterns only, and the header alone says what they mean. */
  readonly signed?: boolean;
  /** Bytes up to its end marker: what pads a fragment may be anything. */
  readonly length: number;
}

export const cutCodestream = refuse(
  'truncated',
  'The compressed pixels end too early: the file was cut off while it was copied, or compressed wrongly. Export it again.',
);
export const damagedCodestream = refuse('unreadable', 'The compressed pixels are damaged and cannot be decoded. Export the image again.');
export const otherCodestream = refuse(
  'transfer-syntax',
  'The pixels are compressed in another way than the header says. Export the image again, uncompressed (explicit little endian).',
);

/** Why a codestream cannot be a frame of this layout; undefined where it can. */
export function whyUnfit({ rows, columns, components, precision, signed }: Coded, layout: Layout): Refused | undefined {
  if (components !== 1) return refuse('colour', 'The compressed pixels have several colours; only greyscale is taken.');
  if (rows !== layout.rows || columns !== layout.columns) {
    const sizes = `${layout.columns} × ${layout.rows} pixels in the one, ${columns} × ${rows} in the other`;
    return refuse('size', `The header and the compressed pixels disagree: ${sizes}. Export the image again.`);
  }
  const bitsAllocated = 8 * layout.bytesPerPixel;
  // Only a pattern as long as the pixel tells where values stand that do not start at its lowest bit; only one as long as the value, where
  // its sign is.
  const misplaced = layout.shift > 0 && precision !== bitsAllocated;
  const signLost = layout.signed && signed === undefined && precision < layout.bitsStored;
  const otherSign = signed !== undefined && signed !== layout.signed;
  if (precision >= 1 && precision <= bitsAllocated && !misplaced && !signLost && !otherSign) return undefined;
  return refuse(
    'bit-depth',
    'The header and the compressed pixels disagree about the bits of a pixel or its sign. Export the image again.',
  );
}

/** Decoded samples, of one byte up to a precision of 8 bits and of two beyond, as a frame of this layout. */
export function asFrame(samples: Uint8Array, { precision, signed = false }: Coded, layout: Layout): Uint8Array | Refused {
  const nPixels = layout.rows * layout.columns;
  const width = precision > 8 ? 2 : 1;
  if (samples.length !== nPixels * width) return damagedCodestream;
  if (width === layout.bytesPerPixel) return samples;
  const frame = new Uint8Array(2 * nPixels);
  samples.forEach((sample, index) => {
    frame[2 * index] = sample;
    if (signed && sample > 0x7f) frame[2 * index + 1] = 0xff;
  });
  return frame;
}
