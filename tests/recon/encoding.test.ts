/** The textbook relations of spatial encoding. Common practice, unless a source stands beside the check. */
import {
  fatShiftPixels,
  frequencyAt,
  ghostPosition,
  gyromagneticRatio,
  hertzPerMetre,
  phaseOfArea,
  readoutGradient,
  readoutTime,
  sliceThickness,
  vialSignal,
} from '../../recon/encoding';
import { inverseAlong, transform } from '../../recon/fourier';
import { centredGrid } from '../../recon/grid';
import { reference } from '../reference/values';
import { largestDifference, noisePlane } from './planes';

test('The gyromagnetic ratio is that of CODATA 2018', () => {
  expect(gyromagneticRatio / 1e6).toBe(reference.gyromagneticRatio);
});

describe('A readout gradient', () => {
  const n = 128;
  const pixel = 1.5e-3;
  const bandwidth = 200;
  const gradient = readoutGradient(bandwidth, pixel);

  test('spreads one bandwidth per pixel over one pixel', () => {
    expect(frequencyAt(gradient, pixel)).toBeCloseTo(bandwidth, 9);
    expect(hertzPerMetre(bandwidth, pixel)).toBeCloseTo(frequencyAt(gradient, 1), 6);
    expect(readoutTime(bandwidth)).toBe(1 / 200);
    // 200 Hz/px on 1.5 mm: 3.13155 mT/m, worked by hand: 200/(42.577e6 · 1.5e-3).
    expect(gradient).toBeCloseTo(3.13155e-3, 8);
  });

  test('turns three unequal vials into three lines, γ̄·G·Δx apart, as high as the vials are full', () => {
    const vials = [
      { amount: 1, x: -30e-3 },
      { amount: 0.4, x: 0 },
      { amount: 2.5, x: 18e-3 },
    ];
    const dwell = 1 / (n * bandwidth);
    const signal = vialSignal(vials, gradient, dwell, n);
    const line = inverseAlong({ ...centredGrid(1, n, [1, bandwidth]), ...signal }, 1);
    const height = (column: number) => Math.hypot(line.re[column] ?? NaN, line.im[column] ?? NaN) / Math.sqrt(n);
    const columns = vials.map(({ x }) => n / 2 + frequencyAt(gradient, x) / bandwidth);
    expect(columns).toEqual([44, 64, 76].map((column) => expect.closeTo(column, 9)));
    vials.forEach(({ amount }, i) => expect(height(Math.round(columns[i] ?? NaN))).toBeCloseTo(amount, 9));
    // Nothing in between: the vials sit on whole pixels.
    expect(height(50)).toBeCloseTo(0, 9);
    expect(frequencyAt(gradient, 18e-3) - frequencyAt(gradient, -30e-3)).toBeCloseTo(gyromagneticRatio * gradient * 48e-3, 6);
  });

  test('needs a sample', () => {
    expect(() => vialSignal([], gradient, 1e-5, 0)).toThrow('nSamples must be at least 1, got 0');
  });
});

describe('The line without phase encoding', () => {
  test.each([
    [32, 24],
    [31, 15],
  ])('of %i × %i is the projection of the object along the phase encoding', (rows, columns) => {
    const object = noisePlane(rows, columns);
    const kspace = transform(object);
    const centre = Math.floor(rows / 2);
    const line = {
      ...centredGrid(1, columns, [1, kspace.spacing[1]]),
      re: kspace.re.slice(centre * columns, (centre + 1) * columns),
      im: kspace.im.slice(centre * columns, (centre + 1) * columns),
    };
    const projection = inverseAlong(line, 1);
    for (let column = 0; column < columns; column++) {
      let sum = 0;
      for (let row = 0; row < rows; row++) sum += object.re[row * columns + column] ?? NaN;
      expect(projection.re[column]).toBeCloseTo(sum / Math.sqrt(rows), 12);
    }
  });
});

