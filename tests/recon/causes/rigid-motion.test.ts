/** Rigid motion: the shift theorem, the poses of each course, and what they do to image and k-space. */
import type { Acquisition } from '../../../recon/acquisition';
import { inverse, transform } from '../../../recon/fourier';
import { centredGrid, complexZeros } from '../../../recon/grid';
import { simulate } from '../../../recon/simulate';
import { absolute, box, energy, noisePlane } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'column' };
const motion = (parameters: Record<string, number | string>, seed = 1) => ({
  steps: [{ cause: 'rigid-motion', parameters: { alongPhaseEncode: 0, alongReadout: 0, rotation: 0, linesPerShot: 1, ...parameters } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed,
});
const phaseOf = (re: number | undefined, im: number | undefined): number => Math.atan2(im ?? NaN, re ?? NaN);

describe('A sudden movement', () => {
  test('before the first line moves the whole image by its distance: 5 mm are 5 pixels of 1 mm', () => {
    // The shift theorem (Bracewell): K·exp(−i2πk·d/N) is the image moved by +d.
    const { kspace } = simulate(
      noisePlane(24, 32),
      motion({ course: 'sudden', alongPhaseEncode: 5, alongReadout: 3, onset: 0 }),
      acquisition,
    );
    const image = inverse(kspace);
    const object = noisePlane(24, 32);
    for (let row = 0; row < 19; row++) {
      for (let column = 0; column < 29; column++) {
        expect(image.re[(row + 5) * 32 + column + 3] ?? NaN).toBeCloseTo(object.re[row * 32 + column] ?? NaN, 11);
      }
    }
  });

  test('in the middle of the scan leaves half the lines as they were', () => {
    const object = noisePlane(32, 16);
    const { kspace } = simulate(object, motion({ course: 'sudden', alongPhaseEncode: 2.5, rotation: 3, onset: 0.5 }), acquisition);
    const before = transform(object);
    expect(kspace.re.subarray(0, 16 * 16)).toEqual(before.re.subarray(0, 16 * 16));
    expect(kspace.re.subarray(16 * 16)).not.toEqual(before.re.subarray(16 * 16));
  });

  test('just before the centre line gives double contours: both places hold the object at half its height', () => {
    // 32 of 64 lines see the line object at its old place and 32 at the new: ½ each. What one half throws 20 rows away is the sum of 32
    // phasors an even number of half turns of 32 apart, 0.
    const object = box(64, [20, 21], [10, 54]);
    const { image } = simulate(object, motion({ course: 'sudden', alongPhaseEncode: 20, onset: 0.5 }), acquisition);
    expect(image.values[20 * 64 + 30]).toBeCloseTo(0.5, 12);
    expect(image.values[40 * 64 + 30]).toBeCloseTo(0.5, 12);
  });

  test('after the last line, or in a single shot, does nothing', () => {
    const object = noisePlane(32, 16);
    const parameters = { course: 'sudden', alongPhaseEncode: 5, alongReadout: 5, rotation: 4 };
    for (const still of [
      { onset: 1, linesPerShot: 1 },
      { onset: 0.6, linesPerShot: 32 },
    ]) {
      const { kspace } = simulate(object, motion({ ...parameters, ...still }), acquisition);
      expect(kspace.re).toEqual(transform(object).re);
    }
  });
});

describe('A drift', () => {
  test('along the phase encoding turns line n by −2π·k·s·n/N: half the way and a quadratic phase', () => {
    const point = complexZeros(centredGrid(64, 4, [1e-3, 1e-3]));
    point.re[32 * 4 + 2] = 1;
    const { kspace } = simulate(point, motion({ course: 'drift', alongPhaseEncode: 6.3 }), acquisition);
    for (let line = 0; line < 64; line++) {
      const expected = (-2 * Math.PI * (line - 32) * 6.3 * (line / 63)) / 64;
      const turn = phaseOf(kspace.re[line * 4 + 2], kspace.im[line * 4 + 2]) - expected;
      expect(Math.cos(turn)).toBeCloseTo(1, 10);
    }
  });

  test('along the phase encoding blurs a point evenly over its distance, about half the way', () => {
    // The local shift of frequency k is d/dk of k·s·(k + N/2): from −s·N/2 to 3s·N/2, s·N/2 in the middle (stationary phase).
    const point = complexZeros(centredGrid(256, 1, [1e-3, 1e-3]));
    point.re[128] = 1;
    const { image } = simulate(point, motion({ course: 'drift', alongPhaseEncode: 16 }), acquisition);
    let total = 0;
    let moment = 0;
    image.values.forEach((value, row) => {
      total += value ** 2;
      moment += value ** 2 * (row - 128);
    });
    // The mean of the local shift over all frequencies is half the way; N/(N − 1) from the last line.
    expect(moment / total).toBeCloseTo(8, 0);
  });
});

describe('A random walk', () => {
  test('ends with the standard deviation that was asked for', () => {
    const ends: number[] = [];
    for (let seed = 1; seed <= 400; seed++) {
      const tall = complexZeros(centredGrid(64, 2, [1e-3, 1e-3]));
      tall.re[32 * 2 + 1] = 1;
      const { kspace } = simulate(tall, motion({ course: 'random-walk', alongReadout: 0.2 }, seed), acquisition);
      // Sample kx = −1 of the last line: phase +2π·d/2 of a shift of d pixels.
      ends.push(phaseOf(kspace.re[63 * 2], kspace.im[63 * 2]) / Math.PI);
    }
    const deviation = Math.sqrt(ends.reduce((sum, end) => sum + end ** 2, 0) / ends.length);
    // 63 steps of 1/64 of the variance; the standard error of a deviation of 400 values is 3.5 %, taken three times.
    expect(Math.abs(deviation / (0.2 * Math.sqrt(63 / 64)) - 1)).toBeLessThan(0.11);
  });

  test('of shifts alone leaves the magnitude of every sample, and so the energy', () => {
    const object = noisePlane(32, 24);
    const { kspace } = simulate(object, motion({ course: 'random-walk', alongPhaseEncode: 4, alongReadout: 4 }), acquisition);
    const before = transform(object);
    for (let line = 0; line < 32; line++) {
      for (let sample = 0; sample < 24; sample++) expect(absolute(kspace, line, sample)).toBeCloseTo(absolute(before, line, sample), 11);
    }
    expect(energy(kspace)).toBeCloseTo(energy(before), 8);
  });
});

test('Lines of one echo train stand still together: with two shots, every second line moves', () => {
  const object = noisePlane(16, 16);
  const { kspace } = simulate(object, motion({ course: 'drift', alongReadout: 4, linesPerShot: 8 }), acquisition);
  const before = transform(object);
  for (let line = 0; line < 16; line++) {
    const same = kspace.re.subarray(line * 16, line * 16 + 16).every((value, i) => value === before.re[line * 16 + i]);
    expect(same).toBe(line % 2 === 0);
  }
});

test('The k-space of the magnitude image does not show the jump: its lines stay Hermitian', () => {
  const kspace = simulate(
    box(32, [10, 22], [8, 20]),
    motion({ course: 'sudden', alongPhaseEncode: 4, onset: 0.4 }),
    acquisition,
  ).kspaceOfImage();
  for (let k = 1; k < 16; k++) {
    expect(absolute(kspace, 16 + k, 16 + 3)).toBeCloseTo(absolute(kspace, 16 - k, 16 - 3), 11);
  }
});
