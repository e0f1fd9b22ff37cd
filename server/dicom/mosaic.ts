/**
 * A mosaic holds the slices of one volume as tiles of one picture, row by row, in a square grid: ceil(√n) tiles a side. Its transform means
 * nothing, so it is cut into its slices. The position in the header is that of the corner of a picture as large as the mosaic around the centre
 * of a slice; from it, the pixel size and the normal of the slices the position of each is worked out.
 * Sources: seen in files of one maker (Siemens), and the public description of the format in the documentation of NiBabel (DICOM mosaic).
 */
import type { ScanFacts } from '../contract/facts';
import { doubtful, workedOut } from './facts/fact';
import { acquisitionMatrix } from './facts/phase-encode';
import type { Header } from './header';
import type { Layout } from './pixels';
import { refuse, type Refused } from './refusal';
import { numbersOfPrivateHeader } from './siemens-header';

export interface Mosaic {
  /** Of one slice. */
  readonly tile: Layout;
  readonly tilesAcross: number;
  /** None where the header does not say: then empty tiles at the end are no slices. */
  readonly slices: number | undefined;
}

export const isMosaic = (header: Header): boolean => header.texts('imageType').includes('MOSAIC');

export function mosaicOf(header: Header, layout: Layout): Mosaic | Refused {
  const slices = header.text('siemensCreator') === 'SIEMENS MR HEADER' ? header.number('siemensTileCount') : undefined;
  const counted = slices !== undefined && slices >= 1;
  const tilesAcross = counted ? Math.ceil(Math.sqrt(slices)) : tilesByMatrix(header, layout);
  const rows = layout.rows / (tilesAcross ?? NaN);
  const columns = layout.columns / (tilesAcross ?? NaN);
  if (tilesAcross === undefined || !isSide(rows) || !isSide(columns)) {
    return refuse(
      'mosaic',
      'This is a mosaic, and the header does not say into how many slices it is to be cut. Export the slices one by one.',
    );
  }
  return { tile: { ...layout, rows, columns }, tilesAcross, slices: counted ? slices : undefined };
}

/** Tiles smaller than this are no slices: the smallest matrix of an echo planar scan is 32 (common practice). */
const smallestTile = 16;
const isSide = (side: number): boolean => Number.isInteger(side) && side >= smallestTile;

/** Where the count is gone, a tile is as long as the acquired readout, or twice as long where it was interpolated. */
function tilesByMatrix(header: Header, { rows, columns }: Layout): number | undefined {
  const readout = acquisitionMatrix(header)?.readout;
  if (readout === undefined) return undefined;
  return [readout, 2 * readout].map((side) => Math.max(rows, columns) / side).find((tiles) => Number.isInteger(tiles) && tiles > 1);
}

/** The slices as frames of their own. */
export function cutMosaic(bytes: Uint8Array, { tile, tilesAcross, slices }: Mosaic): Uint8Array[] {
  const rowBytes = tile.columns * tile.bytesPerPixel;
  const tiles = Array.from({ length: slices ?? tilesAcross * tilesAcross }, (_, index) => {
    const cut = new Uint8Array(tile.rows * rowBytes);
    const left = (index % tilesAcross) * rowBytes;
    const top = Math.floor(index / tilesAcross) * tile.rows;
    for (let row = 0; row < tile.rows; row++) {
      const from = (top + row) * rowBytes * tilesAcross + left;
      cut.set(bytes.subarray(from, from + rowBytes), row * rowBytes);
    }
    return cut;
  });
  if (slices !== undefined) return tiles;
  const last = tiles.findLastIndex((cut) => cut.some((byte) => byte !== 0));
  return tiles.slice(0, Math.max(1, last + 1));
}

type Place = [number, number, number];
const along = (from: readonly number[], direction: readonly number[], distance: number): Place => {
  const [x = 0, y = 0, z = 0] = from.map((value, axis) => value + distance * (direction[axis] ?? 0));
  return [x, y, z];
};

/** Where each slice lies, as far as the header gives what it takes. */
export function slicePositions(header: Header, facts: ScanFacts, { tile, tilesAcross }: Mosaic, slices: number): readonly (Place | null)[] {
  const corner = facts.imagePositionMm.value;
  const orientation = facts.imageOrientation.value;
  const spacing = facts.pixelSpacingMm.value;
  const distance = facts.sliceSpacingMm.value ?? facts.sliceThicknessMm.value;
  if (corner === null || orientation === null || spacing === null || distance === null) return Array.from({ length: slices }, () => null);
  const tileAway = (side: number): number => ((tilesAcross - 1) * side) / 2;
  const across = along(corner, orientation.slice(0, 3), tileAway(tile.columns) * spacing[1]);
  const first = along(across, orientation.slice(3), tileAway(tile.rows) * spacing[0]);
  const normal = normalOf(header, orientation);
  return Array.from({ length: slices }, (_, slice) => along(first, normal, slice * distance));
}

/** Facts of a mosaic as those of its first slice. */
export function factsOfSlice(facts: ScanFacts, first: Place | null | undefined): ScanFacts {
  const imagePositionMm = first
    ? workedOut<Place>(first, 'The file is a mosaic: this is the position of its first slice, worked out.')
    : doubtful<Place>(null, 'The file is a mosaic, and the header does not give what it takes to place its slices.');
  return { ...facts, imagePositionMm };
}

/** The maker's own normal, which knows in which order the slices lie; else that of the plane. */
function normalOf(header: Header, orientation: readonly number[]): readonly number[] {
  const [ax = 0, ay = 0, az = 0, bx = 0, by = 0, bz = 0] = orientation;
  const cross = [ay * bz - az * by, az * bx - ax * bz, ax * by - ay * bx];
  const written = header.text('siemensSeriesCreator') === 'SIEMENS CSA HEADER' ? header.bytes('siemensImageHeader') : undefined;
  const normal = written === undefined ? [] : numbersOfPrivateHeader(written, 'SliceNormalVector');
  const alignment = normal.reduce((sum, value, axis) => sum + value * (cross[axis] ?? 0), 0);
  // Only its direction is taken: a vector that does not stand on the plane is something else.
  return normal.length === 3 && alignment < -0.99 ? cross.map((value) => -value) : cross;
}
