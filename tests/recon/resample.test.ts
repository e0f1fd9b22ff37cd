import { centredGrid } from '../../recon/grid';
import type { Grid, Plane } from '../../recon/grid';
import { resample } from '../../recon/resample';

/** 3 + 200·y + 100·x, in metres. */
const slope = (grid: Grid): Plane => ({
  ...grid,
  values: Float64Array.from({ length: grid.rows * grid.columns }, (_, i) => {
    const y = grid.origin[0] + Math.floor(i / grid.columns) * grid.spacing[0];
    return 3 + 200 * y + 100 * (grid.origin[1] + (i % grid.columns) * grid.spacing[1]);
  }),
});

describe('A plane on another grid', () => {
  test('is the same plane on its own grid', () => {
    const plane = slope(centredGrid(9, 12, [1e-3, 2e-3]));
    expect(resample(plane, plane).values).toEqual(plane.values);
  });

  test('keeps its values at their places in metres: a slope stays a slope on finer, shifted pixels', () => {
    const plane = slope(centredGrid(20, 20, [1e-3, 2e-3]));
    const fine: Grid = { rows: 7, columns: 9, spacing: [0.4e-3, 0.7e-3], origin: [-2.1e-3, -3.3e-3] };
    const expected = slope(fine);
    // Bilinear interpolation is exact for a slope, up to rounding.
    resample(plane, fine).values.forEach((value, i) => expect(value).toBeCloseTo(expected.values[i] ?? NaN, 12));
  });

  test('is 0 outside, and holds the edge within half a pixel of it', () => {
    const plane = { ...centredGrid(4, 4, [1e-3, 1e-3]), values: new Float64Array(16).fill(5) };
    const wide = resample(plane, centredGrid(4, 20, [1e-3, 0.5e-3]));
    expect(Array.from(wide.values.subarray(0, 20))).toEqual([0, 0, 0, 0, 0, 5, 5, 5, 5, 5, 5, 5, 5, 5, 0, 0, 0, 0, 0, 0]);
  });

  test('is refused where the two planes have no part of space in common', () => {
    const plane = slope(centredGrid(8, 8, [1e-3, 1e-3]));
    const apart = { ...plane, origin: [-4e-3, 5e-3] as const };
    expect(() => resample(plane, apart)).toThrow(RangeError);
    expect(() => resample(plane, apart)).toThrow('planes must overlap to be compared, got two that are apart');
  });
});
