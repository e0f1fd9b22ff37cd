/** Skipped lines: R copies of 1/R each, N/R apart. Values beside the checks. */
import type { Acquisition } from '../../../recon/acquisition';
import { inverse, transform } from '../../../recon/fourier';
import { linesOf, takenLines } from '../../../recon/lines';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { withObjectPhase } from '../../../recon/object-phase';
import { box, energy, largestDifference, noisePlane } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'column' };
const recipeOf = (accelerationFactor: number, calibrationLines = 0) => ({
  steps: [{ cause: 'uniform-undersampling', parameters: { accelerationFactor, calibrationLines } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});

describe('Skipped lines', () => {
  test.each([2, 4] as const)('with R = %i give R copies of 1/R, N/R apart', (R) => {
    const { image } = simulate(box(64, [28, 36], [20, 44]), recipeOf(R), acquisition);
    reference.undersampled[R].forEach((amplitude, j) => {
      // 1e-9 is the tolerance of the reference; the sum is exact up to rounding.
      expect(image.values[((30 + (j * 64) / R) % 64) * 64 + 30]).toBeCloseTo(amplitude, 9);
    });
    expect(image.values[20 * 64 + 30]).toBeCloseTo(0, 9);
  });

  test.each([
    [64, 3],
    [45, 2],
    [33, 4],
  ])('of %i lines, one in %i is taken, the line of zero phase encoding among them', (rows, R) => {
    const { kspace } = simulate(noisePlane(rows, 8), recipeOf(R), acquisition);
    const taken = takenLines(kspace, linesOf(kspace, acquisition));
    taken.forEach((isTaken, line) => expect(isTaken).toBe((line - Math.floor(rows / 2)) % R === 0));
  });

  test('are filled in the middle by calibration lines, which add a blurred true image to the copies', () => {
    const object = noisePlane(64, 8);
    const { kspace } = simulate(object, recipeOf(4, 12), acquisition);
    const taken = takenLines(kspace, linesOf(kspace, acquisition));
    expect(taken.filter(Boolean)).toHaveLength(16 + 9);
    expect(taken.slice(26, 38)).toEqual(Array(12).fill(true));
    const middle = transform(object);
    taken.forEach((isTaken, line) => {
      if (isTaken) return;
      middle.re.fill(0, line * 8, (line + 1) * 8);
      middle.im.fill(0, line * 8, (line + 1) * 8);
    });
    expect(largestDifference(inverse(kspace), inverse(middle))).toBeLessThan(1e-13);
  });

  test('are gaps in the k-space of the magnitude image too, unless calibration lines were taken', () => {
    // The copies repeat after N/R, and so does their magnitude: its transform has every R-th line only, whatever the phase.
    const object = withObjectPhase(noisePlane(64, 8), { range: 3, seed: 2 });
    const lineEnergy = (calibrationLines: number) => {
      const { re, im } = simulate(object, recipeOf(4, calibrationLines), acquisition).kspaceOfImage();
      return energy({ ...object, re: re.slice(8 * 33, 8 * 34), im: im.slice(8 * 33, 8 * 34) });
    };
    expect(lineEnergy(0)).toBeLessThan(1e-24);
    expect(lineEnergy(16)).toBeGreaterThan(1e-3);
  });

  test('are zero in k-space', () => {
    const { kspace } = simulate(noisePlane(16, 16), recipeOf(2), acquisition);
    kspace.taken.forEach((taken, i) => {
      if (taken === 0) expect([kspace.re[i], kspace.im[i]]).toEqual([0, 0]);
    });
  });
});
