/** Ellipses in closed form (Van de Walle 2000; Koay 2007) against outside values and against the transform of their picture. */
import { transform } from '../../../recon/fourier';
import { asComplex, centredGrid } from '../../../recon/grid';
import type { Ellipse } from '../../../recon/phantoms/ellipse';
import { ellipseSignal } from '../../../recon/phantoms/ellipse';
import { shapeImage, shapeKspace } from '../../../recon/phantoms/shape';
import { reference } from '../../reference/values';

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

describe('The signal of an ellipse', () => {
  test('has the published value for a turned ellipse off the centre', () => {
    const signal = ellipseSignal({ density: 1, a: 0.3, b: 0.5, x: 0.1, y: -0.2, angle: radians(25) }, 0.8, -1.3);
    // The reference has ten decimals.
    expect(signal.re).toBeCloseTo(reference.ellipse.re, 9);
    expect(signal.im).toBeCloseTo(reference.ellipse.im, 9);
  });

  test('adds up to the published values of the head phantom of Shepp and Logan', () => {
    const shapes = reference.sheppLogan.map(([density, a, b, x, y, degrees]) => ({ density, a, b, x, y, angle: radians(degrees) }));
    const total = (kx: number, ky: number, part: 're' | 'im') => shapes.reduce((sum, shape) => sum + ellipseSignal(shape, kx, ky)[part], 0);
    expect(total(0, 0, 're')).toBeCloseTo(reference.sheppLoganSignal.zero.re, 9);
    expect(total(1.5, 2.25, 're')).toBeCloseTo(reference.sheppLoganSignal.away.re, 9);
    expect(total(1.5, 2.25, 'im')).toBeCloseTo(reference.sheppLoganSignal.away.im, 9);
  });

  test('of a disc of radius ¼ vanishes at its first dark ring', () => {
    const { re } = ellipseSignal({ density: 1, a: 0.25, b: 0.25, x: 0, y: 0, angle: 0 }, reference.discFirstZero, 0);
    // The reference has nine decimals; the slope there is about 0.03 a unit.
    expect(Math.abs(re)).toBeLessThan(1e-9);
  });
});

describe('The picture of an ellipse', () => {
  const n = 128;
  const pixel = 1e-3;
  const grid = centredGrid(n, n, [pixel, pixel]);
  const shape: Ellipse = { density: 1, a: 0.021, b: 0.034, x: 0.0072, y: -0.0051, angle: radians(31) };

  test('has the area of the ellipse, to the grain of the 16 × 16 points on its edge', () => {
    const { values } = shapeImage([shape], grid);
    const area = values.reduce((sum, value) => sum + value, 0) * pixel ** 2;
    // About 2π·28 ≈ 180 edge pixels, each with an error of at most 1/16 of one row of points, random in sign: √180/16² pixels of 2240.
    expect(Math.abs(area / (Math.PI * shape.a * shape.b) - 1)).toBeLessThan(3e-5);
  });

  test('transforms to the closed form for |k| ≤ N/4, but for aliases of the pixel, which are bounded', () => {
    const exact = shapeKspace([shape], grid);
    const drawn = transform(asComplex(shapeImage([shape], grid)));
    // A pixel is a mean over its area: S(k) is multiplied by sinc(kx·Δ)·sinc(ky·Δ) and then sampled, so that the transform is the sum of
    // that product over k + m/Δ. The term m = 0 is the closed form; the others are bounded by |J1(2πq)|/q ≤ 1/(π·q^1.5), q the radius of
    // the ellipse in k, at least |k|·min(a, b). Terms beyond |m| = 12 fall as m^−2.5 and add less than 3 % of the first.
    const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));
    const bound = (kx: number, ky: number): number => {
      let sum = 0;
      for (let mx = -12; mx <= 12; mx++) {
        for (let my = -12; my <= 12; my++) {
          if (mx === 0 && my === 0) continue;
          const q = (Math.hypot(kx + mx, ky + my) / pixel) * Math.min(shape.a, shape.b);
          sum += (Math.abs(sinc(kx + mx) * sinc(ky + my)) * shape.a * shape.b) / (Math.PI * q ** 1.5);
        }
      }
      return (1.03 * sum) / (pixel ** 2 * n);
    };
    // The 16 × 16 points place an edge to 1/16 pixel: uniform error of 1/16/√12 in each of the 16 rows of points of some 190 edge pixels,
    // five standard deviations of their sum, in the scale of the transform.
    const grain = (5 * Math.sqrt(190 / 16)) / (16 * Math.sqrt(12) * n);
    const quarter = n / 4;
    let worst = 0;
    for (let v = -quarter; v <= quarter; v += 2) {
      for (let u = -quarter; u <= quarter; u += 2) {
        const i = (v + n / 2) * n + u + n / 2;
        const response = sinc(u / n) * sinc(v / n);
        const difference = Math.hypot(
          (drawn.re[i] ?? NaN) - response * (exact.re[i] ?? NaN),
          (drawn.im[i] ?? NaN) - response * (exact.im[i] ?? NaN),
        );
        worst = Math.max(worst, difference / (grain + bound(u / n, v / n)));
      }
    }
    expect(worst).toBeLessThan(1);
    // The bound is of use: the closed form itself is far above it in the middle of k-space.
    expect(exact.re[(n / 2) * n + n / 2] ?? NaN).toBeGreaterThan(1000 * (grain + bound(0, 0)));
  });
});
