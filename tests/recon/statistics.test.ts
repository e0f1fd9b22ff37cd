import { centredGrid } from '../../recon/grid';
import { percentile, statistics, valuesInEllipse, valuesInRectangle } from '../../recon/statistics';

const plane = { ...centredGrid(3, 4, [1, 1]), values: Float64Array.from([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]) };

describe('Statistics', () => {
  test('of the values of a plane', () => {
    // 1 … n: mean (n+1)/2, variance of the sample n(n+1)/12.
    expect(statistics(plane.values)).toEqual({ n: 12, mean: 6.5, standardDeviation: Math.sqrt(13), min: 1, max: 12, median: 6.5 });
  });

  test('of a single value have no spread, and of none there are none', () => {
    expect(statistics(Float64Array.of(5)).standardDeviation).toBe(0);
    expect(() => statistics(new Float64Array(0))).toThrow('statistics need at least one pixel, got none');
  });
});

describe('A region', () => {
  test('counts the pixels whose centres lie in the rectangle, whichever corner comes first', () => {
    expect([...valuesInRectangle(plane, { row: 2.2, column: 0.6 }, { row: 0.9, column: 2 })]).toEqual([6, 7, 10, 11]);
  });

  test('ends at the edge of the plane, and may be empty', () => {
    expect([...valuesInRectangle(plane, { row: -5, column: 3 }, { row: 0, column: 9 })]).toEqual([4]);
    expect(valuesInRectangle(plane, { row: 0.2, column: 0.2 }, { row: 0.8, column: 0.8 })).toHaveLength(0);
  });

  test('as an ellipse leaves the corners of its rectangle out, and holds π/4 of its pixels', () => {
    const wide = { ...centredGrid(101, 201, [1, 1]), values: new Float64Array(101 * 201).fill(3) };
    const within = valuesInEllipse(wide, { row: 0, column: 0 }, { row: 100, column: 200 });
    // The border of the ellipse is about 480 pixels long; half a pixel of it is 1.6 % of the area.
    expect(within.length / ((Math.PI / 4) * 100 * 200)).toBeCloseTo(1, 1);
    expect([...valuesInEllipse(plane, { row: 0, column: 0 }, { row: 2, column: 2 })]).toEqual([2, 5, 6, 7, 10]);
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