describe('The area of a gradient', () => {
  const pixel = 1e-3;
  const n = 24;
  /** Area that winds `turns` cycles over the field of view. */
  const areaOf = (turns: number) => turns / (gyromagneticRatio * n * pixel);

  /** The object after a gradient of this area along an axis: each place turned by its phase. */
  function afterGradient(axis: 0 | 1, area: number) {
    const object = noisePlane(n, n);
    const re = object.re.slice();
    const im = object.im.slice();
    for (let i = 0; i < n * n; i++) {
      const position = ((axis === 0 ? Math.floor(i / n) : i % n) - n / 2) * pixel;
      const phase = phaseOfArea(area, position);
      re[i] = (object.re[i] ?? NaN) * Math.cos(phase) - (object.im[i] ?? NaN) * Math.sin(phase);
      im[i] = (object.re[i] ?? NaN) * Math.sin(phase) + (object.im[i] ?? NaN) * Math.cos(phase);
    }
    return { ...object, re, im };
  }

  /** k-space with line or column k + shift where k was. */
  function shifted(axis: 0 | 1, shift: number) {
    const kspace = transform(noisePlane(n, n));
    const at = (row: number, column: number) => ((row + n) % n) * n + ((column + n) % n);
    const from = (i: number) => at(Math.floor(i / n) + (axis === 0 ? shift : 0), (i % n) + (axis === 1 ? shift : 0));
    return { ...kspace, re: kspace.re.map((_, i) => kspace.re[from(i)] ?? NaN), im: kspace.im.map((_, i) => kspace.im[from(i)] ?? NaN) };
  }

  test.each([0, 1] as const)('moves k-space along axis %i by the cycles that it winds over the field of view', (axis) => {
    expect(largestDifference(transform(afterGradient(axis, areaOf(3))), shifted(axis, 3))).toBeLessThan(1e-12);
  });

  test('gives the same phase ramp whatever gradient and time make it up, along either axis', () => {
    const x = 42e-3;
    // 10 mT/m for 1 ms and 2 mT/m for 5 ms.
    expect(phaseOfArea(10e-3 * 1e-3, x)).toBeCloseTo(phaseOfArea(2e-3 * 5e-3, x), 9);
  });

  test('of reversed polarity gives the conjugate ramp, and moves k-space the other way', () => {
    expect(phaseOfArea(-areaOf(2), 5e-3)).toBe(-phaseOfArea(areaOf(2), 5e-3));
    expect(largestDifference(transform(afterGradient(0, -areaOf(2))), shifted(0, -2))).toBeLessThan(1e-12);
  });
});

describe('The slice', () => {
  test('is half as thick for half the bandwidth of the pulse, or for twice the gradient', () => {
    const thickness = sliceThickness(2000, 10e-3);
    // 2 kHz under 10 mT/m: 2000/(42.577e6 · 0.01) = 4.70 mm, worked by hand.
    expect(thickness).toBeCloseTo(4.697e-3, 6);
    expect(sliceThickness(1000, 10e-3)).toBeCloseTo(thickness / 2, 15);
    expect(sliceThickness(2000, 20e-3)).toBeCloseTo(thickness / 2, 15);
  });
});

describe('Fat', () => {
  test('is shifted by 3.5 ppm of the imaging frequency over the bandwidth of a pixel', () => {
    const larmor = (tesla: number) => gyromagneticRatio * tesla;
    expect(fatShiftPixels(larmor(1.5), 130)).toBeCloseTo(reference.fatShift.at1T5, 6);
    expect(fatShiftPixels(larmor(3), 440)).toBeCloseTo(reference.fatShift.at3T, 6);
    expect(fatShiftPixels(123.25e6, 1)).toBeCloseTo(reference.fatShiftHertz, 9);
  });
});

describe('The first ghost of a motion', () => {
  test('falls at frac(TR · averages · f) of the phase field of view (Wood & Henkelman 1985)', () => {
    expect(256 * ghostPosition(0.5, 1, 0.25)).toBeCloseTo(reference.ghostShift256, 9);
    expect(192 * ghostPosition(2.3, 1, 1.2)).toBeCloseTo(reference.ghostShift192, 9);
    expect(256 * ghostPosition(0.03, 1, 1.1)).toBeCloseTo(reference.ghostShiftHeart, 9);
    expect(ghostPosition(0.5, 2, 0.3)).toBeCloseTo(0.3, 12);
  });
});
