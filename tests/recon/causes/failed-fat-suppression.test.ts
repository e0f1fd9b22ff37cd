/** Fat suppression by frequency: where its pulse meets fat, misses it, and meets water instead. Common practice. */
import type { Acquisition } from '../../../recon/acquisition';
import { pulseResponse } from '../../../recon/causes/failed-fat-suppression';
import { assumedFat } from '../../../recon/fat-mask';
import { smoothField } from '../../../recon/field-map';
import { randomOf } from '../../../recon/random';
import { simulate } from '../../../recon/simulate';
import { box } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'column' };

/** Water of 0.4 everywhere, fat of 1 in two columns of four. */
const tissue = box(48, [0, 48], [0, 48]);
tissue.re.forEach((_, i) => (tissue.re[i] = i % 4 < 2 ? 1 : 0.4));
const suppressed = (parameters: Record<string, number>) => {
  const step = { fieldRange: 0, offset: 0, halfWidth: 1.5, suppression: 0.9, fatThreshold: 0.75, ...parameters };
  const recipe = {
    steps: [{ cause: 'failed-fat-suppression', parameters: step }],
    reconstruction: { method: 'zero-filled', parameters: {} },
    seed: 2,
  };
  const { values } = simulate(tissue, recipe, acquisition).image;
  return { fat: values[48 * 20] ?? NaN, water: values[48 * 20 + 2] ?? NaN, values };
};

test('Where the field is right, fat is suppressed and water is not', () => {
  const { fat, water } = suppressed({});
  expect(fat).toBeCloseTo(0.1, 12);
  expect(water).toBeCloseTo(0.4, 12);
});

test('Where it is off by more than the half width of the pulse, fat stays bright', () => {
  expect(suppressed({ offset: 2 }).fat).toBeCloseTo(1, 12);
  expect(suppressed({ offset: 2, halfWidth: 3 }).fat).toBeCloseTo(0.1, 12);
});

test('Where it is off by 3.5 ppm, down to where fat should be, water is suppressed instead', () => {
  const { fat, water } = suppressed({ offset: -3.5 });
  expect(water).toBeCloseTo(0.04, 12);
  expect(fat).toBeCloseTo(1, 12);
  // Up by as much, water is out of reach.
  expect(suppressed({ offset: 3.5 }).water).toBeCloseTo(0.4, 12);
});

test('Over an uneven field fat is dark where the field is within the pulse and bright elsewhere', () => {
  const { values } = suppressed({ fieldRange: 8 });
  const field = smoothField(tissue, acquisition, randomOf(2, 'failed-fat-suppression 0'), 8);
  let [dark, bright] = [0, 0];
  values.forEach((value, i) => {
    const off = Math.abs(field[i] ?? NaN);
    if (i % 4 >= 2) return;
    if (off < 1.5 * 0.8) expect(value).toBeCloseTo(0.1, 10);
    if (off > 1.5 * 1.2) expect(value).toBeCloseTo(1, 10);
    if (off < 1.2) dark++;
    if (off > 1.8) bright++;
  });
  expect(Math.min(dark, bright)).toBeGreaterThan(50);
});

test('The pulse is flat inside, zero outside, and half at its half width', () => {
  expect([0, 1, -1.19].map((offset) => pulseResponse(offset, 1.5))).toEqual([1, 1, 1]);
  expect(pulseResponse(1.5, 1.5)).toBeCloseTo(0.5, 12);
  expect([1.81, -3].map((offset) => pulseResponse(offset, 1.5))).toEqual([0, 0]);
});

describe('The assumed fat mask', () => {
  test('holds what is brighter than the threshold of the 99th percentile, with a soft edge, whatever the scale of the image', () => {
    const mask = assumedFat(tissue, 0.75);
    expect([mask[0], mask[2]]).toEqual([1, 0]);
    expect(assumedFat({ ...tissue, re: tissue.re.map((value) => 1000 * value) }, 0.75)).toEqual(mask);
    expect(assumedFat(tissue, 1)[0]).toBeCloseTo(0.5, 12);
  });

  test('of an empty image is empty', () => {
    expect(assumedFat(box(8, [0, 0], [0, 0]), 0.5).every((part) => part === 0)).toBe(true);
  });
});
