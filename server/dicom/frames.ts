/**
 * Pixel data to frames: each comes out as rows · columns · bytesPerPixel bytes, little endian, whatever the transfer syntax. Nothing is
 * allocated before the sizes are known to fit. Sources: DICOM PS3.5 section 8 and annex A.
 */
import type { Element } from 'dicom-parser';
import type { Decoders } from './codecs/decoders';
import { codestreamsOf } from './encapsulation';
import type { Parsed } from './parse';
import type { Layout } from './pixels';
import { isRefused, refuse, type Refused } from './refusal';
import { encapsulated, explicitBigEndian, uncompressed, whyNotRead } from './transfer-syntax';

export const noPixels = refuse('no-pixels', 'The file holds a header and no pixels, or was cut off before them. Export the image itself.');

/** All frames of a file, decoded: a kilobyte may stand for a frame of 32 MB. */
const mostDecodedBytes = 128 * 1024 * 1024;

/**
 * The bytes of every frame, in the order of the file. Those of uncompressed frames are views of the file's own bytes.
 * `nFrames` is what the header says; where the pixel data hold fewer or more, the file is refused.
 */
export function framesOf(parsed: Parsed, layout: Layout, nFrames: number, decoders: Decoders): readonly Uint8Array[] | Refused {
  const { pixelData, transferSyntax, items } = parsed;
  if (pixelData === undefined || pixelData.length === 0) {
    return noPixels;
  }
  if (!Number.isInteger(nFrames) || nFrames < 1) return refuse('size', 'The header claims an impossible number of frames.');
  if (uncompressed.has(transferSyntax)) return nativeFrames(parsed, pixelData, layout, nFrames);
  const decode = decoders.decoderOf(transferSyntax);
  if (decode === undefined || !encapsulated(transferSyntax))
    return refuse('transfer-syntax', `The pixels are ${whyNotRead(transferSyntax)}.`);
  if (items === undefined) {
    return refuse('transfer-syntax', 'The header says that the pixels are compressed, and they are not packed so. Export the image again.');
  }
  if (nFrames * layout.rows * layout.columns * layout.bytesPerPixel > mostDecodedBytes) {
    return refuse('too-large', `Decoded, the frames need more than ${mostDecodedBytes >> 20} MB. Export them as several files.`);
  }
  const codestreams = codestreamsOf(items, nFrames);
  return isRefused(codestreams) ? codestreams : decoded(codestreams, (codestream) => decode(codestream, layout));
}

function decoded(codestreams: readonly Uint8Array[], decode: (codestream: Uint8Array) => Uint8Array | Refused) {
  const frames: Uint8Array[] = [];
  for (const codestream of codestreams) {
    const frame = decode(codestream);
    // One frame that cannot be read makes the others doubtful.
    if (isRefused(frame)) return frame;
    frames.push(frame);
  }
  return frames;
}

function nativeFrames({ dataSet, transferSyntax }: Parsed, pixelData: Element, layout: Layout, nFrames: number): Uint8Array[] | Refused {
  if (pixelData.hadUndefinedLength === true) {
    return refuse(
      'transfer-syntax',
      'The pixels are packed as if compressed, though the header says they are not. Export the image again, uncompressed.',
    );
  }
  const { rows, columns, bytesPerPixel } = layout;
  const frameBytes = rows * columns * bytesPerPixel;
  const expected = nFrames * frameBytes;
  // An odd number of bytes is padded to an even one.
  if (pixelData.length < expected || pixelData.length > expected + 1) {
    const frames = nFrames === 1 ? '' : `${nFrames} frames of `;
    const claim = `${frames}${columns} × ${rows} pixels of ${bytesPerPixel * 8} bits need ${expected} bytes`;
    return refuse('size', `The header and the pixels disagree: ${claim}, and the file holds ${pixelData.length}. Export it again.`);
  }
  const stored = new Uint8Array(dataSet.byteArray.buffer, dataSet.byteArray.byteOffset + pixelData.dataOffset, pixelData.length);
  const bytes = transferSyntax === explicitBigEndian && isInWords(pixelData, layout) ? swapped(stored) : stored;
  return Array.from({ length: nFrames }, (_, frame) => bytes.subarray(frame * frameBytes, (frame + 1) * frameBytes));
}

/** Words of 16 bits are swapped in big endian, also where each holds two pixels of 8 bits; single bytes (OB) are not. */
const isInWords = ({ vr }: Element, { bytesPerPixel }: Layout): boolean => bytesPerPixel === 2 || vr === 'OW';

function swapped(bytes: Uint8Array): Uint8Array {
  const turned = new Uint8Array(bytes.length);
  for (let at = 0; at + 1 < bytes.length; at += 2) {
    turned[at] = bytes[at + 1] as number;
    turned[at + 1] = bytes[at] as number;
  }
  return turned;
}
