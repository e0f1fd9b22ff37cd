/**
 * The header of a JPEG 2000 codestream, high-throughput ones included, and the chain of its tile-parts, which must reach the end marker
 * and hold every tile: a decoder draws what there is, and leaves the rest black. Source: ITU-T T.800 annex A.
 */
import { isRefused, type Refused } from '../refusal';
import { cutCodestream, damagedCodestream, otherCodestream, type Coded } from './codestream';

const startOfCodestream = 0xff4f;
const imageAndTileSize = 0xff51;
const startOfTilePart = 0xff90;
const endOfCodestream = 0xffd9;
/** Each takes a decoder time and memory, however small the image; scanners write one, archives a few. */
const mostTiles = 256;

interface Size extends Omit<Coded, 'length'> {
  readonly nTiles: number;
}

interface TileParts {
  readonly tiles: ReadonlySet<number>;
  readonly length: number;
}

export function jpeg2000HeaderOf(codestream: Uint8Array): Coded | Refused {
  const view = new DataView(codestream.buffer, codestream.byteOffset, codestream.byteLength);
  if (view.byteLength < 4) return cutCodestream;
  if (view.getUint16(0) !== startOfCodestream || view.getUint16(2) !== imageAndTileSize) return otherCodestream;
  const size = sizeOf(view);
  if (isRefused(size)) return size;
  const parts = tilePartsOf(view);
  if (isRefused(parts)) return parts;
  return parts.tiles.size === size.nTiles ? { ...size, length: parts.length } : cutCodestream;
}

/** The segment SIZ, at byte 2. Only components without subsampling are taken. */
function sizeOf(view: DataView): Size | Refused {
  const firstComponent = 42;
  if (view.byteLength < firstComponent + 3) return cutCodestream;
  const long = (at: number) => view.getUint32(at);
  const depth = view.getUint8(firstComponent);
  const tilesAlong = (end: number, tile: number, start: number) => Math.ceil((end - start) / tile);
  const nTiles = tilesAlong(long(8), long(24), long(32)) * tilesAlong(long(12), long(28), long(36));
  if (view.getUint8(firstComponent + 1) !== 1 || view.getUint8(firstComponent + 2) !== 1) return damagedCodestream;
  if (!(nTiles >= 1 && nTiles <= mostTiles)) return damagedCodestream;
  return {
    columns: long(8) - long(16),
    rows: long(12) - long(20),
    components: view.getUint16(40),
    precision: (depth & 0x7f) + 1,
    signed: depth > 0x7f,
    nTiles,
  };
}

/** The numbers of the tiles that occur, once every tile-part is found to be whole. */
function tilePartsOf(view: DataView): TileParts | Refused {
  const tiles = new Set<number>();
  let at = 2;
  while (at + 2 <= view.byteLength) {
    const marker = view.getUint16(at);
    if (marker === endOfCodestream) return { tiles, length: at + 2 };
    if (at + 12 > view.byteLength) return cutCodestream;
    if (marker === startOfTilePart) {
      tiles.add(view.getUint16(at + 4));
      const length = view.getUint32(at + 6);
      // The last part may leave its length open: it reaches to the end.
      if (length === 0) return openEnded(view, tiles);
      if (length < 14) return damagedCodestream;
      at += length;
    } else {
      if (tiles.size > 0 || marker < 0xff00) return damagedCodestream;
      at += 2 + view.getUint16(at + 2);
    }
  }
  return cutCodestream;
}

/** Behind the end marker only zeros may stand here, which pad a fragment to an even length. */
function openEnded(view: DataView, tiles: ReadonlySet<number>): TileParts | Refused {
  let end = view.byteLength;
  while (end > 0 && view.getUint8(end - 1) === 0) end--;
  return end >= 2 && view.getUint16(end - 2) === endOfCodestream ? { tiles, length: end } : cutCodestream;
}
