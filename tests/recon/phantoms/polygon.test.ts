/** Polygons in closed form against shapes whose transform is known otherwise. */
import { centredGrid } from '../../../recon/grid';
import { ellipseSignal } from '../../../recon/phantoms/ellipse';
import { rectangle } from '../../../recon/phantoms/outline';
import { polygonSpectrum, signedArea } from '../../../recon/phantoms/polygon';
import { shapeImage } from '../../../recon/phantoms/shape';

const sinc = (t: number): number => (t === 0 ? 1 : Math.sin(Math.PI * t) / (Math.PI * t));

describe('The signal of a polygon', () => {
  test('of a rectangle is the product of two sinc functions, turned with it and shifted in phase', () => {
    const [width, height, x, y, degrees] = [30, 12, 7, -4, 25] as const;
    const spectrum = polygonSpectrum({ ...rectangle([width, height], [x, y], degrees), density: 2 });
    const turn = (degrees * Math.PI) / 180;
    for (const [kx, ky] of [
      [0, 0],
      [11, 0],
      [-23, 40],
      [37.5, 19],
      [120, -77],
    ] as const) {
      const along = (kx * Math.cos(turn) + ky * Math.sin(turn)) / 1000;
      const across = (ky * Math.cos(turn) - kx * Math.sin(turn)) / 1000;
      const size = 2 * 0.03 * 0.012 * sinc(along * width) * sinc(across * height);
      const phase = (-2 * Math.PI * (kx * x + ky * y)) / 1000;
      // Rounding: terms of up to an edge over 2π|k|, 1e-3.
      expect(spectrum(kx, ky).re).toBeCloseTo(size * Math.cos(phase), 15);
      expect(spectrum(kx, ky).im).toBeCloseTo(size * Math.sin(phase), 15);
    }
  });

  test('of very many corners on an ellipse is that of the ellipse (Van de Walle 2000)', () => {
    const [a, b, x, y] = [0.03, 0.05, 0.01, -0.02];
    const corners = 4000;
    const vertices = Array.from({ length: corners }, (_, i) => {
      const turn = (2 * Math.PI * i) / corners;
      return { x: x + a * Math.cos(turn), y: y + b * Math.sin(turn) };
    });
    const { re, im } = polygonSpectrum({ density: 1, vertices })(8, -13);
    const ellipse = ellipseSignal({ density: 1, a, b, x, y, angle: 0 }, 8, -13);
    // The corners cut off (2π/n)²/6 = 4e-7 of the area, 5e-3.
    expect(Math.abs(re - ellipse.re)).toBeLessThan(4e-9);
    expect(Math.abs(im - ellipse.im)).toBeLessThan(4e-9);
  });

  test('does not hang on the sense in which the corners are listed', () => {
    const vertices = [
      { x: 0.01, y: 0 },
      { x: 0.03, y: 0.02 },
      { x: -0.02, y: 0.01 },
    ];
    const forwards = polygonSpectrum({ density: 1, vertices });
    const backwards = polygonSpectrum({ density: 1, vertices: [...vertices].reverse() });
    for (const [kx, ky] of [
      [0, 0],
      [14, 9],
    ] as const) {
      expect(backwards(kx, ky).re).toBeCloseTo(forwards(kx, ky).re, 16);
      expect(backwards(kx, ky).im).toBeCloseTo(forwards(kx, ky).im, 16);
    }
  });
});

describe('The picture of a polygon', () => {
  test('has its area, also of one that turns in on itself and of one cut by the edge of the grid', () => {
    const grid = centredGrid(32, 40, [2e-3, 1e-3]);
    const arrow = [
      { x: -0.012, y: -0.011 },
      { x: 0.013, y: 0.001 },
      { x: -0.012, y: 0.012 },
      { x: -0.004, y: 0.0005 },
    ];
    const areaOf = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0) * 2e-6;
    const { values } = shapeImage([{ density: 1, vertices: arrow }], grid);
    // Exact along rows; across them the midpoint rule on straight edges errs only on the sub-lines of the four corners, 1/8 mm each.
    expect(Math.abs(areaOf(values) - Math.abs(signedArea(arrow)))).toBeLessThan(4 * 0.125e-3 * 1e-3);
    expect(Math.max(...values)).toBeCloseTo(1, 12);
    // Columns run from −20.5 mm to 19.5 mm, rows from −33 mm to 31 mm.
    const cut = shapeImage([{ density: 1, ...rectangle([20, 10], [19.5, 0]) }], grid);
    expect(areaOf(cut.values)).toBeCloseTo(0.01 * 0.01, 12);
  });
});
