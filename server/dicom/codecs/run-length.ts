/**
 * RLE: the bytes of a frame in one segment each, the most significant first, every segment packed by runs (as PackBits does).
 * Source: DICOM PS3.5 annex G.
 */
import type { Layout } from '../pixels';
import { isRefused, refuse, type Refused } from '../refusal';
import { cutCodestream, damagedCodestream } from './codestream';

/** The number of segments and 15 places for their offsets, in 32 bits each. */
const headerBytes = 64;

export function decodeRunLength(codestream: Uint8Array, { rows, columns, bytesPerPixel }: Layout): Uint8Array | Refused {
  if (codestream.length < headerBytes) return cutCodestream;
  const view = new DataView(codestream.buffer, codestream.byteOffset, codestream.byteLength);
  const nSegments = view.getUint32(0, true);
  if (nSegments !== bytesPerPixel) {
    return refuse('bit-depth', 'The header and the compressed pixels disagree about the bytes of a pixel. Export the image again.');
  }
  const starts = Array.from({ length: nSegments }, (_, segment) => view.getUint32(4 * (segment + 1), true));
  const ends = [...starts.slice(1), codestream.length];
  const frame = new Uint8Array(rows * columns * bytesPerPixel);
  for (const [segment, start] of starts.entries()) {
    const end = ends[segment] ?? start;
    if (start < headerBytes || end < start) return damagedCodestream;
    if (end > codestream.length) return cutCodestream;
    // Little endian: the most significant byte, which comes first, stands last.
    const unpacked = unpack(codestream.subarray(start, end), frame, { from: bytesPerPixel - 1 - segment, step: bytesPerPixel });
    if (isRefused(unpacked)) return unpacked;
  }
  return frame;
}

/** Every `step`-th byte of `target` from `from` on, filled from the runs of a segment: n < 128 is followed by n + 1 bytes as they are,
 *  n > 128 by one byte to repeat 257 − n times, 128 by nothing. What a last run has too much is left. */
function unpack(segment: Uint8Array, target: Uint8Array, { from, step }: { from: number; step: number }): Uint8Array | Refused {
  let read = 0;
  let write = from;
  while (write < target.length) {
    const control = segment[read++];
    if (control === undefined) return cutCodestream;
    if (control === 128) continue;
    const repeats = control > 128;
    const length = repeats ? 257 - control : control + 1;
    if (read + (repeats ? 1 : length) > segment.length) return cutCodestream;
    for (let i = 0; i < length && write < target.length; i++, write += step) target[write] = segment[repeats ? read : read + i] as number;
    read += repeats ? 1 : length;
  }
  return target;
}
