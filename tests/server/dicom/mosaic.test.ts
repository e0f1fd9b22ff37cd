/**
 * Mosaics: tiles of one picture become the slices of one volume. Grid and place of the slices as in the public description of the format by the
 * documentation of NiBabel (DICOM mosaic); the corner that the header gives is that of a picture as large as the mosaic around the centre.
 */
import type { ElementToWrite } from '../../../server/dicom/elements';
import type { Attributes } from '../../../server/dicom/write';
import { accepted, madeFile, refused } from './made-image';

const tile = 16;
/** A mosaic of `across` × `across` tiles, in which every pixel of tile t is 10 · t + 1, and the tiles from `slices` on are empty. */
function mosaicPixels(across: number, slices: number): Uint16Array {
  const side = across * tile;
  return Uint16Array.from({ length: side * side }, (_, i) => {
    const index = Math.floor(i / side / tile) * across + Math.floor((i % side) / tile);
    return index < slices ? 10 * index + 1 : 0;
  });
}

const geometry: Attributes = {
  imageType: ['ORIGINAL', 'PRIMARY', 'M', 'ND', 'MOSAIC'],
  pixelSpacing: [2, 3],
  sliceSpacing: 4,
  imageOrientation: [1, 0, 0, 0, 1, 0],
  imagePosition: [-100, -200, 50],
};
const counted = (siemensTileCount: number): Attributes => ({ siemensCreator: 'SIEMENS MR HEADER', siemensTileCount });

const mosaicFile = (across: number, slices: number, attributes: Attributes, extra: readonly ElementToWrite[] = []) =>
  madeFile({
    rows: across * tile,
    columns: across * tile,
    pixels: mosaicPixels(across, slices),
    attributes: { ...geometry, ...attributes },
    extra,
  });

test.each([
  [4, 2],
  [5, 3],
  [9, 3],
  [10, 4],
])('%i slices are cut from a grid of %i tiles a side, in the order of rows', (slices, across) => {
  const image = accepted(mosaicFile(across, slices, counted(slices)));
  expect([image.frames, image.rows, image.columns]).toEqual([slices, tile, tile]);
  const firsts = Array.from({ length: slices }, (_, slice) => image.values[slice * tile * tile]);
  expect(firsts).toEqual(Array.from({ length: slices }, (_, slice) => 10 * slice + 1));
});

test('empty tiles are no slices and do not count as blanked air', () => {
  const image = accepted(mosaicFile(4, 10, counted(10)));
  expect(image.warnings.map(({ code }) => code)).not.toContain('air-blanked');
  expect(image.range[0]).toBeGreaterThan(0);
});

test('each slice lies half of what the mosaic is larger than a tile from its corner, then along the normal', () => {
  const { frameFacts, facts } = accepted(mosaicFile(2, 3, counted(3)));
  // x: −100 + 3 mm · (32 − 16)/2; y: −200 + 2 mm · (32 − 16)/2.
  expect(frameFacts.map(({ positionMm }) => positionMm)).toEqual([
    [-76, -184, 50],
    [-76, -184, 54],
    [-76, -184, 58],
  ]);
  expect(facts.imagePositionMm).toMatchObject({ value: [-76, -184, 50], origin: 'worked-out' });
});

/** The maker's private header with one entry: SV10, …, the number of entries, a mark; then the entry and its items. */
function privateHeader(name: string, values: readonly string[]): Uint8Array {
  const bytes = new Uint8Array(16 + 84 + values.length * (16 + 16));
  const view = new DataView(bytes.buffer);
  const write = (at: number, text: string) => bytes.set(new TextEncoder().encode(text), at);
  write(0, 'SV10');
  view.setUint32(8, 1, true);
  view.setUint32(12, 77, true);
  write(16, name);
  view.setUint32(16 + 64 + 12, values.length, true);
  values.forEach((value, i) => {
    view.setUint32(100 + 32 * i + 4, 13, true);
    write(100 + 32 * i + 16, value);
  });
  return bytes;
}

describe('the maker’s own normal', () => {
  const withHeader = (bytes: Uint8Array) =>
    accepted(
      mosaicFile(2, 3, { ...counted(3), siemensSeriesCreator: 'SIEMENS CSA HEADER' }, [{ tag: '0029,1010', vr: 'OB', value: bytes }]),
    ).frameFacts.map(({ positionMm }) => positionMm?.[2]);
  const down = privateHeader('SliceNormalVector', ['0.00000000', '0.00000000', '-1.00000000']);

  test('turns the order of the slices where it points the other way', () => expect(withHeader(down)).toEqual([50, 46, 42]));
  test('that does not stand on the plane is not used', () => {
    expect(withHeader(privateHeader('SliceNormalVector', ['1', '0', '0']))).toEqual([50, 54, 58]);
  });
  test('cut anywhere, or with a length beyond its end, is as if it were not there', () => {
    for (let length = 0; length < down.length - 16; length += 7)
      expect(withHeader(down.slice(0, length + (length % 2)))).toEqual([50, 54, 58]);
    const long = down.slice();
    new DataView(long.buffer).setUint32(104, 0xffff_ffff, true);
    expect(withHeader(long)).toEqual([50, 54, 58]);
  });
});

describe('where the count is gone', () => {
  test('the acquired readout tells how large a tile is, and empty tiles at the end are left out', () => {
    const image = accepted(mosaicFile(3, 7, { acquisitionMatrix: [tile, 0, 0, tile] }));
    expect([image.frames, image.rows]).toEqual([7, tile]);
  });
  test('and the matrix as well, the file is refused', () => expect(refused(mosaicFile(3, 7, {})).code).toBe('mosaic'));
  test('a count whose grid does not fit the picture is refused', () => expect(refused(mosaicFile(3, 7, counted(20))).code).toBe('mosaic'));
  test('a place of the slices is not made up', () => {
    const { frameFacts, facts } = accepted(
      madeFile({ rows: 32, columns: 32, pixels: mosaicPixels(2, 3), attributes: { imageType: geometry.imageType ?? '', ...counted(3) } }),
    );
    expect(frameFacts.map(({ positionMm }) => positionMm)).toEqual([null, null, null]);
    expect(facts.imagePositionMm.origin).toBe('doubtful');
  });
});
