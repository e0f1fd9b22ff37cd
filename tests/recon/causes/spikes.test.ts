/** Spikes as plane waves of constant modulus. */
import type { Acquisition } from '../../../recon/acquisition';
import { transform, inverse } from '../../../recon/fourier';
import { centredGrid, complexZeros } from '../../../recon/grid';
import type { ComplexPlane } from '../../../recon/grid';
import { withObjectPhase } from '../../../recon/object-phase';
import type { Step } from '../../../recon/recipe';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { absolute, box } from '../planes';

const given = { place: 'given', amplitude: 10, count: 1, burst: 1, kReadout: 30, kPhaseEncode: 40, phase: 0 };
const hit = (object: ComplexPlane, values: Partial<Record<keyof typeof given, number | string>>, acquisition: Partial<Acquisition> = {}) =>
  simulate(
    object,
    {
      steps: [{ cause: 'spikes', parameters: { ...given, ...values } }],
      reconstruction: { method: 'zero-filled', parameters: {} },
      seed: 2,
    },
    { phaseEncode: 'column', ...acquisition },
  );

/** What was added to k-space. */
function added(object: ComplexPlane, kspace: ComplexPlane): ComplexPlane {
  const clean = transform(object);
  return { ...kspace, re: kspace.re.map((re, i) => re - (clean.re[i] ?? NaN)), im: kspace.im.map((im, i) => im - (clean.im[i] ?? NaN)) };
}
const hits = (plane: ComplexPlane): number[] =>
  Array.from(plane.re.keys()).filter((i) => Math.hypot(plane.re[i] ?? NaN, plane.im[i] ?? NaN) > 1e-9);

/** One pixel at the centre: |K| is the same everywhere, 1/√(NM). */
const point = (size: number): ComplexPlane => box(size, [size / 2, size / 2 + 1], [size / 2, size / 2 + 1]);

describe('One spike', () => {
  test('is the part of max |K| that was asked for, at the place and with the phase that was asked for', () => {
    const object = box(64, [20, 40], [20, 50]);
    const difference = added(object, hit(object, { kReadout: -7, kPhaseEncode: 12, phase: 60 }).kspace);
    const A = 0.1 * absolute(transform(object), 32, 32);
    const i = (32 + 12) * 64 + 32 - 7;
    expect(hits(difference)).toEqual([i]);
    expect(difference.re[i]).toBeCloseTo(A * 0.5, 12);
    expect(difference.im[i]).toBeCloseTo(A * Math.sin(Math.PI / 3), 12);
  });

  test('adds a plane wave of constant modulus A/√(NM): an even veil in air', () => {
    const object = box(64, [28, 36], [28, 36]);
    const { image } = hit(object, { kReadout: 11, kPhaseEncode: 14 });
    const veil = (0.1 * absolute(transform(object), 32, 32)) / 64;
    for (const i of [0, 5 * 64 + 3, 60 * 64 + 50]) expect(image.values[i]).toBeCloseTo(veil, 12);
  });

  test('draws stripes of period N/|k|, 5.12 px for (30, 40) of 256, across its direction', () => {
    const wave = inverse(added(point(256), hit(point(256), {}).kspace));
    const phaseAt = (row: number, column: number) => Math.atan2(wave.im[row * 256 + column] ?? NaN, wave.re[row * 256 + column] ?? NaN);
    // From pixel to pixel the phase goes on by 2π·30/256 along the rows and 2π·40/256 down: less than half a turn, so no ambiguity.
    const across = (phaseAt(128, 129) - phaseAt(128, 128)) / (2 * Math.PI);
    const down = (phaseAt(129, 128) - phaseAt(128, 128)) / (2 * Math.PI);
    expect(1 / Math.hypot(across, down)).toBeCloseTo(reference.spikePeriod, 9);
    expect(across / down).toBeCloseTo(30 / 40, 9);
  });

  test('lies at kx along the readout: with the phase encoding along the rows, down the columns', () => {
    const object = box(64, [20, 40], [20, 50]);
    const difference = added(object, hit(object, { kReadout: 5, kPhaseEncode: 9 }, { phaseEncode: 'row' }).kspace);
    expect(hits(difference)).toEqual([(32 + 5) * 64 + 32 + 9]);
  });

  test('is divided by the number of averages', () => {
    const [one, four] = [
      hit(point(64), { kReadout: 5, kPhaseEncode: 6 }),
      hit(point(64), { kReadout: 5, kPhaseEncode: 6 }, { averages: 4 }),
    ];
    const i = (32 + 6) * 64 + 32 + 5;
    const share = (kspace: ComplexPlane) => added(point(64), kspace).re[i] ?? NaN;
    expect(share(one.kspace) / share(four.kspace)).toBeCloseTo(4, 9);
  });

  test('beyond the matrix, or on a line that was not taken, is not received', () => {
    const object = box(64, [20, 40], [20, 50]);
    expect(hits(added(object, hit(object, { kReadout: 200 }).kspace))).toEqual([]);
    const undersampling = { cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 0 } };
    const steps: Step[] = [undersampling, { cause: 'spikes', parameters: { ...given, kReadout: 5, kPhaseEncode: 7 } }];
    const recipe = { steps, reconstruction: { method: 'zero-filled', parameters: {} }, seed: 2 };
    const { kspace } = simulate(object, recipe, { phaseEncode: 'column' });
    expect(kspace.re[(32 + 7) * 64 + 32 + 5]).toBe(0);
  });

  test('shows in the k-space of the magnitude image twice, at k and −k, about half as strong each', () => {
    // Where the object is much brighter than the wave, |I + w| = |I| + Re(w·exp(−iθ)): half to either side.
    const object = box(64, [0, 64], [0, 64]);
    const simulation = hit(object, { amplitude: 2, kReadout: 11, kPhaseEncode: 14 });
    const derived = simulation.kspaceOfImage();
    const A = 0.02 * 64;
    for (const sign of [1, -1]) {
      // The next term of the root is of order (w/I)² = 4e-4 of I, and falls on 2k and 0.
      expect(absolute(derived, 32 + sign * 14, 32 + sign * 11) / (A / 2)).toBeCloseTo(1, 3);
    }
  });
});

