/** Ghosts of periodic motion: where they fall (Wood & Henkelman, Med Phys 1985;12:143) and how bright they are (Jacobi–Anger). */
import { jv } from 'cephes';
import type { Acquisition } from '../../../recon/acquisition';
import { centredGrid, complexZeros } from '../../../recon/grid';
import type { Plane } from '../../../recon/grid';
import { transform } from '../../../recon/fourier';
import { simulate } from '../../../recon/simulate';
import { objectReference } from '../../reference/object';
import { reference } from '../../reference/values';
import { box, energy, noisePlane } from '../planes';

const motion = (frequency: number, phaseSwing: number, start = 0) => ({
  cause: 'periodic-motion',
  parameters: { frequency, phaseSwing, start },
});
const recipeOf = (...steps: { cause: string; parameters: Record<string, number | string> }[]) => ({
  steps,
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});
const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.5, averages: 1 };

/** A blob with smooth edges about the centre row: its ghosts can be placed to a part of a pixel. */
function blob(rows: number): ReturnType<typeof complexZeros> {
  const plane = complexZeros(centredGrid(rows, 1, [1e-3, 1e-3]));
  for (let row = 0; row < rows; row++) plane.re[row] = Math.exp(-((row - Math.floor(rows / 2)) ** 2) / (2 * 3 ** 2));
  return plane;
}

/** Centre of mass of the image within 12 rows of `near`, counted from the centre row. */
function centreOfMass({ values, rows }: Plane, near: number): number {
  let sum = 0;
  let moment = 0;
  for (let d = Math.round(near) - 12; d <= Math.round(near) + 12; d++) {
    const value = values[Math.floor(rows / 2) + d] ?? NaN;
    sum += value;
    moment += value * d;
  }
  return moment / sum;
}

describe('Where ghosts fall', () => {
  const places = [
    [256, 0.5, 0.25, reference.ghostShift256],
    [192, 2.3, 1.2, reference.ghostShift192],
  ] as const;
  test.each(places)('%i lines, TR %f s, %f Hz: %f px along the phase encoding, on both sides', (rows, repetitionTime, f, shift) => {
    const { image } = simulate(blob(rows), recipeOf(motion(f, 0.3)), { ...acquisition, repetitionTime });
    for (const side of [-1, 1]) {
      // The second ghost, J2/J1 = 0.07 of the first and at twice the distance, has no part within 12 rows; the tail of a broken period
      // (the lines do not hold a whole number of cycles) moves the centre of mass by up to a tenth of a pixel.
      expect(Math.abs(centreOfMass(image, side * shift) - side * shift)).toBeLessThan(0.15);
    }
  });

  test('Averages lengthen the time from line to line: two averages of half the TR give the same ghosts', () => {
    const one = simulate(blob(128), recipeOf(motion(0.3, 0.5)), { ...acquisition, repetitionTime: 0.8, averages: 1 });
    const two = simulate(blob(128), recipeOf(motion(0.3, 0.5)), { ...acquisition, repetitionTime: 0.4, averages: 2 });
    expect(two.image.values).toEqual(one.image.values);
  });

  test('Without TR in the header 500 ms is assumed, as the description says', () => {
    const assumed = simulate(blob(128), recipeOf(motion(0.3, 0.5)), { phaseEncode: 'column' });
    const stated = simulate(blob(128), recipeOf(motion(0.3, 0.5)), acquisition);
    expect(assumed.image.values).toEqual(stated.image.values);
  });

  test('Skipped lines take no time: with R = 2 the first ghost falls at frac(TR·f)/2 of the field of view', () => {
    const undersampling = { cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 0 } };
    // Derived from the line count: of 256 lines 128 are taken, 0.5 s · 0.25 Hz = 1/8 cycle apart, so 16 px and copies 128 px on.
    const { image } = simulate(blob(256), recipeOf(motion(0.25, 0.5), undersampling), acquisition);
    const at = (d: number) => image.values[128 + d] ?? NaN;
    expect(at(16) / at(0)).toBeCloseTo(jv(1, 0.5) / jv(0, 0.5), 3);
    expect(at(32)).toBeLessThan(0.2 * at(16));
  });
});

