/** Levels of the screen against the functions that they stand for, over all magnitudes and all angles. */
import { writeLogLevels, writePhaseLevels } from '../../workers/display-levels';

/** Twenty thousand samples on a spiral: magnitudes from 1 down to 1e-9, a quarter of a turn and a bit from one to the next. */
const n = 20_000;
const samples = Array.from({ length: n }, (_, i) => ({ size: 10 ** ((-9 * i) / (n - 1)), angle: 1.7 * i }));
const plane = {
  ...({ rows: 1, columns: n, spacing: [1, 1], origin: [0, 0] } as const),
  re: Float64Array.from(samples, ({ size, angle }) => size * Math.cos(angle)),
  im: Float64Array.from(samples, ({ size, angle }) => size * Math.sin(angle)),
};

/** Of half a level that rounding to a whole one takes, and a thousandth for the tables: their header. */
const tolerance = 0.501;

test('The level of a log magnitude is the nearest to log10 of it over the largest, 0 from 1e-8 downwards', () => {
  const levels = new Uint16Array(n);
  writeLogLevels(plane, levels);
  const worst = levels.reduce((most, level, i) => {
    const log = Math.max(-8, Math.log10(Math.hypot(plane.re[i] ?? NaN, plane.im[i] ?? NaN)));
    return Math.max(most, Math.abs(level - ((log + 8) / 8) * 65_535));
  }, 0);
  expect(worst).toBeLessThan(tolerance);
});

test('The level of a phase is the nearest to its angle, all around the circle', () => {
  const levels = new Uint16Array(n);
  writePhaseLevels(plane, levels);
  const worst = levels.reduce((most, level, i) => {
    const angle = Math.atan2(plane.im[i] ?? NaN, plane.re[i] ?? NaN);
    return Math.max(most, Math.abs(level - ((angle + Math.PI) / (2 * Math.PI)) * 65_535));
  }, 0);
  expect(worst).toBeLessThan(tolerance);
});

test('On the axes and diagonals the phase is exact: eighths of a turn', () => {
  const re = [-1, 0, 1, 1, 1, 0, -1, -1];
  const im = [-1, -1, -1, 0, 1, 1, 1, 0];
  const levels = new Uint16Array(8);
  writePhaseLevels({ ...plane, columns: 8, re: Float64Array.from(re), im: Float64Array.from(im) }, levels);
  expect([...levels]).toEqual([-3, -2, -1, 0, 1, 2, 3, 4].map((eighth) => Math.round(((eighth + 4) / 8) * 65_535)));
});
