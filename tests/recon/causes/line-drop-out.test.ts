/** Lines lost: the wave that each takes out of the image. */
import { lineDropOut } from '../../../recon/causes/line-drop-out';
import { inverse, inverseAlong, transform } from '../../../recon/fourier';
import { asComplex, complexZeros, magnitude } from '../../../recon/grid';
import { fullyTaken } from '../../../recon/lines';
import type { ParameterValues } from '../../../recon/recipe';
import { encodingReference as reference } from '../../reference/encoding-values';
import { actOnKspace, actOnObject } from '../act-on-kspace';
import { energy, noisePlane } from '../planes';

const centreOf = (rows: number, ky: number): ParameterValues => ({ count: 1, gain: 0, pattern: 'neighbouring', position: ky / (rows / 2) });

describe('A line lost', () => {
  test('takes P(x)·exp(i2π·ky·y/N) out of the image, stripes N/|ky| apart', () => {
    const object = noisePlane(32, 12);
    const image = inverse(actOnObject(lineDropOut, object, { ...centreOf(32, 4), gain: 0.25 }));
    const profile = inverseAlong(transform(object), 1);
    for (let y = 0; y < 32; y++) {
      const angle = (2 * Math.PI * 4 * (y - 16)) / 32;
      for (let x = 0; x < 12; x++) {
        const [a, b] = [profile.re[20 * 12 + x] ?? NaN, profile.im[20 * 12 + x] ?? NaN];
        const wave = (0.75 * (a * Math.cos(angle) - b * Math.sin(angle))) / Math.sqrt(32);
        expect((object.re[y * 12 + x] ?? NaN) - (image.re[y * 12 + x] ?? NaN)).toBeCloseTo(wave, 12);
      }
    }
  });

  test('of 64 lines of white k-space takes 1/64 of the energy', () => {
    const white = fullyTaken(complexZeros({ ...noisePlane(64, 16) }));
    white.re.fill(1);
    const after = actOnKspace(lineDropOut, white, centreOf(64, 10));
    expect(1 - energy(after) / energy(white)).toBeCloseTo(reference.lineEnergy, 12);
  });

  test('stays marked as taken: the reconstruction does not know', () => {
    expect(actOnObject(lineDropOut, noisePlane(16, 4), centreOf(16, 2)).taken).toEqual(new Uint8Array(64).fill(1));
  });

  test('shows in the k-space of the magnitude image as a pair of a quarter of the power', () => {
    // A bright object with a faint wave: to first order the magnitude is the real part, in which half of the amplitude is left.
    const object = noisePlane(32, 8);
    object.re.forEach((value, i) => (object.re[i] = 1000 + 0.01 * value));
    object.im.fill(0);
    const before = transform(object);
    const after = transform(asComplex(magnitude(inverse(actOnObject(lineDropOut, object, centreOf(32, 6))))));
    const power = (of: { re: Float64Array; im: Float64Array }, ky: number): number =>
      Array.from({ length: 8 }, (_, x) => (of.re[(16 + ky) * 8 + x] ?? NaN) ** 2 + (of.im[(16 + ky) * 8 + x] ?? NaN) ** 2).reduce(
        (a, b) => a + b,
        0,
      );
    // The second order is 1e-5 of the first.
    expect(power(after, 6) / power(before, 6)).toBeCloseTo(0.25, 3);
    expect(power(after, -6) / power(before, -6)).toBeCloseTo(0.25, 3);
    expect(power(after, 5) / power(before, 5)).toBeCloseTo(1, 3);
  });
});

describe('More lines', () => {
  const ones = fullyTaken(complexZeros({ ...noisePlane(40, 3) }));
  ones.re.fill(1);
  const lostOf = (values: ParameterValues) => {
    const { re } = actOnKspace(lineDropOut, ones, values);
    return Array.from({ length: 40 }, (_, line) => line).filter((line) => re[3 * line] === 0);
  };

  test('are neighbours from the place given, none of them beyond the edge', () => {
    expect(lostOf({ count: 3, position: 0.1 })).toEqual([22, 23, 24]);
    expect(lostOf({ count: 2, position: -1 })).toEqual([0, 1]);
    expect(lostOf({ count: 3, position: 1 })).toEqual([39]);
  });

  test('or as many different ones scattered at random', () => {
    expect(new Set(lostOf({ count: 10, pattern: 'scattered' })).size).toBe(10);
  });
});

test('Scattered lines are others for another seed, from all over k-space', () => {
  const ones = fullyTaken(complexZeros({ ...noisePlane(40, 1) }));
  ones.re.fill(1);
  const counts = new Float64Array(40);
  for (let seed = 0; seed < 400; seed++) {
    const { re } = actOnKspace(lineDropOut, ones, { count: 5, pattern: 'scattered' }, undefined, seed);
    re.forEach((value, line) => (counts[line] = (counts[line] ?? NaN) + 1 - value));
  }
  // 50 times each of 40 lines, binomial: standard deviation 6.6; four and a half of them.
  counts.forEach((count) => expect(Math.abs(count - 50)).toBeLessThan(30));
});
