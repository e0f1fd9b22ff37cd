/** Lossless JPEG against an encoder written from the standard: ITU-T T.81 annex H. Files of a real encoder: compressed-files.test.ts. */
import { decodeJpegLossless } from '../../../server/dicom/codecs/jpeg-lossless';
import type { Layout } from '../../../server/dicom/pixels';
import { losslessJpeg, type LosslessJpeg } from './made-lossless-jpeg';

const rows = 11;
const columns = 9;
const layoutOf = (bitsStored: number, signed = false): Layout => ({
  rows,
  columns,
  bytesPerPixel: bitsStored <= 8 ? 1 : 2,
  bitsStored,
  shift: 0,
  signed,
});
/** Values over the whole range of bits, so that differences of every category occur. */
const valuesOf = (bits: number) =>
  Uint16Array.from({ length: rows * columns }, (_, index) => (index * index * 40_503 + (index % 5) * 3) & (2 ** bits - 1));
const decoded = (pixels: Uint16Array, options: Omit<LosslessJpeg, 'columns'>, layout: Layout) =>
  decodeJpegLossless(losslessJpeg(pixels, { columns, ...options }), layout);
const bytesOf = (pixels: Uint16Array) => new Uint8Array(pixels.slice().buffer);

describe.each([1, 2, 3, 4, 5, 6, 7])('predictor %i', (selection) => {
  test('16 bits, in which differences wrap around', () => {
    const pixels = valuesOf(16);
    expect(decoded(pixels, { precision: 16, selection }, layoutOf(16, true))).toEqual(bytesOf(pixels));
  });

  test('8 bits, one byte a pixel', () => {
    const pixels = valuesOf(8);
    expect(decoded(pixels, { precision: 8, selection }, layoutOf(8))).toEqual(Uint8Array.from(pixels));
  });

  test('restarts every second row start the prediction anew', () => {
    const pixels = valuesOf(12);
    expect(decoded(pixels, { precision: 12, selection, rowsOfInterval: 2 }, layoutOf(12))).toEqual(bytesOf(pixels));
  });

  test('a point transform leaves out the lowest bits', () => {
    const pixels = valuesOf(12);
    const coarse = pixels.map((value) => value & ~3);
    expect(decoded(pixels, { precision: 12, selection, pointTransform: 2 }, layoutOf(12))).toEqual(bytesOf(coarse));
  });
});

test('8 coded bits in pixels of 16 are widened', () => {
  const pixels = valuesOf(8);
  expect(decoded(pixels, { precision: 8 }, { ...layoutOf(12), bytesPerPixel: 2 })).toEqual(bytesOf(pixels));
});

test.each<[string, Omit<LosslessJpeg, 'columns'>, Layout, string]>([
  ['fewer rows than the header says', { precision: 16, rows: rows - 1 }, layoutOf(16), 'size'],
  ['65535 rows', { precision: 16, rows: 65_535 }, layoutOf(16), 'size'],
  ['more bits than a pixel has', { precision: 16 }, layoutOf(8), 'bit-depth'],
  ['fewer bits than signed pixels have', { precision: 12 }, layoutOf(16, true), 'bit-depth'],
  ['12 bits of pixels that do not start at the lowest bit', { precision: 12 }, { ...layoutOf(12), shift: 4 }, 'bit-depth'],
  ['a predictor that there is not', { precision: 16, selection: 8 }, layoutOf(16), 'unreadable'],
  ['values beyond the bits that are announced', { precision: 12 }, layoutOf(12), 'unreadable'],
])('%s: refused', (_, options, layout, code) => {
  expect(decoded(valuesOf(16), options, layout)).toMatchObject({ refused: { code } });
});

test('cut anywhere, also with an end marker behind the cut, it is refused', () => {
  const whole = losslessJpeg(valuesOf(16), { columns, precision: 16, selection: 4 });
  for (let length = 2; length < whole.length - 2; length++) {
    const cut = whole.slice(0, length);
    expect(decodeJpegLossless(cut, layoutOf(16))).toHaveProperty('refused');
    expect(decodeJpegLossless(Uint8Array.from([...cut, 0xff, 0xd9]), layoutOf(16))).toHaveProperty('refused');
  }
});
