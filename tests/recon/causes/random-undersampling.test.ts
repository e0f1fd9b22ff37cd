/** Randomly skipped lines: how many, which, and the point spread that they leave. */
import { randomUndersampling } from '../../../recon/causes/random-undersampling';
import { uniformUndersampling } from '../../../recon/causes/uniform-undersampling';
import { inverse } from '../../../recon/fourier';
import { linesOf, takenLines } from '../../../recon/lines';
import type { ParameterValues } from '../../../recon/recipe';
import { actOnKspace, columnEncoded } from '../act-on-kspace';
import { absolute } from '../planes';
import { column } from '../point-spread';

const rows = 96;
/** A point at the centre: its k-space is √N everywhere in the scale where its image is 1. */
const point = column(rows, () => 1 / Math.sqrt(rows));
const sampled = (values: ParameterValues, seed = 1) => actOnKspace(randomUndersampling, point, values, columnEncoded, seed);
const takenOf = (values: ParameterValues, seed = 1) => {
  const kspace = sampled(values, seed);
  return takenLines(kspace, linesOf(kspace, columnEncoded));
};
const spread = (values: ParameterValues, seed = 1) => {
  const image = inverse(sampled(values, seed));
  return Array.from({ length: rows }, (_, row) => absolute(image, row, 0));
};

describe('Randomly skipped lines', () => {
  test.each([
    [2, 0],
    [3, 8],
    [2.5, 16],
    [8, 24],
  ])('at R = %f with %i calibration lines are N/R in number, calibration among them, or the calibration alone', (R, C) => {
    for (const seed of [1, 2, 3]) {
      const taken = takenOf({ accelerationFactor: R, calibrationLines: C, density: 1 }, seed);
      expect(taken.filter(Boolean)).toHaveLength(Math.max(Math.round(rows / R), C));
      for (let i = 0; i < C; i++) expect(taken[rows / 2 - Math.floor(C / 2) + i]).toBe(true);
    }
  });

  test('leave a point spread whose energy is M/N, M²/N² of it at the centre, whatever the choice', () => {
    for (const seed of [1, 2]) {
      const values = spread({ accelerationFactor: 3, calibrationLines: 0, density: 0 }, seed);
      // Parseval: Σ|PSF|² = Σ m²/N.
      expect(values.reduce((sum, value) => sum + value ** 2, 0)).toBeCloseTo(1 / 3, 12);
      expect(values[rows / 2]).toBeCloseTo(1 / 3, 12);
    }
  });

  test('leave no copy as bright as those of regular skipping, which are as bright as the parent', () => {
    const regular = inverse(actOnKspace(uniformUndersampling, point, { accelerationFactor: 3 }));
    const sides = spread({ accelerationFactor: 3, calibrationLines: 0, density: 0 }).filter((_, row) => row !== rows / 2);
    expect(absolute(regular, rows / 2 + rows / 3, 0)).toBeCloseTo(1 / 3, 12);
    // 32 of 96 lines: side lobes of √((M/N)(1 − M/N)/(N − 1)) = 0.048 on average; the largest of 95 Rayleigh values is about 2.1 times it.
    expect(Math.max(...sides)).toBeLessThan(0.2);
    expect(Math.sqrt(sides.reduce((sum, value) => sum + value ** 2, 0) / sides.length)).toBeCloseTo(Math.sqrt(2 / 9 / 95), 12);
  });

  test('gather about the centre as the density rises', () => {
    const meanDistance = (density: number): number => {
      let sum = 0;
      let n = 0;
      for (let seed = 0; seed < 20; seed++) {
        takenOf({ accelerationFactor: 4, calibrationLines: 0, density }, seed).forEach((isTaken, line) => {
          if (!isTaken) return;
          sum += Math.abs(line - rows / 2);
          n++;
        });
      }
      return sum / n;
    };
    // Evenly: the mean of |k| over 96 lines is 24; of 480 draws its error is 14/√480 = 0.6, four of which are allowed.
    expect(Math.abs(meanDistance(0) - 24)).toBeLessThan(2.6);
    expect(meanDistance(2)).toBeLessThan(20);
    expect(meanDistance(6)).toBeLessThan(meanDistance(2));
  });

  test('are others for another seed', () => {
    expect(takenOf({}, 1)).not.toEqual(takenOf({}, 2));
    expect(takenOf({}, 1)).toEqual(takenOf({}, 1));
  });
});
