/** Chemical shift: how far fat lies from water (Hood et al. 1999), and how the two add up in a gradient echo (Dixon 1984). */
import type { Acquisition } from '../../../recon/acquisition';
import { describeCause } from '../../../recon/catalogue';
import { chemicalShift } from '../../../recon/causes/chemical-shift';
import { fatShift, gyromagneticRatio } from '../../../recon/encoding';
import type { ComplexPlane } from '../../../recon/grid';
import { simulate } from '../../../recon/simulate';
import { objectReference } from '../../reference/object';
import { reference } from '../../reference/values';
import { box } from '../planes';

const at3T = (gyromagneticRatio * 3) / 1e6;
const at1T5 = (gyromagneticRatio * 1.5) / 1e6;
const acquisition: Acquisition = { phaseEncode: 'column' };
const shift = (parameters: Record<string, number | string>) => ({
  steps: [{ cause: 'chemical-shift', parameters: { towards: 'start', ...parameters } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});

/** A ridge along the rows or the columns about the centre, all of it fat. */
function ridge(across: 'rows' | 'columns', size = 64): ComplexPlane {
  const [first, last] = [size / 2 - 3, size / 2 + 4];
  return across === 'rows' ? box(size, [first, last], [0, size]) : box(size, [0, size], [first, last]);
}

/** How far the ridge lies from the centre: of a shift of d pixels the sample next to the centre of k-space has the phase −2πd/N. */
function place(kspace: ComplexPlane, across: 'rows' | 'columns'): number {
  const centre = kspace.rows / 2;
  const i = across === 'rows' ? (centre + 1) * kspace.columns + centre : centre * kspace.columns + centre + 1;
  return (-Math.atan2(kspace.im[i] ?? NaN, kspace.re[i] ?? NaN) * kspace.rows) / (2 * Math.PI);
}

describe('Fat is imaged beside water', () => {
  test.each([
    [at1T5, 130, reference.fatShift.at1T5],
    [at3T, 440, reference.fatShift.at3T],
    [at1T5, 125, objectReference.fatShift125],
  ])('at %f MHz and %i Hz/px by %f pixels along the readout', (imagingFrequency, bandwidth, pixels) => {
    const { kspace } = simulate(ridge('columns'), shift({ imagingFrequency, bandwidth, sequence: 'spin-echo' }), acquisition);
    // The reference has six decimals.
    expect(place(kspace, 'columns')).toBeCloseTo(-pixels, 5);
    const other = simulate(ridge('rows'), shift({ imagingFrequency, bandwidth, sequence: 'spin-echo' }), acquisition);
    expect(place(other.kspace, 'rows')).toBeCloseTo(0, 10);
  });

  test.each([
    [1, objectReference.echoPlanarFatShift.full],
    [2, objectReference.echoPlanarFatShift.halved],
  ])(
    'in an echo-planar scan at 3 T, 0.5 ms a line of 64, acceleration %i, by %f pixels along the phase encoding',
    (accelerationFactor, pixels) => {
      const recipe = shift({ imagingFrequency: at3T, sequence: 'echo-planar', echoSpacing: 0.5 });
      const { kspace } = simulate(ridge('rows'), recipe, { ...acquisition, accelerationFactor });
      expect(place(kspace, 'rows')).toBeCloseTo(-pixels, 5);
    },
  );

  test('further in an image that was interpolated along the readout: its pixels are smaller than those of the bandwidth', () => {
    const recipe = shift({ imagingFrequency: at3T, bandwidth: 440, sequence: 'spin-echo' });
    const { kspace } = simulate(ridge('columns'), recipe, { ...acquisition, acquiredReadout: 32 });
    expect(place(kspace, 'columns')).toBeCloseTo(-2 * reference.fatShift.at3T, 5);
  });

  test('as published: 3.5 ppm are about 224 Hz at 1.5 T', () => {
    expect(fatShift * gyromagneticRatio * 1.5).toBeCloseTo(objectReference.fatShiftHertz.at1T5, 5);
    expect(Math.round(fatShift * gyromagneticRatio * 1.5)).toBe(objectReference.fatShiftHertz.printedAt1T5);
  });

  test('leaving a gap of no signal on one side and a bright overlap on the other', () => {
    // Water 0.5 on both sides of fat 1, columns 24 to 40; 4 px: 256 Hz at 64 MHz and 4 ppm, 64 Hz/px.
    const object = box(64, [0, 64], [24, 40]);
    object.re.forEach((value, i) => (object.re[i] = value === 1 ? 1 : 0.5));
    const recipe = shift({ difference: 4, imagingFrequency: 64, bandwidth: 64, sequence: 'spin-echo', towards: 'start' });
    const { image } = simulate(object, recipe, acquisition);
    const at = (column: number) => image.values[30 * 64 + column] ?? NaN;
    expect(at(38)).toBeCloseTo(0, 10);
    expect(at(22)).toBeCloseTo(1.5, 10);
    expect(at(30)).toBeCloseTo(1, 10);
  });
});

describe('In a gradient echo', () => {
  const mixed = (echoTime: number): number => {
    // A pixel with as much fat as water is one whose brightness lies on the threshold: the smooth step is ½ there.
    const object = box(32, [0, 32], [0, 32]);
    object.re.fill(0.75, 0, 8);
    const recipe = shift({ sequence: 'gradient-echo', imagingFrequency: at1T5, bandwidth: 5000, echoTime, fatThreshold: 0.75 });
    const { image } = simulate(object, recipe, acquisition);
    return image.values[4] ?? NaN;
  };

  test('a pixel of half fat and half water is dark at the first TE out of phase and whole at the first in phase', () => {
    // At 5 kHz/px fat moves by 0.04 px, which changes an even stretch by nothing but what comes in over its ends, 4 px away.
    expect(mixed(objectReference.firstOpposed)).toBeLessThan(0.02);
    expect(Math.abs(mixed(objectReference.firstInPhase) - 0.75)).toBeLessThan(0.02);
  });

  test('fat alone keeps its brightness at any TE', () => {
    const recipe = shift({ sequence: 'gradient-echo', imagingFrequency: at1T5, bandwidth: 200, echoTime: 3.1, fatThreshold: 0.5 });
    const { image } = simulate(box(16, [0, 16], [0, 16]), recipe, acquisition);
    image.values.forEach((value) => expect(value).toBeCloseTo(1, 12));
  });
});

test('What is darker than the threshold is water and stays where it is', () => {
  const object = box(32, [8, 20], [8, 20]);
  object.re.forEach((value, i) => (object.re[i] = value * 0.4));
  object.re.fill(1, 25 * 32, 26 * 32);
  const { image } = simulate(object, shift({ imagingFrequency: at3T, bandwidth: 100, sequence: 'spin-echo' }), acquisition);
  for (let i = 0; i < 24 * 32; i++) expect(image.values[i]).toBeCloseTo(object.re[i] ?? NaN, 12);
});

test('The form takes imaging frequency, bandwidth and TE from the header, the frequency from the field where only that is known', () => {
  const initial = (of: Acquisition, id: string) =>
    describeCause(chemicalShift, of).parameters.find((parameter) => parameter.id === id)?.initial;
  expect(initial({ ...acquisition, imagingFrequency: 123.25e6, fieldStrength: 3 }, 'imagingFrequency')).toBe(123.25);
  expect(initial({ ...acquisition, fieldStrength: 3 }, 'imagingFrequency')).toBe(127.73);
  expect(initial(acquisition, 'imagingFrequency')).toBe(63.87);
  expect(initial({ ...acquisition, bandwidthPerPixel: 390 }, 'bandwidth')).toBe(390);
  expect(initial({ ...acquisition, echoTime: 0.0046 }, 'echoTime')).toBe(4.6);
});

test('At a gradient echo fat, which lies below water, is ahead in the phase −2πΔf·TE: +90° after a quarter of its cycle', () => {
  if (chemicalShift.domain !== 'image') throw Error('it acts on the image');
  const initial = Object.fromEntries(Object.entries(chemicalShift.parameters).map(([id, parameter]) => [id, parameter.initial]));
  const values = {
    ...initial,
    sequence: 'gradient-echo',
    imagingFrequency: at1T5,
    bandwidth: 5000,
    echoTime: objectReference.firstInPhase / 4,
  };
  const random = { uniform: () => 0, normal: () => 0 };
  const { re, im } = chemicalShift.apply(box(16, [0, 16], [0, 16]), values, { acquisition, random });
  re.forEach((value, i) => {
    expect(value).toBeCloseTo(0, 5);
    expect(im[i]).toBeCloseTo(1, 5);
  });
});
