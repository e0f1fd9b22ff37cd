import { j1 } from 'cephes';
import { besselJ1 } from '../../recon/bessel';

describe('The Bessel function J1', () => {
  test('equals that of the cephes library up to 400, both sides of the crossover at 12, and is odd', () => {
    for (let x = 0.001; x < 400; x += 0.137) {
      // 1e-11 is what the header promises: e^12/(2π·12) × 1e-16 of rounding, e^−24 of the asymptotic series.
      expect(Math.abs(besselJ1(x) - j1(x))).toBeLessThan(1e-11);
    }
    expect(besselJ1(0)).toBe(0);
    expect(besselJ1(-7)).toBe(-besselJ1(7));
  });
});
