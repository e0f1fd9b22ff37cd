/**
 * The marker segments of a codestream of the JPEG and JPEG-LS kind, up to its first scan, and its end. Decoders look at these too, but
 * take much for granted: that a stream is whole, and that its sizes are those of the image.
 * Sources: ITU-T T.81 annex B (JPEG), T.87 annex C (JPEG-LS).
 */
import { isRefused, type Refused } from '../refusal';
import { cutCodestream, damagedCodestream, otherCodestream, type Coded } from './codestream';

export interface JpegHeader extends Coded {
  /** The marker of the frame header, which names the process. */
  readonly process: number;
  /** Segments before the first scan, in their order; `body` is what follows marker and length. */
  readonly segments: readonly Segment[];
  readonly scan: Uint8Array;
  /** What is coded, from the first byte behind the header of the scan to the end marker, which is left out. */
  readonly coded: Uint8Array;
}

interface Segment {
  readonly marker: number;
  readonly body: Uint8Array;
}

export const markers = {
  startOfImage: 0xd8,
  endOfImage: 0xd9,
  startOfScan: 0xda,
  huffmanTables: 0xc4,
  restartInterval: 0xdd,
  baseline: 0xc0,
  extended: 0xc1,
  lossless: 0xc3,
  jpegLs: 0xf7,
} as const;

/** Frame headers: SOF0 to SOF15 without tables of codes (C4), extensions (C8) and arithmetic conditioning (CC), and that of JPEG-LS. */
const isFrame = (marker: number): boolean =>
  (marker >= 0xc0 && marker <= 0xcf && marker !== 0xc4 && marker !== 0xc8 && marker !== 0xcc) || marker === markers.jpegLs;

/** A whole codestream of one of these processes. */
export function jpegHeaderOf(codestream: Uint8Array, processes: readonly number[]): JpegHeader | Refused {
  if (codestream[0] !== 0xff || codestream[1] !== markers.startOfImage) return otherCodestream;
  const walked = segmentsOf(codestream);
  if (isRefused(walked)) return walked;
  const { segments, start } = walked;
  const end = endFrom(codestream, start);
  if (end === undefined) return cutCodestream;
  const frame = segments.find(({ marker }) => isFrame(marker));
  const scan = segments.at(-1);
  if (frame === undefined || scan === undefined || frame.body.length < 6) return damagedCodestream;
  if (!processes.includes(frame.marker)) return otherCodestream;
  const view = new DataView(frame.body.buffer, frame.body.byteOffset, frame.body.length);
  return {
    process: frame.marker,
    precision: view.getUint8(0),
    rows: view.getUint16(1),
    columns: view.getUint16(3),
    components: view.getUint8(5),
    segments: segments.slice(0, -1),
    length: end + 2,
    scan: scan.body,
    coded: codestream.subarray(start, end),
  };
}

/** Where the end marker starts: what is coded never looks like it. */
function endFrom(codestream: Uint8Array, start: number): number | undefined {
  for (let at = codestream.indexOf(0xff, start); at !== -1; at = codestream.indexOf(0xff, at + 1)) {
    if (codestream[at + 1] === markers.endOfImage) return at;
  }
  return undefined;
}

/** The segments from the first to the header of the first scan, which is the last of them. */
function segmentsOf(bytes: Uint8Array): { segments: Segment[]; start: number } | Refused {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const segments: Segment[] = [];
  for (let at = 2; at + 4 <= bytes.length;) {
    if (bytes[at] !== 0xff) return damagedCodestream;
    const marker = view.getUint8(at + 1);
    // Any number of bytes FF may fill the place before a marker.
    if (marker === 0xff) {
      at++;
      continue;
    }
    const length = view.getUint16(at + 2);
    if (length < 2) return damagedCodestream;
    if (at + 2 + length > bytes.length) return cutCodestream;
    segments.push({ marker, body: bytes.subarray(at + 4, at + 2 + length) });
    at += 2 + length;
    if (marker === markers.startOfScan) return { segments, start: at };
  }
  return cutCodestream;
}