describe('How bright ghosts are', () => {
  // 64 lines, 1/8 cycle a line: whole cycles, ghosts 8 px apart, object 6 px: orders do not overlap but for n and n ± 8.
  test.each([0.25, 0.5, 1, 2] as const)('With a swing of %f rad the ghost of order j has the amplitude J_j', (swing) => {
    const { image } = simulate(box(64, [29, 35], [20, 44]), recipeOf(motion(0.25, swing, 40)), acquisition);
    const brightness = (order: number) => image.values[(32 + 8 * order) * 64 + 30] ?? NaN;
    for (const order of [0, 1, 2, 3]) {
      // Orders j − 8 and j + 8 fall on order j: at a swing of 2, J_5 = 0.007 falls on J_3 and J_7 = 1.7e-4 on J_1.
      const overlap = Math.abs(jv(8 - order, swing)) + Math.abs(jv(8 + order, swing));
      expect(Math.abs(brightness(order) - Math.abs(jv(order, swing)))).toBeLessThanOrEqual(overlap + 1e-9);
      expect(Math.abs(jv(order, swing) - (reference.bessel[swing][order] ?? NaN))).toBeLessThan(1e-9);
    }
  });

  test('16 cycles over 128 lines give the ratio of the outside simulation', () => {
    // 0.5 s · 0.25 Hz · 128 = 16 cycles: ghosts 16 px away.
    const { image } = simulate(box(128, [40, 60], [50, 70]), recipeOf(motion(0.25, 0.5)), acquisition);
    const ratio = (image.values[(50 + 16) * 128 + 60] ?? NaN) / (image.values[50 * 128 + 60] ?? NaN);
    // 1e-6 is the tolerance of the reference. Its phase starts at the centre line, which turns the ghost but leaves its modulus only
    // where nothing overlaps: rows 50 and 66 are 4 px clear of the second order.
    expect(ratio).toBeCloseTo(reference.phaseGhostRatio, 6);
  });
});

describe('What k-space shows', () => {
  test('That of the magnitude image has bands across the phase encoding: J0 + 2 Σ |J_j| cos(2π·ky·j·d/N) where ghosts stand clear', () => {
    const object = box(64, [29, 35], [20, 44]);
    const before = transform(object);
    const after = simulate(object, recipeOf(motion(0.25, 0.25)), acquisition).kspaceOfImage();
    for (const ky of [1, 2, 5, 6]) {
      const i = (32 + ky) * 64 + 32;
      const bands = [1, 2, 3].reduce((sum, j) => sum + 2 * jv(j, 0.25) * Math.cos((2 * Math.PI * ky * j) / 8), jv(0, 0.25));
      // The fourth order, J_4(0.25) = 1e-5, is left out, twice.
      expect(Math.abs((after.re[i] ?? NaN) / (before.re[i] ?? NaN) - bands)).toBeLessThan(3e-5);
    }
  });

  test('The phase of the lines swings, their magnitude stays', () => {
    const object = noisePlane(32, 8);
    const before = transform(object);
    const { kspace } = simulate(object, recipeOf(motion(0.4, 1)), acquisition);
    kspace.re.forEach((re, i) => {
      expect(Math.hypot(re, kspace.im[i] ?? NaN)).toBeCloseTo(Math.hypot(before.re[i] ?? NaN, before.im[i] ?? NaN), 12);
    });
    expect(energy(kspace)).toBeCloseTo(energy(before), 8);
    const line = 5;
    const turn =
      Math.atan2(kspace.im[line * 8] ?? NaN, kspace.re[line * 8] ?? NaN) -
      Math.atan2(before.im[line * 8] ?? NaN, before.re[line * 8] ?? NaN);
    // a·sin(2π·f·T·n + φ), n counted from the first line.
    expect(Math.cos(turn)).toBeCloseTo(Math.cos(Math.sin(2 * Math.PI * 0.4 * 0.5 * line)), 12);
    expect(Math.sin(turn)).toBeCloseTo(Math.sin(Math.sin(2 * Math.PI * 0.4 * 0.5 * line)), 12);
  });
});

describe('What else can move', () => {
  const moving = (parameters: Record<string, number | string>) =>
    recipeOf({ cause: 'periodic-motion', parameters: { frequency: 0.25, start: 0, ...parameters } });

  test('A brightness that changes by 20 % has ghosts of a tenth, one on each side', () => {
    const { image } = simulate(box(128, [40, 60], [50, 70]), moving({ moves: 'amplitude', modulation: 0.2 }), acquisition);
    for (const side of [-1, 1]) {
      // 1e-9 is the tolerance of the reference; rows 50 and 50 ± 16 are clear of one another.
      expect(image.values[((50 + side * 16 + 128) % 128) * 128 + 60]).toBeCloseTo(0.5 * 0.2, 9);
    }
    expect(objectReference.brightnessGhost).toBe(0.5 * 0.2);
  });

  test('A displacement along the phase encoding turns line k by −2πk·A·sin(ωt)/N: 3 mm are 2 pixels of 1.5 mm', () => {
    const point = complexZeros(centredGrid(64, 4, [1.5e-3, 1e-3]));
    point.re[32 * 4 + 2] = 1;
    const { kspace } = simulate(point, moving({ moves: 'along-phase-encode', displacement: 3 }), acquisition);
    for (let line = 0; line < 64; line++) {
      const expected = (-2 * Math.PI * (line - 32) * 2 * Math.sin(2 * Math.PI * 0.125 * line)) / 64;
      const i = line * 4 + 1;
      const turn = Math.atan2(kspace.im[i] ?? NaN, kspace.re[i] ?? NaN) - expected;
      expect(Math.cos(turn)).toBeCloseTo(1, 12);
    }
  });

  test('A displacement along the readout still ghosts along the phase encoding, J_j(2πk·A/M) at readout frequency k', () => {
    // A bar that is one wave of frequency 4 along the readout: all of its signal has k = ±4.
    const wave = complexZeros(centredGrid(64, 32, [1e-3, 1e-3]));
    for (let row = 29; row < 35; row++) {
      for (let column = 0; column < 32; column++) wave.re[row * 32 + column] = Math.cos((2 * Math.PI * 4 * column) / 32);
    }
    const { image } = simulate(wave, moving({ moves: 'along-readout', displacement: 1 }), acquisition);
    const a = (2 * Math.PI * 4 * 1) / 32;
    // Ghosts 8 rows away; an odd order of a real wave is a sine where its parent is a cosine, so that peaks are compared.
    const peak = (row: number) => Math.max(...image.values.subarray(row * 32, row * 32 + 32));
    expect(Math.abs(peak(31) - jv(0, a))).toBeLessThan(1e-6);
    expect(Math.abs(peak(31 + 8) - jv(1, a))).toBeLessThan(2 * jv(7, a) + 1e-9);
    expect(Math.abs(peak(31 + 16) - jv(2, a))).toBeLessThan(2 * jv(6, a) + 1e-9);
  });

  test('Edges ghost more than what is even: a displaced bar has its ghosts at its ends', () => {
    const { image } = simulate(box(64, [26, 38], [20, 44]), moving({ moves: 'along-readout', displacement: 1 }), acquisition);
    const ghost = (column: number) => image.values[(32 + 8) * 64 + column] ?? NaN;
    expect(ghost(20)).toBeGreaterThan(5 * ghost(32));
  });
});