describe('Several spikes', () => {
  test('fall anywhere, as many as asked for, the same for the same seed', () => {
    const object = withObjectPhase(box(64, [20, 40], [20, 50]), { range: 1, seed: 1 });
    const difference = added(object, hit(object, { place: 'seeded', count: 12 }).kspace);
    // 12 of 4096 places: two of them fall together in one seed of 60; not in this one.
    expect(hits(difference)).toHaveLength(12);
    expect(hit(object, { place: 'seeded', count: 12 }).image.values).toEqual(hit(object, { place: 'seeded', count: 12 }).image.values);
  });

  test('fall only on lines that were taken', () => {
    const object = box(64, [20, 40], [20, 50]);
    const steps: Step[] = [
      { cause: 'uniform-undersampling', parameters: { accelerationFactor: 4, calibrationLines: 0 } },
      { cause: 'spikes', parameters: { ...given, place: 'seeded', count: 20 } },
    ];
    const recipe = { steps, reconstruction: { method: 'zero-filled', parameters: {} }, seed: 2 };
    const { kspace } = simulate(object, recipe, { phaseEncode: 'column' });
    const clean = transform(object);
    const struck = Array.from(kspace.re.keys()).filter(
      (i) =>
        kspace.taken[i] === 1 &&
        Math.hypot((kspace.re[i] ?? NaN) - (clean.re[i] ?? NaN), (kspace.im[i] ?? NaN) - (clean.im[i] ?? NaN)) > 1e-9,
    );
    // 20 of 1024 places: one in six seeds has none together.
    expect(struck.length).toBeGreaterThanOrEqual(18);
  });

  test('of a burst are neighbours in one readout, each of the same modulus', () => {
    const empty = complexZeros(centredGrid(32, 32, [1e-3, 1e-3]));
    empty.re[16 * 32 + 16] = 32;
    const difference = added(empty, hit(empty, { burst: 5, kReadout: 3, kPhaseEncode: -4 }).kspace);
    const first = (16 - 4) * 32 + 16 + 3;
    expect(hits(difference)).toEqual([0, 1, 2, 3, 4].map((next) => first + next));
    // max |K| of a point of 32 on 32 × 32 is 1.
    for (const i of hits(difference)) expect(Math.hypot(difference.re[i] ?? NaN, difference.im[i] ?? NaN)).toBeCloseTo(0.1, 12);
  });
});
