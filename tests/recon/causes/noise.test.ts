/** Noise to a wanted SNR: its size, and the distribution of its magnitude from one coil and from several. */
import { gammaVariate } from '../../../recon/causes/noise';
import { inverse, transform } from '../../../recon/fourier';
import type { ComplexPlane, Plane } from '../../../recon/grid';
import { randomOf } from '../../../recon/random';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { box } from '../planes';

const recipe = (snr: number, coils: number, seed = 3) => ({
  steps: [{ cause: 'noise', parameters: { snr, coils } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed,
});
const noisy = (object: ComplexPlane, snr: number, coils = 1, seed = 3): Plane =>
  simulate(object, recipe(snr, coils, seed), { phaseEncode: 'row' }).image;

/** 128 × 128, signal 1 in the middle columns: 64 · 128 pixels of object and as many of air. */
const half = box(128, [0, 128], [32, 96]);
const isObject = (i: number): boolean => i % 128 >= 32 && i % 128 < 96;

function moments(values: ArrayLike<number>): { mean: number; standardDeviation: number; n: number } {
  const all = Array.from(values);
  const mean = all.reduce((sum, value) => sum + value, 0) / all.length;
  const variance = all.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (all.length - 1);
  return { mean, standardDeviation: Math.sqrt(variance), n: all.length };
}
const inObject = ({ values }: Plane) => moments(values.filter((_, i) => isObject(i)));
const inAir = ({ values }: Plane) => moments(values.filter((_, i) => !isObject(i)));

/** 8192 independent pixels: the mean is known to s/√n = 0.011·s, the standard deviation to s/√(2n) = 0.0078·s; four times that. */
const ofMean = 0.044;
const ofDeviation = 0.031;

describe('The wanted SNR', () => {
  test('is the mean of the object over σ of the real part: the transform is orthonormal, σ in the image is σ in k-space', () => {
    const { kspace } = simulate(half, recipe(20, 1), { phaseEncode: 'row' });
    const clean = transform(half);
    const added = moments(kspace.re.map((value, i) => value - (clean.re[i] ?? NaN)));
    // 16384 samples: known to 0.55 %, four times that.
    expect(Math.abs(added.standardDeviation * 20 - 1)).toBeLessThan(0.022);
    expect(Math.abs(added.mean)).toBeLessThan(4 * (0.05 / 128));
  });

  test('is found again by the two-image method, √2·S/SD of the difference', () => {
    // NEMA MS 1, method 1 (from memory).
    const [first, second] = [noisy(half, 20, 1, 1), noisy(half, 20, 1, 2)];
    const difference = moments(first.values.map((value, i) => value - (second.values[i] ?? NaN)).filter((_, i) => isObject(i)));
    const snr = (Math.SQRT2 * inObject(first).mean) / difference.standardDeviation;
    // 0.78 % of statistics four times over, and the Rician mean is 1/(2·SNR²) = 0.1 % high.
    expect(Math.abs(snr / 20 - 1)).toBeLessThan(0.032);
  });

  test('is found again from the air of one coil, 0.655·S/SD', () => {
    // NEMA MS 1, method 4 (from memory): single coil, magnitude.
    const image = noisy(half, 20);
    const snr = (reference.rician[0].standardDeviation * inObject(image).mean) / inAir(image).standardDeviation;
    expect(Math.abs(snr / 20 - 1)).toBeLessThan(ofDeviation + 0.002);
  });

  test('does not depend on how bright the object is, or on how much of the field of view it fills', () => {
    const dim = { ...half, re: half.re.map((value) => value / 250) };
    expect(inObject(noisy(dim, 10)).standardDeviation * 250).toBeCloseTo(inObject(noisy(half, 10)).standardDeviation, 10);
    const small = moments(noisy(box(128, [50, 78], [50, 78]), 10).values.slice(0, 40 * 128));
    expect(Math.abs(small.standardDeviation / (0.1 * reference.rician[0].standardDeviation) - 1)).toBeLessThan(0.05);
  });

  test('is that of all lines: with every second line the zero-filled image has σ/√2', () => {
    const steps = [{ cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 0 } }];
    const object = box(128, [0, 128], [40, 72]);
    const full = recipe(20, 1);
    const { image } = simulate(object, { ...full, steps: [...steps, ...full.steps] }, { phaseEncode: 'row' });
    // Columns 12 to 27 and 76 to 91 are free of object and of its copy 64 columns on; half of the pixels repeat the other.
    const air = moments(image.values.filter((_, i) => i % 128 >= 76 && i % 128 < 92));
    const sigma = air.standardDeviation / reference.rician[0].standardDeviation;
    // 2048 pixels: known to 1.6 %, four times that.
    expect(Math.abs(sigma * 20 * Math.SQRT2 - 1)).toBeLessThan(0.064);
  });
});

describe('The magnitude from one coil is Rician', () => {
  test('in air: Rayleigh, mean over standard deviation 1.913', () => {
    const { mean, standardDeviation } = inAir(noisy(half, 10));
    expect(Math.abs(mean * 10 - reference.rician[0].mean)).toBeLessThan(ofMean);
    expect(Math.abs(standardDeviation * 10 - reference.rician[0].standardDeviation)).toBeLessThan(ofDeviation);
    // Relative errors of both: (0.55 % + 0.8 %) four times over.
    expect(Math.abs(mean / standardDeviation - 1.913)).toBeLessThan(0.08);
  });

  test.each([1, 2, 3, 5, 10] as const)('in an object of %i σ', (snr) => {
    const { mean, standardDeviation } = inObject(noisy(half, snr));
    // The wanted SNR is relative to the clean object, 1: σ = 1/SNR.
    expect(Math.abs(mean * snr - reference.rician[snr].mean)).toBeLessThan(ofMean);
    expect(Math.abs(standardDeviation * snr - reference.rician[snr].standardDeviation)).toBeLessThan(ofDeviation);
  });
});

describe('Root sum of squares of several coils', () => {
  test.each([2, 4, 8, 16, 32] as const)('of %i gives in air the χ distribution of twice as many degrees of freedom', (coils) => {
    const { mean, standardDeviation } = inAir(noisy(half, 10, coils));
    expect(Math.abs(mean * 10 - reference.centralChi[coils].mean)).toBeLessThan(ofMean);
    expect(Math.abs(standardDeviation * 10 - reference.centralChi[coils].standardDeviation)).toBeLessThan(ofDeviation);
  });

  test('has the mean square A² + 2nσ² in the object', () => {
    // Constantinides et al, Magn Reson Med 1997;38:852 (from memory): second moment of the non-central χ.
    const image = noisy(half, 3, 8);
    const square = moments(image.values.filter((_, i) => isObject(i)).map((value) => value ** 2));
    expect(Math.abs(square.mean - (1 + (2 * 8) / 9))).toBeLessThan((4 * square.standardDeviation) / Math.sqrt(square.n));
  });

  test('has the distribution of n coil images that were noised and combined one by one', () => {
    const random = randomOf(9, 'four coils');
    const combined = Float64Array.from({ length: 8192 }, () =>
      Math.sqrt([0, 1, 2, 3].reduce((sum) => sum + (0.5 + random.normal() / 3) ** 2 + (random.normal() / 3) ** 2, 0)),
    ).sort();
    const model = noisy(half, 3, 4)
      .values.filter((_, i) => isObject(i))
      .sort();
    // Two samples of 8192: quantiles agree to about 0.02 standard deviations of 0.33 at the middle, 0.03 at the tenths; four times over.
    for (const rank of [819, 2048, 4096, 6144, 7372]) expect(Math.abs((combined[rank] ?? NaN) - (model[rank] ?? NaN))).toBeLessThan(0.04);
  });

  test('keeps the phase of the signal and takes no sample that was not taken', () => {
    const steps = [{ cause: 'partial-fourier', parameters: { fraction: 0.625 } }, ...recipe(20, 8).steps];
    const { kspace } = simulate(half, { ...recipe(20, 8), steps }, { phaseEncode: 'row' });
    expect(kspace.taken.reduce((sum, taken) => sum + taken, 0)).toBe(80 * 128);
    kspace.taken.forEach((taken, i) => {
      if (taken === 0) expect([kspace.re[i], kspace.im[i]]).toEqual([0, 0]);
    });
  });
});

test('A gamma variate of shape a has mean a and variance a', () => {
  for (const shape of [1, 3, 31]) {
    const random = randomOf(4, `gamma ${shape}`);
    const { mean, standardDeviation } = moments(Array.from({ length: 20000 }, () => gammaVariate(shape, random)));
    // Mean known to √(a/n); its variance to a·√((2 + 6/a)/n), from the kurtosis 3 + 6/a. Four times each.
    expect(Math.abs(mean - shape)).toBeLessThan(4 * Math.sqrt(shape / 20000));
    expect(Math.abs(standardDeviation ** 2 - shape)).toBeLessThan(4 * shape * Math.sqrt((2 + 6 / shape) / 20000));
  }
});

test('The same seed gives the same grain, another seed another', () => {
  expect(noisy(half, 10, 4, 7).values).toEqual(noisy(half, 10, 4, 7).values);
  expect(noisy(half, 10, 4, 7).values).not.toEqual(noisy(half, 10, 4, 8).values);
});

test('The SNR is that of the mean of the object, not of its brightest part', () => {
  // 1 in three quarters and 3 in a quarter of the object: mean 1.5.
  const object = box(128, [0, 128], [32, 96]);
  object.re.forEach((value, i) => (object.re[i] = i % 128 < 48 ? 3 * value : value));
  const air = inAir(noisy(object, 15));
  expect(Math.abs(air.standardDeviation / reference.rician[0].standardDeviation / 0.1 - 1)).toBeLessThan(ofDeviation);
});

test('Of several coils, the noise of the others is as strong as the samples taken make it', () => {
  const steps = [{ cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 0 } }];
  const full = recipe(20, 8);
  const { kspace } = simulate(box(128, [0, 128], [40, 72]), { ...full, steps: [...steps, ...full.steps] }, { phaseEncode: 'row' });
  const image = inverse(kspace);
  const square = moments(
    Array.from(image.re, (re, i) => re ** 2 + (image.im[i] ?? NaN) ** 2).filter((_, i) => i % 128 >= 76 && i % 128 < 92),
  );
  // Half of the samples are taken: each coil has σ²/2 in each part of the zero-filled image, and the combined one the mean square 2nσ²/2. It
  // repeats after half the field of view but for its grain, 1/(4n) of it, half of which goes with the lines that are left out.
  const power = (2 * 8 * 0.05 ** 2) / 2;
  expect(square.mean).toBeGreaterThan(0.9 * power);
  expect(square.mean).toBeLessThan(1.1 * power);
});
