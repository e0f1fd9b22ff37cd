/** Receive shading: the polynomial, its ends, and what a uniformity test says of it. */
import { causeOf } from '../../../recon/recipe-check';
import type { ComplexPlane } from '../../../recon/grid';
import { transform } from '../../../recon/fourier';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { absolute, box, largestDifference, noisePlane } from '../planes';
import { disc, integralUniformity, uniformityOfDisc } from '../uniformity';

const shading = (values: Partial<Record<'sideRatio' | 'steepening' | 'centreRatio' | 'direction', number>>) => ({
  steps: [{ cause: 'receive-shading', parameters: { sideRatio: 1, steepening: 1, centreRatio: 1, direction: 0, ...values } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});
const shaded = (object: ComplexPlane, values: Parameters<typeof shading>[0]) =>
  simulate(object, shading(values), { phaseEncode: 'column' }).image;
const uniform = box(64, [0, 64], [0, 64]);
const at = (image: { values: Float64Array }, row: number, column: number): number => image.values[row * 64 + column] ?? NaN;

test('A weight that grows exponentially to the right multiplies the image, and is 1 at the centre', () => {
  const image = shaded(uniform, { sideRatio: 4 });
  expect(at(image, 32, 32)).toBeCloseTo(1, 12);
  // 48 is half way to the right edge: ln b = ½·ln 4·½.
  expect(at(image, 5, 48)).toBeCloseTo(Math.SQRT2, 12);
  expect(at(image, 5, 0)).toBeCloseTo(0.5, 12);
});

test('The coil lies clockwise from the right: at 90° below', () => {
  const image = shaded(uniform, { sideRatio: 4, direction: 90 });
  expect(at(image, 48, 5)).toBeCloseTo(Math.SQRT2, 12);
  expect(at(image, 0, 5)).toBeCloseTo(0.5, 12);
});

test('The cubic term leaves the middle and steepens the side of the coil', () => {
  const image = shaded(uniform, { steepening: 4 });
  expect(at(image, 32, 0)).toBeCloseTo(0.5, 12);
  expect(at(image, 32, 48)).toBeCloseTo(Math.exp((Math.log(4) / 2) * 0.125), 12);
});

test('A bowl has its ratio of centre to edge on both axes, whatever the direction', () => {
  const image = shaded(uniform, { centreRatio: 2, direction: 35 });
  expect([at(image, 32, 0), at(image, 0, 32)].map((value) => value.toFixed(12))).toEqual(['0.500000000000', '0.500000000000']);
});

test('Shading multiplies complex values: what it does to a sum of objects is the sum of what it does to each', () => {
  const cause = causeOf('receive-shading');
  if (cause?.domain !== 'image') throw Error('acts on the image');
  const act = (object: ComplexPlane) =>
    cause.apply(
      object,
      { sideRatio: 3, steepening: 2, centreRatio: 0.5, direction: 20 },
      {
        acquisition: { phaseEncode: 'row' },
        random: { uniform: () => 0, normal: () => 0 },
      },
    );
  const [a, b] = [noisePlane(12, 9, 1), noisePlane(12, 9, 2)];
  const sum = { ...a, re: a.re.map((value, i) => value + (b.re[i] ?? NaN)), im: a.im.map((value, i) => value + (b.im[i] ?? NaN)) };
  const [actedA, actedB] = [act(a), act(b)];
  const acted = {
    ...a,
    re: actedA.re.map((value, i) => value + (actedB.re[i] ?? NaN)),
    im: actedA.im.map((value, i) => value + (actedB.im[i] ?? NaN)),
  };
  // Rounding of values up to about 20.
  expect(largestDifference(act(sum), acted)).toBeLessThan(1e-13);
});

describe('A uniformity test', () => {
  // Definition and limits of the ACR large phantom: J Appl Clin Med Phys 2022;23:e13730, table 3: at least 87.5 % below 3 T.
  test('of 950 over 850 gives the worked value', () => {
    expect(integralUniformity(950, 850)).toBeCloseTo(reference.integralUniformity, 8);
  });

  test('of a linear shading gives 100·(1 − tanh(½·ln T·u)), u the reach of the small regions', () => {
    const measured = uniformityOfDisc(shaded(disc(64, 24), { sideRatio: 1.5 }), 22);
    const reach = 20 / 32;
    // A small region averages exp over ±2 px of a slope of 0.006 a pixel: 1e-4 of its value, 0.01 %.
    expect(Math.abs(measured - 100 * (1 - Math.tanh((Math.log(1.5) / 2) * reach)))).toBeLessThan(0.02);
    expect(measured).toBeGreaterThan(87);
  });

  test('fails the limit where one side is three times the other', () => {
    expect(uniformityOfDisc(shaded(disc(64, 24), { sideRatio: 3 }), 22)).toBeLessThan(87.5);
  });
});

test('Only the middle of k-space changes visibly: outside |k| = 3 by less than a thirtieth of the largest sample', () => {
  const object = disc(64, 24);
  const before = transform(object);
  const { kspace } = simulate(object, shading({ sideRatio: 3, direction: 90 }), { phaseEncode: 'column' });
  const largest = absolute(before, 32, 32);
  for (let row = 0; row < 64; row++) {
    for (let column = 0; column < 64; column++) {
      const i = row * 64 + column;
      const change = Math.hypot((kspace.re[i] ?? NaN) - (before.re[i] ?? NaN), (kspace.im[i] ?? NaN) - (before.im[i] ?? NaN)) / largest;
      // The disc itself has up to 0.06 there; the shading shifts half of a neighbour into it.
      if (Math.max(Math.abs(row - 32), Math.abs(column - 32)) > 3) expect(change).toBeLessThan(1 / 30);
    }
  }
  const beside = 33 * 64 + 32;
  expect(Math.hypot((kspace.re[beside] ?? NaN) - (before.re[beside] ?? NaN), kspace.im[beside] ?? NaN) / largest).toBeGreaterThan(0.05);
});
