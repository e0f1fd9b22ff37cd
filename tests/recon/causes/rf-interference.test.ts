/** Interference: where its line falls, how bright it is, which way it runs. */
import type { Acquisition } from '../../../recon/acquisition';
import { inverse, transform } from '../../../recon/fourier';
import { centredGrid, complexZeros } from '../../../recon/grid';
import type { ComplexPlane } from '../../../recon/grid';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { absolute, box } from '../planes';

const quiet = { kind: 'out-of-step', brightness: 50, offset: 3200, drift: 0, bandwidth: 0, phaseStep: 0 };
type Values = Partial<Record<keyof typeof quiet, number | string>>;
const acquisition: Acquisition = { phaseEncode: 'column', bandwidthPerPixel: 200 };

/** Signal 1 everywhere: its P99 is 1, and its k-space is one sample. */
const uniform = (size: number): ComplexPlane => box(size, [0, size], [0, size]);

/** What was added, in the image. */
function interference(size: number, values: Values, scanned: Acquisition = acquisition): ComplexPlane {
  const step = { cause: 'rf-interference', parameters: { ...quiet, ...values } };
  const recipe = { steps: [step], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 4 };
  const { kspace } = simulate(uniform(size), recipe, scanned);
  const clean = transform(uniform(size));
  return inverse({
    ...kspace,
    re: kspace.re.map((re, i) => re - (clean.re[i] ?? NaN)),
    im: kspace.im.map((im, i) => im - (clean.im[i] ?? NaN)),
  });
}

const rootMeanSquare = (values: number[]): number => Math.sqrt(values.reduce((sum, value) => sum + value ** 2, 0) / values.length);
const column = (plane: ComplexPlane, at: number): number[] => Array.from({ length: plane.rows }, (_, row) => absolute(plane, row, at));
const row = (plane: ComplexPlane, at: number): number[] => Array.from({ length: plane.columns }, (_, x) => absolute(plane, at, x));
/** Of the whole plane; the parts of the line that is asked for are taken out. */
const strongestOutside = (plane: ComplexPlane, isLine: (row: number, column: number) => boolean): number =>
  Math.max(
    ...Array.from(plane.re.keys()).map((i) => {
      const [y, x] = [Math.floor(i / plane.columns), i % plane.columns];
      return isLine(y, x) ? 0 : absolute(plane, y, x);
    }),
  );

describe('A tone out of step with the sequence', () => {
  const places = [
    [3200, reference.interferencePlace.inside],
    [40000, reference.interferencePlace.folded],
    [-1000, -5],
  ] as const;
  test.each(places)('of %i Hz at 200 Hz a pixel is a line along the phase encoding, %i px from the centre of 256', (offset, place) => {
    const plane = interference(256, { offset });
    // The phases of the lines are random, their power is not: root mean square exactly what was asked for, half of P99 = 1.
    expect(rootMeanSquare(column(plane, 128 + place))).toBeCloseTo(0.5, 9);
    // Rounding of a recurrence over 256 samples.
    expect(strongestOutside(plane, (_, x) => x === 128 + place)).toBeLessThan(1e-10);
  });

  test('looks like noise along its line: bright and dark dots, Rayleigh distributed', () => {
    const dots = column(interference(256, {}), 144);
    const mean = dots.reduce((sum, value) => sum + value, 0) / dots.length;
    // Root of the mean square over the mean is √(4/π) = 1.128; 256 dots: known to 1.7 %, three times that.
    expect(Math.abs(rootMeanSquare(dots) / mean - Math.sqrt(4 / Math.PI))).toBeLessThan(0.055);
  });

  test('moves to another column with another bandwidth: the frequency stays', () => {
    const plane = interference(64, { offset: 1600 }, { phaseEncode: 'column', bandwidthPerPixel: 400 });
    expect(rootMeanSquare(column(plane, 32 + 4))).toBeCloseTo(0.5, 9);
  });

  test('runs along the rows where these are phase encoded', () => {
    const plane = interference(64, { offset: 1600 }, { phaseEncode: 'row', bandwidthPerPixel: 200 });
    expect(rootMeanSquare(row(plane, 32 + 8))).toBeCloseTo(0.5, 9);
  });

  test('without a bandwidth in the header is placed with 200 Hz a pixel', () => {
    expect(interference(64, {}, { phaseEncode: 'column' })).toEqual(interference(64, {}));
  });

  test('has the same strength on every sample of k-space', () => {
    const kspace = transform(interference(64, {}));
    kspace.re.forEach((re, i) => expect(Math.hypot(re, kspace.im[i] ?? NaN)).toBeCloseTo(0.5 / 8, 11));
  });

  test('that drifts spreads over the columns that it passes', () => {
    const plane = interference(128, { offset: 0, drift: 2000 });
    const powers = Array.from({ length: 128 }, (_, x) => rootMeanSquare(column(plane, x)) ** 2);
    const within = powers.slice(64 - 5, 64 + 6).reduce((sum, power) => sum + power, 0);
    // 2000 Hz at 200 Hz/px are 10 px; a tone between two columns leaks 1/(π·d)² into those at the distance d: 0.03 beyond the sixth on each line.
    expect(within).toBeGreaterThan(0.25 * 0.9);
    expect(Math.max(...powers)).toBeLessThan(0.25 * 0.25);
    // The power of all is that of the tone at rest.
    expect(powers.reduce((sum, power) => sum + power, 0)).toBeCloseTo(0.25, 9);
  });

  test('of a bandwidth B has its half power within B: a Lorentzian', () => {
    const plane = interference(128, { offset: 0, bandwidth: 2000 });
    const powers = Array.from({ length: 128 }, (_, x) => rootMeanSquare(column(plane, x)) ** 2);
    const within = powers.slice(64 - 5, 64 + 6).reduce((sum, power) => sum + power, 0) / 0.25;
    // 11 columns of 10 px full width: (2/π)·atan(1.1) = 0.53. Folded tails and 128 lines: within a tenth.
    expect(Math.abs(within - (2 / Math.PI) * Math.atan(1.1))).toBeLessThan(0.05);
  });
});