describe('Averages', () => {
  const swing = { moves: 'amplitude', modulation: 0.3, frequency: 0.25 };
  const four: Acquisition = { ...acquisition, averages: 4 };
  /** How much the first line of a point is brighter than the still one. */
  const first = (parameters: Record<string, number | string>, of: Acquisition) => {
    const point = complexZeros(centredGrid(16, 1, [1e-3, 1e-3]));
    point.re[8] = 1;
    const { kspace } = simulate(point, recipeOf({ cause: 'periodic-motion', parameters: { ...swing, ...parameters } }), of);
    return kspace.re.map((re) => re * 4 - 1);
  };

  test('as the inner loop leave |sin(πf·TR·A)/(A·sin(πf·TR))| of the swing: 0.653 for four at 0.25 Hz and 0.5 s', () => {
    // The middle of four averages lies 0.75 s after the first, 67.5°: started that much before, the first line holds the crest.
    const [left, next] = first({ averaging: 'inner-loop', start: 292.5 }, four);
    const attenuation = Math.abs(Math.sin(Math.PI * 0.25 * 0.5 * 4) / (4 * Math.sin(Math.PI * 0.25 * 0.5)));
    expect((left ?? NaN) / 0.3).toBeCloseTo(attenuation, 12);
    // The next line comes four TR later, half a cycle: the trough.
    expect((next ?? NaN) / 0.3).toBeCloseTo(-attenuation, 12);
    expect(attenuation).toBeCloseTo(objectReference.innerLoopAttenuation, 3);
  });

  test('as the outer loop leave one TR between lines, and average what each pass saw', () => {
    // 16 lines of 0.5 s are two whole cycles: every pass sees the same, and nothing is averaged away.
    const once = first({ averaging: 'left-over', start: 10 }, { ...acquisition, averages: 1 });
    const passes = first({ averaging: 'outer-loop', start: 10 }, four);
    passes.forEach((value, line) => expect(value).toBeCloseTo(once[line] ?? NaN, 12));
    // At 0.28125 Hz a pass is two and a quarter cycles: four passes, a quarter of a cycle apart, average to nothing.
    first({ averaging: 'outer-loop', frequency: 0.28125 }, four).forEach((value) => expect(value).toBeCloseTo(0, 12));
  });

  test('leave the swing as it is given when it is what they leave', () => {
    expect(first({ averaging: 'left-over', start: 0 }, four)[0]).toBeCloseTo(0.3, 12);
  });
});

test('Passes of the outer loop last as long as the lines that are taken', () => {
  const undersampling = { cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 0 } };
  const swinging = { moves: 'amplitude', modulation: 0.3, frequency: 0.25, averaging: 'outer-loop', start: 0 };
  const point = complexZeros(centredGrid(12, 1, [1e-3, 1e-3]));
  point.re[6] = 1;
  const recipe = recipeOf(undersampling, { cause: 'periodic-motion', parameters: swinging });
  const { kspace } = simulate(point, recipe, { ...acquisition, averages: 2 });
  // Six of twelve lines are taken, so that the second pass begins after 3 s, three quarters of a cycle: cos 0 and cos 270° on the first.
  expect((kspace.re[0] ?? NaN) * Math.sqrt(12)).toBeCloseTo(1 + (0.3 * (1 + Math.cos(1.5 * Math.PI))) / 2, 12);
});
