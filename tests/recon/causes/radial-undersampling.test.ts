/** Projections: the point spread against the disc that it tends to, the clean circle, and the convolution written out. */
import { j1 } from 'cephes';
import { radialUndersampling } from '../../../recon/causes/radial-undersampling';
import { inverse, transform } from '../../../recon/fourier';
import { magnitude } from '../../../recon/grid';
import { projectionSpread, rampKernel } from '../../../recon/projections';
import { actOnObject } from '../act-on-kspace';
import { box, noisePlane } from '../planes';

/** J1(πr)/(2r), the point spread of the full disc |k| ≤ ½. */
const disc = (r: number): number => (r === 0 ? Math.PI / 4 : j1(Math.PI * r) / (2 * r));

describe('The point spread of projections', () => {
  test('is built from the transform of the ramp |k| cut at ½ cycle a pixel', () => {
    for (const t of [0, 0.3, 1, 2.5, 7]) {
      // Midpoint rule in 20,000 steps: the error is of the order 1e-8.
      let sum = 0;
      for (let i = 0; i < 20000; i++) {
        const k = (i + 0.5) / 20000 - 0.5;
        sum += (Math.abs(k) * Math.cos(2 * Math.PI * k * t)) / 20000;
      }
      expect(rampKernel(t)).toBeCloseTo(sum, 7);
    }
  });

  test('of many is that of the full disc', () => {
    const { values: re } = projectionSpread(64, 64, 200);
    for (const [dy, dx] of [
      [0, 0],
      [0, 1],
      [3, -4],
      [-10, 7],
      [20, 21],
      [31, 0],
    ] as const) {
      // The table is right to 1e-5 a projection, and 200 of them are clean to 127 px.
      expect(Math.abs((re[(32 + dy) * 64 + 32 + dx] ?? NaN) - disc(Math.hypot(dy, dx)))).toBeLessThan(1e-4);
    }
  });

  test.each([16, 32])('of %i is clean within P/π pixels, and streaks beyond', (P) => {
    const { values: re } = projectionSpread(128, 128, P);
    const worst = (from: number, to: number): number => {
      let largest = 0;
      re.forEach((value, i) => {
        const r = Math.hypot(Math.floor(i / 128) - 64, (i % 128) - 64);
        if (r >= from && r < to) largest = Math.max(largest, Math.abs(value - disc(r)));
      });
      return largest;
    };
    // The error is Σ J_2P terms of k·r: under 1 % of the peak at nine tenths of the radius, P/π px; P/2 px of clear streaks from 1.5 times it.
    expect(worst(0, (0.9 * P) / Math.PI)).toBeLessThan(0.01 * disc(0));
    expect(worst((1.3 * P) / Math.PI, (3 * P) / Math.PI)).toBeGreaterThan(0.02 * disc(0));
  });
});

describe('Too few projections', () => {
  test('is the object convolved with the point spread, without what lies outside the disc of k-space', () => {
    const [rows, columns, P] = [12, 9, 8];
    const object = noisePlane(rows, columns);
    const { values: spread } = projectionSpread(2 * rows, 2 * columns, P);
    const expected = { ...object, re: new Float64Array(rows * columns), im: new Float64Array(rows * columns) };
    for (let i = 0; i < rows * columns; i++) {
      for (let j = 0; j < rows * columns; j++) {
        const dy = Math.floor(i / columns) - Math.floor(j / columns);
        const dx = (i % columns) - (j % columns);
        const weight = spread[(rows + dy) * 2 * columns + columns + dx] ?? NaN;
        expected.re[i] = (expected.re[i] ?? NaN) + weight * (object.re[j] ?? NaN);
        expected.im[i] = (expected.im[i] ?? NaN) + weight * (object.im[j] ?? NaN);
      }
    }
    const kspace = actOnObject(radialUndersampling, object, { spokes: P });
    const convolved = transform(expected);
    kspace.taken.forEach((taken, i) => {
      expect(kspace.re[i]).toBeCloseTo(taken === 1 ? (convolved.re[i] ?? NaN) : 0, 11);
      expect(kspace.im[i]).toBeCloseTo(taken === 1 ? (convolved.im[i] ?? NaN) : 0, 11);
    });
    expect(kspace.taken[6 * columns + 4]).toBe(1);
    expect(kspace.taken[0]).toBe(0);
  });

  test('keeps the brightness of what is large, and streaks the air less the more spokes there are', () => {
    const object = box(64, [26, 38], [26, 38]);
    const airOf = (spokes: number): number => {
      const { values } = magnitude(inverse(actOnObject(radialUndersampling, object, { spokes })));
      expect(Math.abs((values[32 * 64 + 32] ?? NaN) - 1)).toBeLessThan(0.06);
      return Math.sqrt(values.slice(0, 64 * 16).reduce((sum, value) => sum + value ** 2, 0));
    };
    const [few, some, many] = [airOf(16), airOf(40), airOf(100)];
    expect(few).toBeGreaterThan(1.5 * some);
    expect(some).toBeGreaterThan(1.5 * many);
  });
});
