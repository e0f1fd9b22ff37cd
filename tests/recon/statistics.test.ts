import { centredGrid } from '../../recon/grid';
import { percentile, statistics } from '../../recon/statistics';

const plane = { ...centredGrid(3, 4, [1, 1]), values: Float64Array.from([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]) };

describe('Statistics', () => {
  test('of a plane', () => {
    // 1 … n: mean (n+1)/2, variance of the sample n(n+1)/12.
    expect(statistics(plane)).toEqual({ n: 12, mean: 6.5, standardDeviation: Math.sqrt(13), min: 1, max: 12, median: 6.5 });
  });

  test('of a region count its rows and columns alone', () => {
    const region = { firstRow: 1, lastRow: 3, firstColumn: 1, lastColumn: 3 };
    const { standardDeviation, ...rest } = statistics(plane, region);
    expect(rest).toEqual({ n: 4, mean: 8.5, min: 6, max: 11, median: 8.5 });
    // 6, 7, 10, 11 about 8.5: (2.5² + 1.5²)·2/3.
    expect(standardDeviation).toBeCloseTo(Math.sqrt(17 / 3), 12);
  });

  test('of a single value have no spread', () => {
    expect(statistics(plane, { firstRow: 0, lastRow: 1, firstColumn: 0, lastColumn: 1 }).standardDeviation).toBe(0);
  });

  test('refuse a region that is empty or reaches outside', () => {
    expect(() => statistics(plane, { firstRow: 1, lastRow: 1, firstColumn: 0, lastColumn: 2 })).toThrow(RangeError);
    expect(() => statistics(plane, { firstRow: 0, lastRow: 4, firstColumn: 0, lastColumn: 2 })).toThrow(/within 3×4, got rows 0–4/);
  });
});

describe('A percentile', () => {
  test('is linear between the closest ranks', () => {
    expect(percentile([4, 1, 3, 2], 0)).toBe(1);
    expect(percentile([4, 1, 3, 2], 100)).toBe(4);
    expect(percentile([4, 1, 3, 2], 50)).toBe(2.5);
    expect(percentile([10, 20, 40], 75)).toBe(30);
    expect(percentile([5], 99.9)).toBe(5);
  });

  test('needs a value, and a rank from 0 to 100', () => {
    expect(() => percentile([], 50)).toThrow('percentile needs at least one value, got none');
    expect(() => percentile([1], 101)).toThrow('p must be 0 to 100, got 101');
  });
});
