/**
 * Which part of the complex signal an image shows, and in what a phase counts. Attributes: DICOM PS3.3 C.8.13.3.1.1 (Complex Image Component);
 * what makers write into Image Type, and the units of phase, are common practice.
 */
import type { Attributes } from '../../../server/dicom/write';
import { readMade, side } from './made-image';

const codes = (image: { warnings: readonly { code: string }[] }) => image.warnings.map(({ code }) => code);

test.each<[string, string, Attributes]>([
  ['magnitude', 'silence', {}],
  ['magnitude', 'its component', { complexImageComponent: 'MAGNITUDE' }],
  ['magnitude', 'the third value of its type', { imageType: ['ORIGINAL', 'PRIMARY', 'M', 'ND'] }],
  ['magnitude', 'a private number', { geParametersCreator: 'GEMS_PARM_01', geImageKind: 0 }],
  ['magnitude', 'a private number of another maker', { geParametersCreator: 'OTHER', geImageKind: 1 }],
  ['phase', 'its component', { complexImageComponent: 'PHASE' }],
  ['phase', 'the third value of its type', { imageType: ['ORIGINAL', 'PRIMARY', 'P', 'ND'] }],
  ['phase', 'a phase map by name', { imageType: ['ORIGINAL', 'PRIMARY', 'PHASE MAP', 'P', 'FFE'] }],
  ['real', 'the third value of its type', { imageType: ['ORIGINAL', 'PRIMARY', 'R'] }],
  ['real', 'a private number', { geParametersCreator: 'GEMS_PARM_01', geImageKind: 2 }],
  ['imaginary', 'its component', { complexImageComponent: 'IMAGINARY' }],
])('%s: known by %s', (component, _, attributes) => {
  const image = readMade(attributes);
  expect([image.component, image.use]).toEqual([component, 'measured']);
  expect(codes(image).includes('one-component')).toBe(component !== 'magnitude');
  expect(codes(image).includes('magnitude-only')).toBe(component === 'magnitude');
});

test('what is negative is no fault of a real part, and zeros of a phase are no blanked air', () => {
  const pixels = new Int16Array(side * side).map((_, i) => (i < 100 ? 0 : i - 150));
  expect(codes(readMade({ complexImageComponent: 'REAL' }, { pixels }))).not.toContain('negative-values');
  expect(codes(readMade({ complexImageComponent: 'PHASE' }, { pixels }))).not.toContain('air-blanked');
  expect(codes(readMade({}, { pixels }))).toEqual(expect.arrayContaining(['negative-values', 'air-blanked']));
});

describe('a phase is in radians', () => {
  const phase: Attributes = { complexImageComponent: 'PHASE', bitsStored: 12, highBit: 11 };
  const stored = [0, 1024, 2048, 4095];
  const pixels = new Uint16Array(side * side).map((_, i) => stored[i % 4] ?? 0);
  const quarters = [-Math.PI, -Math.PI / 2, 0, Math.PI];

  test.each<[string, Attributes]>([
    ['in 4096ths of half a turn', { rescaleSlope: 2, rescaleIntercept: -4096 }],
    ['in milliradians', { rescaleSlope: 1.53435, rescaleIntercept: -3142 }],
    ['in radians', { rescaleSlope: 0.00153436, rescaleIntercept: -3.14159 }],
    ['by the name of the unit', { rescaleSlope: 0.00153436, rescaleIntercept: -3.14159, rescaleType: '[rad]' }],
    ['by the name of a thousandth', { rescaleSlope: 1.53435, rescaleIntercept: -3142, rescaleType: 'mrad' }],
  ])('%s', (_, attributes) => {
    const image = readMade({ ...phase, ...attributes }, { pixels });
    // One stored step is 1.53e-3 rad; the decimals of slope and intercept above are good to 1e-3 rad.
    quarters.forEach((angle, i) => expect(Math.abs((image.values[i] ?? NaN) - angle)).toBeLessThan(2.6e-3));
    expect(codes(image)).not.toContain('phase-unit-unknown');
  });

  test('of signed pixels as well: half a turn is the lowest value that can be stored', () => {
    const signed = new Int16Array(side * side).fill(-1024);
    const { values } = readMade({ ...phase, pixelRepresentation: 1, rescaleSlope: 2 }, { pixels: signed });
    expect(values[0]).toBeCloseTo(-Math.PI / 2, 6);
  });

  test.each<[string, Attributes, number[]]>([
    ['no rescale', {}, [0, 1024, 2048, 4095]],
    ['a unit of its own', { rescaleSlope: 0.5, rescaleIntercept: -1000 }, [-1000, -488, 24, 1047.5]],
  ])('or, with %s, in the numbers of the file, with a warning', (_, attributes, values) => {
    const image = readMade({ ...phase, ...attributes }, { pixels });
    expect([...image.values.slice(0, 4)]).toEqual(values);
    expect(codes(image)).toContain('phase-unit-unknown');
  });
});
