/**
 * Encapsulated pixel data: a chain of items, first an offset table, then the fragments of the compressed frames, then a delimiter.
 * A frame is one fragment or several; which ones belong together is told by their number, by the table, or by the markers with which
 * the codestreams of the JPEG family start. Source: DICOM PS3.5 annex A.4. An extended offset table (PS3.3 C.7.6.3.1.8) may only
 * stand where every frame is one fragment, so that it tells nothing more.
 */
import { joined } from './elements';
import { cut, refuse, type Refused } from './refusal';

export interface Items {
  /** Offsets of the frames from the first fragment on; empty where the file leaves them out. */
  readonly offsetTable: readonly number[];
  readonly fragments: readonly Fragment[];
  /** Where what follows the pixel data starts. */
  readonly end: number;
}

interface Fragment {
  /** Of its item from that of the first fragment. */
  readonly offset: number;
  readonly bytes: Uint8Array;
}

const itemTag = 0xe000_fffe;
const delimiterTag = 0xe0dd_fffe;
/** Tag and length of an item. */
const itemHead = 8;
/** Far more than a frame each in the longest series; empty items could be millions. */
const mostItems = 1 << 16;

/** Walks the items from `start` on, little endian as all encapsulated syntaxes are. */
export function itemsFrom(bytes: Uint8Array, start: number): Items | Refused {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const items: { at: number; bytes: Uint8Array }[] = [];
  for (let at = start; at + itemHead <= bytes.length;) {
    const tag = view.getUint32(at, true);
    const length = view.getUint32(at + 4, true);
    if (tag === delimiterTag) return tableAndFragments(items, at + itemHead);
    if (tag !== itemTag || items.length === mostItems) return damaged;
    if (length > bytes.length - at - itemHead) return cut;
    items.push({ at, bytes: bytes.subarray(at + itemHead, at + itemHead + length) });
    at += itemHead + length;
  }
  return cut;
}

const damaged = refuse('unreadable', 'The compressed pixels are not packed as DICOM says: the file is damaged. Export it again.');

function tableAndFragments(items: readonly { at: number; bytes: Uint8Array }[], end: number): Items | Refused {
  const [table, first] = items;
  if (table === undefined || table.bytes.length % 4 !== 0) return damaged;
  if (first === undefined) return refuse('no-pixels', 'The file has a place for compressed pixels, and none in it. Export it again.');
  const view = new DataView(table.bytes.buffer, table.bytes.byteOffset, table.bytes.byteLength);
  const offsetTable = Array.from({ length: table.bytes.length / 4 }, (_, frame) => view.getUint32(4 * frame, true));
  return { offsetTable, fragments: items.slice(1).map(({ at, bytes }) => ({ offset: at - first.at, bytes })), end };
}

/** The codestream of each frame. */
export function codestreamsOf({ offsetTable, fragments }: Items, nFrames: number): readonly Uint8Array[] | Refused {
  const all = fragments.map(({ bytes }) => bytes);
  if (all.length === nFrames) return all;
  if (nFrames === 1) return [joined(all)];
  const starts = startsByTable(offsetTable, fragments) ?? startsByMarker(all);
  if (starts.length !== nFrames || starts[0] !== 0) {
    return refuse('size', 'The header and the compressed pixels disagree about the number of frames. Export the file again.');
  }
  return starts.map((start, frame) => joined(all.slice(start, starts[frame + 1])));
}

/** The indices of the fragments with which frames start; none where the table is left out or does not fit the fragments. */
function startsByTable(offsetTable: readonly number[], fragments: readonly Fragment[]): number[] | undefined {
  if (offsetTable.length === 0) return undefined;
  const indexAt = new Map(fragments.map(({ offset }, index) => [offset, index]));
  const starts = offsetTable.map((offset) => indexAt.get(offset) ?? -1);
  return starts.every((start, frame) => start > (starts[frame - 1] ?? -1)) ? starts : undefined;
}

/** FFD8 starts an image of the JPEG and JPEG-LS kind, FF4F one of JPEG 2000; neither occurs inside coded data at random. */
function startsByMarker(fragments: readonly Uint8Array[]): number[] {
  const isStart = ([first, second]: Uint8Array) => first === 0xff && (second === 0xd8 || second === 0x4f);
  return fragments.flatMap((bytes, index) => (isStart(bytes) ? [index] : []));
}
