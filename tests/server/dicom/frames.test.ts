/** Several frames in a classic file, and images stored inverted. Sources: DICOM PS3.3 C.7.6.5 (Cine), C.7.6.6 (Multi-frame), C.7.6.3.1.2. */
import type { Attributes } from '../../../server/dicom/write';
import { madeFile, accepted, readMade, side } from './made-image';
import { rampedFrames } from './made-enhanced';

const nPixels = side * side;
const codes = (image: { warnings: readonly { code: string }[] }) => image.warnings.map(({ code }) => code);
const cine = (attributes: Attributes) => accepted(madeFile({ pixels: rampedFrames(4), attributes: { numberOfFrames: 4, ...attributes } }));

describe('several frames in a classic file', () => {
  test('are frames of one image, as stored', () => {
    const image = cine({ imagePosition: [1, 2, 3] });
    expect([image.frames, image.rows, image.columns]).toEqual([4, side, side]);
    expect([0, 1, 2, 3].map((frame) => image.values[frame * nPixels])).toEqual([1, 1001, 2001, 3001]);
    expect(image.frameFacts.map(({ positionMm }) => positionMm)).toEqual(Array(4).fill([1, 2, 3]));
  });

  test.each<[string, Attributes, (number | null)[]]>([
    ['a frame time', { frameTime: 40 }, [0, 40, 80, 120]],
    ['a frame time after the trigger', { frameTime: 40, triggerTime: 15 }, [15, 55, 95, 135]],
    ['steps of their own', { frameTimeVector: [0, 30, 50, 40] }, [0, 30, 80, 120]],
    ['steps that are fewer than the frames', { frameTimeVector: [0, 30] }, [0, 30, null, null]],
    ['silence', {}, [null, null, null, null]],
  ])('have delays by %s', (_, attributes, delays) => {
    expect(cine(attributes).frameFacts.map(({ triggerDelayMs }) => triggerDelayMs)).toEqual(delays);
  });

  test('of an odd number of bytes lie one after the other without a gap', () => {
    const rows = 9;
    const bytes = Uint8Array.from({ length: 3 * rows * rows }, (_, i) => (i * 7) % 251);
    const attributes = { bitsAllocated: 8, bitsStored: 8, highBit: 7, rows, columns: rows, numberOfFrames: 3 };
    const image = readMade(attributes, { extra: [{ tag: '7FE0,0010', vr: 'OB', value: bytes }] });
    expect(image.values).toEqual(Float32Array.from(bytes));
  });

  test('count together in the range and in the zeros', () => {
    const pixels = rampedFrames(2).map((value, i) => (i >= nPixels ? 0 : value));
    const image = accepted(madeFile({ pixels, attributes: { numberOfFrames: 2 } }));
    // 99.8 % of 512 values are 510.98: the 511th is 255.
    expect(image.range).toEqual([0, 255]);
    expect(image.warnings.find(({ code }) => code === 'air-blanked')?.text).toContain('50 %');
  });
});

describe('an image stored inverted (MONOCHROME1)', () => {
  const inverted = { photometricInterpretation: 'MONOCHROME1' };

  test('is turned about the largest value that is stored, and a warning says so', () => {
    const image = readMade(inverted);
    expect([image.values[0], image.values[255]]).toEqual([255, 0]);
    expect(codes(image)).toContain('inverted');
    expect(codes(readMade({}))).not.toContain('inverted');
  });

  test('keeps its slope; where the intercept would put zero does not count', () => {
    const image = readMade({ ...inverted, rescaleSlope: 2, rescaleIntercept: -50 });
    expect([image.values[0], image.values[255]]).toEqual([510, 0]);
  });

  test('has one largest value for all its frames, padding left out', () => {
    const pixels = rampedFrames(2).map((value, i) => (i === 5 ? 60_000 : value));
    const image = accepted(madeFile({ pixels, attributes: { ...inverted, numberOfFrames: 2, pixelPaddingValue: 60_000 - 65_536 } }));
    expect([image.values[0], image.values[5], image.values[2 * nPixels - 1]]).toEqual([1255, 0, 0]);
  });

  test('of signed pixels is turned likewise', () => {
    const image = readMade(inverted, { pixels: Int16Array.from({ length: nPixels }, (_, i) => i - 128) });
    expect([image.values[0], image.values[255]]).toEqual([255, 0]);
    expect(codes(image)).not.toContain('negative-values');
  });
});
