/** Bands of balanced steady-state free precession: nulls every 1/TR (Nayak et al. 2007), first at ±1/(2TR) with alternating pulses. */
import type { Acquisition } from '../../../recon/acquisition';
import { describeCause } from '../../../recon/catalogue';
import { banding } from '../../../recon/causes/banding';
import { smoothField } from '../../../recon/field-map';
import { randomOf } from '../../../recon/random';
import { simulate } from '../../../recon/simulate';
import { box } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'column' };
const even = box(48, [0, 48], [0, 48]);
const bands = (parameters: Record<string, number>) => ({
  steps: [
    { cause: 'banding', parameters: { fieldRange: 0, offset: 0, increment: 180, repetitionTime: 5, imagingFrequency: 64, ...parameters } },
  ],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 4,
});
const signal = (parameters: Record<string, number>): number => simulate(even, bands(parameters), acquisition).image.values[700] ?? NaN;

test('With alternating pulses the signal is whole on resonance and vanishes at 1/(2TR) and 1/TR further: 100 and 300 Hz at 5 ms', () => {
  expect(signal({ offset: 0 })).toBeCloseTo(1, 12);
  for (const offset of [-300, -100, 100, 300]) expect(signal({ offset })).toBeCloseTo(0, 12);
  expect(signal({ offset: 200 })).toBeCloseTo(1, 12);
  expect(signal({ offset: 50 })).toBeCloseTo(Math.SQRT1_2, 12);
});

test('With pulses of one phase the null lies on resonance', () => {
  expect(signal({ increment: 0 })).toBeCloseTo(0, 12);
  expect(signal({ increment: 0, offset: 100 })).toBeCloseTo(1, 12);
});

test('Half the TR moves the first band to twice the frequency', () => {
  expect(signal({ repetitionTime: 2.5, offset: 100 })).toBeCloseTo(Math.SQRT1_2, 12);
  expect(signal({ repetitionTime: 2.5, offset: 200 })).toBeCloseTo(0, 12);
});

test('Over an uneven field bands run where it passes ±1/(2TR)', () => {
  const { image } = simulate(even, bands({ fieldRange: 6 }), acquisition);
  const field = smoothField(even, acquisition, randomOf(4, 'banding 0'), 6 * 64);
  image.values.forEach((value, i) => expect(value).toBeCloseTo(Math.abs(Math.cos(Math.PI * (field[i] ?? NaN) * 0.005)), 10));
  expect(Math.min(...image.values)).toBeLessThan(0.1);
});

test('Only a TR that such a sequence can have is taken from the header', () => {
  const initial = (repetitionTime: number) =>
    describeCause(banding, { ...acquisition, repetitionTime }).parameters.find(({ id }) => id === 'repetitionTime')?.initial;
  expect(initial(0.0042)).toBe(4.2);
  expect(initial(0.5)).toBe(5);
});

test('With a quarter turn of the RF phase the null lies on one side only: at −1/(4TR), not at 1/(4TR)', () => {
  expect(signal({ increment: 90, offset: -50 })).toBeCloseTo(0, 12);
  expect(signal({ increment: 90, offset: 50 })).toBeCloseTo(1, 12);
});

test('The change of phase from band to band is left out: what is positive stays so', () => {
  const { kspace } = simulate(even, bands({ offset: 200 }), acquisition);
  expect(kspace.re[24 * 48 + 24]).toBeCloseTo(48, 9);
});
