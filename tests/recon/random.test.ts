import { randomOf } from '../../recon/random';

const draws = (seed: number, stream: string, n: number, kind: 'uniform' | 'normal'): number[] => {
  const random = randomOf(seed, stream);
  return Array.from({ length: n }, () => random[kind]());
};
const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;

describe('Seeded randomness', () => {
  test('is the same for the same seed and stream, and another for another', () => {
    expect(draws(1, 'a', 9, 'normal')).toEqual(draws(1, 'a', 9, 'normal'));
    expect(draws(1, 'a', 9, 'normal')).not.toEqual(draws(2, 'a', 9, 'normal'));
    expect(draws(1, 'a', 9, 'normal')).not.toEqual(draws(1, 'b', 9, 'normal'));
  });

  test('has these first values: a recipe that was stored must give the same bytes after an update', () => {
    expect(draws(1, 'periodic-motion 0', 2, 'uniform')).toEqual([0.941784142989459, 0.5706508287419386]);
    expect(draws(0xffffffff, 'x', 2, 'normal')).toEqual([-0.02253384597240905, 1.258463492809665]);
  });

  test('is uniform from 0 to 1 without 1', () => {
    const values = draws(3, 'u', 20000, 'uniform');
    expect(Math.min(...values)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...values)).toBeLessThan(1);
    // Standard error of the mean 1/√(12·20000) = 0.002, of the variance about 0.0005: four of them.
    expect(Math.abs(mean(values) - 0.5)).toBeLessThan(0.008);
    expect(Math.abs(mean(values.map((value) => (value - 0.5) ** 2)) - 1 / 12)).toBeLessThan(0.002);
  });

  test('is normal with mean 0, variance 1 and kurtosis 3', () => {
    const values = draws(4, 'n', 20000, 'normal');
    // Standard errors 1/√n = 0.007, √(2/n) = 0.01, √(96/n) = 0.07: four of them.
    expect(Math.abs(mean(values))).toBeLessThan(0.028);
    expect(Math.abs(mean(values.map((value) => value ** 2)) - 1)).toBeLessThan(0.04);
    expect(Math.abs(mean(values.map((value) => value ** 4)) - 3)).toBeLessThan(0.28);
  });

  test('has streams that do not follow one another: neighbouring seeds are uncorrelated', () => {
    const [a, b] = [draws(10, 's', 10000, 'normal'), draws(11, 's', 10000, 'normal')];
    expect(Math.abs(mean(a.map((value, i) => value * (b[i] ?? NaN))))).toBeLessThan(0.04);
  });
});
