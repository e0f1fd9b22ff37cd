/** From stored bits to values. Rules: DICOM PS3.3 C.7.6.3.1, C.7.5.1.1.2 (padding), C.11.1 (rescale); PS3.5 section 8.1.1. */
import type { Attributes } from '../../../server/dicom/write';
import { madeFile, accepted, readMade, side, slope } from './made-image';

const nPixels = side * side;
const codes = (image: { warnings: readonly { code: string }[] }) => image.warnings.map(({ code }) => code);
const constant = (value: number) => new Uint16Array(nPixels).fill(value);

test('values are the stored numbers, row by row', () => {
  expect(readMade({}).values).toEqual(Float32Array.from(slope));
});

test('implicit VR gives the same values as explicit', () => {
  expect(accepted(madeFile({ vrEncoding: 'implicit' })).values).toEqual(Float32Array.from(slope));
});

test.each<[string, number, Attributes, number]>([
  ['12 bits, unsigned: what stands above them is masked away', 0xf123, { bitsStored: 12, highBit: 11 }, 0x123],
  ['12 bits, signed: bit 11 is the sign', 0x0fff, { bitsStored: 12, highBit: 11, pixelRepresentation: 1 }, -1],
  ['12 bits, signed and positive', 0x07ff, { bitsStored: 12, highBit: 11, pixelRepresentation: 1 }, 0x7ff],
  ['12 bits that end at bit 15 are shifted down', 0x1230, { bitsStored: 12, highBit: 15 }, 0x123],
  ['16 bits, unsigned', 0xffff, {}, 65535],
  ['16 bits, signed', 0xffff, { pixelRepresentation: 1 }, -1],
  ['slope and intercept', 100, { rescaleSlope: 0.5, rescaleIntercept: -8 }, 42],
])('%s', (_, stored, attributes, value) => {
  expect(readMade(attributes, { pixels: constant(stored) }).values[7]).toBe(value);
});

test('8 bits allocated: one byte a pixel, an odd number of them padded', () => {
  const rows = 9;
  const bytes = Uint8Array.from({ length: rows * rows }, (_, index) => index * 3);
  const attributes = { bitsAllocated: 8, bitsStored: 8, highBit: 7, rows, columns: rows };
  const image = readMade(attributes, { extra: [{ tag: '7FE0,0010', vr: 'OB', value: bytes }] });
  expect(image.values).toEqual(Float32Array.from(bytes));
});

describe('padding', () => {
  test('pixels that hold the padding value become zero, and are counted in a warning', () => {
    const pixels = slope.map((value, index) => (index < 20 ? 63536 : value));
    const image = readMade({ pixelPaddingValue: -2000, rescaleIntercept: 10 }, { pixels });
    expect([...image.values.slice(18, 22)]).toEqual([0, 0, 31, 32]);
    expect(image.warnings.find(({ code }) => code === 'padding')?.text).toContain('20 pixels');
  });

  test('the padding value of signed pixels is signed', () => {
    const pixels = Int16Array.from(slope, (value, index) => (index === 0 ? -2000 : value));
    const image = readMade({ pixelPaddingValue: -2000 }, { pixels });
    expect(image.values[0]).toBe(0);
    expect(codes(image)).not.toContain('negative-values');
  });

  test('padding does not count in the range', () => {
    const pixels = slope.map((value, index) => (index < 128 ? 60_000 : 1000 + value));
    // Without it the lowest value is that of pixel 128: 1000 + 129.
    expect(readMade({ pixelPaddingValue: 60_000 - 65_536 }, { pixels }).range[0]).toBeGreaterThanOrEqual(1129);
  });

  test('a padding value of zero changes nothing and is not worth a word', () => {
    expect(codes(readMade({ pixelPaddingValue: 0 }))).toEqual(codes(readMade({})));
  });
});

describe('range', () => {
  test('reaches from the 1st to the 99.8th percentile', () => {
    const pixels = Uint16Array.from({ length: 1000 }, (_, index) => index);
    const image = readMade({ rows: 25, columns: 40 }, { pixels });
    // Sorted values are 0 … 999: more than 1 % of them lie at or below 10, more than 99.8 % at or below 998.
    expect(image.range).toEqual([10, 998]);
  });

  test('is in rescaled values', () => {
    const pixels = Uint16Array.from({ length: 1000 }, (_, index) => index);
    expect(readMade({ rows: 25, columns: 40, rescaleSlope: 2, rescaleIntercept: -1 }, { pixels }).range).toEqual([19, 1995]);
  });

  test('of equal pixels is still a window', () => {
    expect(readMade({}, { pixels: constant(5) }).range).toEqual([5, 6]);
  });
});

describe('warnings of the pixels', () => {
  test('negative values', () => {
    expect(codes(readMade({}, { pixels: Int16Array.from(slope, (value) => value - 3) }))).toContain('negative-values');
  });

  test.each<[string, Attributes]>([
    ['zero', { rescaleSlope: 0 }],
    ['negative', { rescaleSlope: -1 }],
    ['no number', { rescaleSlope: 'abc' }],
    ['beyond float32', { rescaleSlope: '1e39' }],
    ['fine beside an intercept that is no number', { rescaleSlope: 2, rescaleIntercept: 'abc' }],
  ])('a slope that is %s is left out, with a warning', (_, attributes) => {
    const image = readMade(attributes);
    expect(image.values).toEqual(Float32Array.from(slope));
    expect(codes(image)).toContain('rescale-ignored');
  });

  test.each([
    [26, true],
    [25, false],
  ])('%i zeros of 256: air blanked is %s (the limit is a tenth)', (nZeros, warned) => {
    const pixels = slope.map((value, index) => (index < nZeros ? 0 : value));
    expect(codes(readMade({}, { pixels })).includes('air-blanked')).toBe(warned);
  });
});
