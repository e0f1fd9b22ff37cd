import { centredGrid } from '../../recon/grid';
import { lineProfile, profileSpectrum, strongestRepeat } from '../../recon/profile';

/** Stripes of `cycles` per metre across the columns, 1 mm pixels. */
const stripes = (cycles: number) => ({
  ...centredGrid(10, 64, [1e-3, 1e-3]),
  values: Float64Array.from({ length: 640 }, (_, i) => 10 + 4 * Math.cos(2 * Math.PI * cycles * (i % 64) * 1e-3)),
});

describe('A line profile', () => {
  test('reads the values under the line, both ends included, with the distance in metres', () => {
    const { distance, values } = lineProfile(stripes(125), { row: 3, column: 2 }, { row: 3, column: 18 });
    expect(values).toHaveLength(17);
    expect(distance[16]).toBeCloseTo(16e-3, 15);
    values.forEach((value, i) => expect(value).toBeCloseTo(10 + 4 * Math.cos(2 * Math.PI * 0.125 * (i + 2)), 12));
  });

  test('is bilinear between pixels and holds the edge outside the plane', () => {
    const plane = { ...centredGrid(2, 2, [1e-3, 1e-3]), values: Float64Array.from([0, 2, 4, 10]) };
    expect(lineProfile(plane, { row: 0.5, column: 0.5 }, { row: 0.5, column: 1 }).values[0]).toBe(4);
    expect(lineProfile(plane, { row: -5, column: 0 }, { row: 0, column: 0 }).values[0]).toBe(0);
  });

  test('needs two places', () => {
    expect(() => lineProfile(stripes(100), { row: 1, column: 1 }, { row: 1, column: 1 })).toThrow(
      'a profile needs two places, got one twice',
    );
  });
});

describe('The spectrum of a profile', () => {
  test('peaks at the frequency of the stripes, with half their amplitude', () => {
    // 64 samples, a power of two: 125 cycles per metre is the 8th of them, and falls on a sample of the spectrum.
    const { frequency, amplitude } = profileSpectrum(lineProfile(stripes(125), { row: 0, column: 0 }, { row: 0, column: 63 }));
    expect(frequency[8]).toBeCloseTo(125, 9);
    expect(amplitude[8]).toBeCloseTo(2, 12);
    amplitude.forEach((value, i) => {
      if (i !== 8) expect(value).toBeLessThan(1e-12);
    });
  });

  test('of any length is padded to a power of two', () => {
    const { frequency, amplitude } = profileSpectrum(lineProfile(stripes(125), { row: 0, column: 0 }, { row: 0, column: 40 }));
    expect(amplitude).toHaveLength(33);
    const peak = amplitude.indexOf(Math.max(...amplitude));
    // 41 samples of 1 mm resolve 1/41 mm = 24 cycles per metre.
    expect(Math.abs((frequency[peak] ?? NaN) - 125)).toBeLessThan(24 / 2);
  });
});

describe('The strongest repeat along a profile', () => {
  const across = (plane: ReturnType<typeof stripes>) => {
    const profile = lineProfile(plane, { row: 0, column: 0 }, { row: 0, column: 63 });
    return strongestRepeat(profile, profileSpectrum(profile));
  };

  test('is the frequency of the stripes', () => {
    const repeat = across(stripes(125));
    expect(repeat?.frequency).toBeCloseTo(125, 9);
    expect(repeat?.amplitude).toBeCloseTo(2, 12);
  });

  test('is none on an even plane, and fewer than two cycles are the shape of the object', () => {
    expect(across({ ...stripes(0), values: new Float64Array(640).fill(7) })).toBeUndefined();
    // One cycle over the line: its side lobes in the padded spectrum are none, since 64 samples are a power of two.
    const slow = across(stripes(1000 / 64));
    expect(slow?.amplitude ?? 0).toBeLessThan(1e-9);
  });
});