describe('A tone in step with the sequence', () => {
  test.each([
    [0, 0],
    [45, -8],
    [90, -16],
    [270, 16],
  ])('whose phase goes on by %i° a line is a dot, %i rows from the centre of 64', (phaseStep, place) => {
    const plane = interference(64, { kind: 'in-step', offset: 1600, phaseStep });
    // All of the line, √64 times as bright, in one pixel: −N·δ/2π along the phase encoding.
    expect(absolute(plane, 32 + place, 32 + 8)).toBeCloseTo(0.5 * 8, 9);
    expect(strongestOutside(plane, (y, x) => y === 32 + place && x === 40)).toBeLessThan(1e-10);
  });
});

describe('Free induction', () => {
  test('is a line along the readout, in the middle of the phase encoding', () => {
    const object = box(64, [20, 44], [25, 38]);
    const step = { cause: 'rf-interference', parameters: { ...quiet, kind: 'free-induction' } };
    const { kspace } = simulate(object, { steps: [step], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 4 }, acquisition);
    const clean = transform(object);
    const plane = inverse({
      ...kspace,
      re: kspace.re.map((re, i) => re - (clean.re[i] ?? NaN)),
      im: kspace.im.map((im, i) => im - (clean.im[i] ?? NaN)),
    });
    expect(rootMeanSquare(row(plane, 32))).toBeCloseTo(0.5, 9);
    expect(strongestOutside(plane, (y) => y === 32)).toBeLessThan(1e-12);
  });

  test('lies at the edge where the RF phase alternates', () => {
    const plane = interference(64, { kind: 'free-induction', phaseStep: 180 });
    expect(rootMeanSquare(row(plane, 0))).toBeCloseTo(0.5, 9);
    expect(strongestOutside(plane, (y) => y === 0)).toBeLessThan(1e-12);
  });
});

test.each(['out-of-step', 'free-induction'])(
  '%s: as bright as asked where the picture is not square, relative to its brightest hundredth',
  (kind) => {
    const object = complexZeros(centredGrid(48, 80, [1e-3, 1e-3]));
    object.re.fill(1).fill(3, 0, 6 * 80);
    const step = { cause: 'rf-interference', parameters: { ...quiet, kind, offset: 1600 } };
    const { kspace } = simulate(object, { steps: [step], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 4 }, acquisition);
    const clean = transform(object);
    const added = inverse({
      ...kspace,
      re: kspace.re.map((re, i) => re - (clean.re[i] ?? NaN)),
      im: kspace.im.map((im, i) => im - (clean.im[i] ?? NaN)),
    });
    expect(rootMeanSquare(kind === 'free-induction' ? row(added, 24) : column(added, 40 + 8))).toBeCloseTo(0.5 * 3, 9);
  },
);
