/** Zero-filled and homodyne reconstruction of partial Fourier: Noll, Nishimura, Macovski 1991, errors from numpy. */
import type { Acquisition } from '../../../recon/acquisition';
import type { Plane } from '../../../recon/grid';
import { magnitude } from '../../../recon/grid';
import { twoEllipse } from '../../../recon/phantoms/two-ellipse';
import { homodyneWeight } from '../../../recon/reconstructions/homodyne';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { noisePlane, transposed } from '../planes';

const column: Acquisition = { phaseEncode: 'column' };
const partialFourier = (fraction: number) => ({ cause: 'partial-fourier', parameters: { fraction } });
const undersampling = { cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 0 } };
const recipeOf = (method: string, ...steps: { cause: string; parameters: Record<string, number> }[]) => ({
  steps,
  reconstruction: { method, parameters: {} },
  seed: 1,
});

/** ‖image − object‖/‖object‖, no gain taken out. */
function errorOf(image: Plane, object: Plane): number {
  const size = (values: Float64Array) => Math.sqrt(values.reduce((sum, value) => sum + value ** 2, 0));
  return size(image.values.map((value, i) => value - (object.values[i] ?? NaN))) / size(object.values);
}

describe('The weight of homodyne', () => {
  test.each([1, -1] as const)('adds up to 2 for every line and its mirror image, side %i', (side) => {
    const weight = homodyneWeight(64, 32, 11, side);
    for (let k = 1; k < 32; k++) expect((weight[32 + k] ?? NaN) + (weight[32 - k] ?? NaN)).toBeCloseTo(2, 12);
    expect(weight[32]).toBe(1);
    expect(weight[32 + side * 20]).toBe(2);
    expect(weight[32 - side * 20]).toBe(0);
  });
});

describe('5/8 of the lines of two ellipses', () => {
  const cases = [
    ['real', 'zero-filled', reference.partialFourier.real.zeroFilled],
    ['real', 'homodyne', reference.partialFourier.real.homodyne],
    ['smooth phase', 'zero-filled', reference.partialFourier.smoothPhase.zeroFilled],
    ['smooth phase', 'homodyne', reference.partialFourier.smoothPhase.homodyne],
  ] as const;
  test.each(cases)('%s, %s: the error is that of the outside computation', (kind, method, expected) => {
    const object = twoEllipse({ phase: kind === 'smooth phase' });
    const { image } = simulate(object, recipeOf(method, partialFourier(0.625)), column);
    // The same arithmetic in float64 on both sides; the reference has six decimals.
    expect(errorOf(image, magnitude(object))).toBeCloseTo(expected, 6);
  });

  test('Homodyne is worse where the phase varies than where it does not: without an object phase it looks better than it is', () => {
    const error = (phase: boolean) => {
      const object = twoEllipse({ phase });
      return errorOf(simulate(object, recipeOf('homodyne', partialFourier(0.625)), column).image, magnitude(object));
    };
    expect(error(true)).toBeGreaterThan(2 * error(false));
  });
});

describe('Homodyne', () => {
  test('equals the zero-filled reconstruction where all lines are taken, and where lines are skipped evenly', () => {
    for (const steps of [[], [undersampling]]) {
      const object = noisePlane(40, 24);
      const homodyne = simulate(object, recipeOf('homodyne', ...steps), column);
      expect(homodyne.image.values).toEqual(simulate(object, recipeOf('zero-filled', ...steps), column).image.values);
    }
  });

  test('sharpens each copy where lines are skipped and one side is missing', () => {
    const object = twoEllipse({ phase: false });
    const full = simulate(object, recipeOf('zero-filled', undersampling), column).image;
    const zeroFilled = simulate(object, recipeOf('zero-filled', undersampling, partialFourier(0.625)), column).image;
    const homodyne = simulate(object, recipeOf('homodyne', undersampling, partialFourier(0.625)), column).image;
    expect(errorOf(homodyne, full)).toBeLessThan(0.5 * errorOf(zeroFilled, full));
  });

  test('works the same along the other phase-encode axis', () => {
    const object = twoEllipse({ phase: true });
    const along = simulate(object, recipeOf('homodyne', partialFourier(0.75)), column).image;
    const across = simulate(transposed(object), recipeOf('homodyne', partialFourier(0.75)), { phaseEncode: 'row' }).image;
    for (const [row, at] of [
      [20, 64],
      [64, 70],
      [90, 50],
    ] as const) {
      expect(across.values[at * 128 + row]).toBeCloseTo(along.values[row * 128 + at] ?? NaN, 12);
    }
  });
});
