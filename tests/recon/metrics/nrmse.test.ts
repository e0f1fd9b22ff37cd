import { centredGrid } from '../../../recon/grid';
import { leastSquaresGain, nrmse } from '../../../recon/metrics/nrmse';

const plane = (...values: number[]) => ({ ...centredGrid(1, values.length, [1, 1]), values: Float64Array.from(values) });

describe('The error of a simulated image against a bad one', () => {
  test('is ‖g·s − b‖/‖b‖ with the least-squares gain: a worked example', () => {
    // s = (1, 1), b = (3, 1): g = 4/2 = 2, g·s − b = (−1, 1), √2/√10.
    expect(leastSquaresGain(plane(1, 1), plane(3, 1))).toBe(2);
    expect(nrmse(plane(1, 1), plane(3, 1))).toBeCloseTo(Math.sqrt(0.2), 14);
  });

  test('does not see a gain', () => {
    expect(nrmse(plane(1, 2, 5), plane(10, 20, 50))).toBeCloseTo(0, 14);
    expect(nrmse(plane(7, 14, 0), plane(1, 3, 2))).toBeCloseTo(nrmse(plane(1, 2, 0), plane(1, 3, 2)), 14);
  });

  test('is 1 where the two have nothing in common, or the simulated image is empty', () => {
    expect(nrmse(plane(1, 0), plane(0, 1))).toBe(1);
    expect(nrmse(plane(0, 0), plane(0, 1))).toBe(1);
  });

  test('is not a number where there is nothing to compare with, and refuses planes of different size', () => {
    expect(nrmse(plane(1, 1), plane(0, 0))).toBeNaN();
    expect(() => nrmse(plane(1, 2), plane(1, 2, 3))).toThrow('planes must have the same size, got 1×2 and 1×3');
  });
});
