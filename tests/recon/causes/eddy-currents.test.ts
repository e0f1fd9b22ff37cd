/** Eddy currents: shear, scale and shift along the phase encoding, against the map written out. */
import { eddyCurrents } from '../../../recon/causes/eddy-currents';
import { gyromagneticRatio } from '../../../recon/encoding';
import type { ComplexPlane } from '../../../recon/grid';
import type { Acquisition } from '../../../recon/acquisition';
import { randomOf } from '../../../recon/random';
import type { ParameterValues } from '../../../recon/recipe';
import { objectReference } from '../../reference/object';
import { absolute, box, energy, noisePlane, transposed } from '../planes';

const still: ParameterValues = { alongReadout: 0, alongPhaseEncode: 0, offset: 0, echoSpacing: 0.5 };
function distorted(object: ComplexPlane, values: ParameterValues, acquisition: Acquisition = { phaseEncode: 'column' }): ComplexPlane {
  if (eddyCurrents.domain !== 'image') throw Error('it acts on the image');
  return eddyCurrents.apply(object, { ...still, ...values }, { acquisition, random: randomOf(1, 'none') });
}

/** µT/m that are `hertz` a pixel of 1 mm. */
const gradientOf = (hertz: number) => (hertz / (gyromagneticRatio * 1e-3)) * 1e6;

test('An even field of 50 Hz moves 90 lines of 0.59 ms by 2.655 pixels along the phase encoding', () => {
  const object = noisePlane(90, 4);
  const moved = distorted(object, { offset: 50, echoSpacing: 0.59 });
  const part = objectReference.displacement.echoPlanar - 2;
  for (let row = 10; row < 40; row++) {
    // Mass laid out over two pixels.
    const expected = (1 - part) * (object.re[row * 4] ?? NaN) + part * (object.re[(row - 1) * 4] ?? NaN);
    expect(moved.re[(row + 2) * 4]).toBeCloseTo(expected, 10);
  }
});

test('Acceleration divides all of it by R', () => {
  const object = noisePlane(40, 4);
  const whole = distorted(object, { offset: 50 });
  const half = distorted(object, { offset: 100 }, { phaseEncode: 'column', accelerationFactor: 2 });
  expect(half.re).toEqual(whole.re);
});

test('A gradient along the readout shears: each column moves in proportion to its distance from the middle', () => {
  // 20 Hz a pixel · 0.5 ms · 100 lines is one pixel a column.
  const object = noisePlane(100, 12);
  const sheared = distorted(object, { alongReadout: gradientOf(20) });
  for (let column = 0; column < 12; column++) {
    for (let row = 0; row < 100; row++) {
      const to = (row + column - 6 + 100) % 100;
      expect(sheared.re[to * 12 + column]).toBeCloseTo(object.re[row * 12 + column] ?? NaN, 9);
    }
  }
});

test.each([
  [0.25, 0.8],
  [-0.2, 1.25],
])('A gradient along the phase encoding scales: a bar grows by %f of itself and its brightness is %f', (scale, brightness) => {
  // scale = γ̄·G·Δ·ESP·N pixels a pixel.
  const image = distorted(box(100, [30, 70], [40, 60]), { alongPhaseEncode: gradientOf(scale / (0.5e-3 * 100)) });
  expect(absolute(image, 50, 50)).toBeCloseTo(brightness, 9);
  const mass = Array.from({ length: 100 }, (_, row) => absolute(image, row, 50)).reduce((a, b) => a + b, 0);
  // But for one pixel at each edge, which shares its mass with the air beside it.
  expect(Math.abs(mass - 40)).toBeLessThan(1e-9);
  const moment = Array.from({ length: 100 }, (_, row) => (row - 50) * absolute(image, row, 50)).reduce((a, b) => a + b, 0);
  // About the centre line: the middle of the bar, half a line before it, goes further off by the same part.
  expect(moment / mass).toBeCloseTo(-0.5 * (1 + scale), 9);
  const lit = Array.from({ length: 100 }, (_, row) => row).filter((row) => absolute(image, row, 50) > brightness / 2);
  expect(Math.abs(lit.length - 40 * (1 + scale))).toBeLessThanOrEqual(1);
});

test('With phase encoding along the rows the same happens along them', () => {
  const object = noisePlane(30, 20);
  const values = { alongReadout: 13, alongPhaseEncode: -7, offset: 11 };
  const along = distorted(object, values);
  const across = transposed(distorted(transposed(object), values, { phaseEncode: 'row' }));
  expect(across.re).toEqual(along.re);
});

test('The readout gradient shears, not the other: what lies on the middle column stays', () => {
  const object = noisePlane(32, 9);
  const sheared = distorted(object, { alongReadout: 30 });
  for (let row = 0; row < 32; row++) expect(sheared.re[row * 9 + 4]).toBeCloseTo(object.re[row * 9 + 4] ?? NaN, 12);
  expect(Math.abs(energy(sheared) - energy(object))).toBeGreaterThan(1);
});

test('Each gradient counts metres along its own direction, where pixels are not square', () => {
  // Pixels of 1 mm along the phase encoding and 2 mm along the readout: 10 Hz a millimetre are 10 Hz a line and 20 Hz a sample.
  const even = box(100, [30, 70], [0, 100]);
  const oblong = { ...even, spacing: [1e-3, 2e-3] as const };
  const sheared = distorted(oblong, { alongReadout: gradientOf(10) });
  // 20 Hz · 0.5 ms · 100 lines: one pixel a column.
  expect(absolute(sheared, 30 + 8, 50 + 8)).toBeCloseTo(1, 9);
  expect(absolute(sheared, 30 + 7, 50 + 8)).toBeCloseTo(0, 9);
  // 10 Hz · 0.5 ms · 100 lines: half a pixel a line.
  expect(absolute(distorted(oblong, { alongPhaseEncode: gradientOf(10) }), 50, 50)).toBeCloseTo(1 / 1.5, 9);
});
