/** A field that is off: displacement (Jezzard & Balaban 1995), conservation of signal, and loss in a gradient echo. */
import type { Acquisition } from '../../../recon/acquisition';
import { displaced } from '../../../recon/displacement';
import { smoothField } from '../../../recon/field-map';
import { centredGrid } from '../../../recon/grid';
import { encodeOffResonance, sinc } from '../../../recon/off-resonance-encoding';
import { randomOf } from '../../../recon/random';
import { simulate } from '../../../recon/simulate';
import { objectReference } from '../../reference/object';
import { box, noisePlane } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'column' };
const uneven = (parameters: Record<string, number | string>, seed = 1) => ({
  steps: [{ cause: 'off-resonance', parameters: { fieldRange: 0, acrossSlice: 0, imagingFrequency: 64, ...parameters } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed,
});
const centre = (values: Float64Array, of: (i: number) => number): number =>
  values.reduce((sum, value, i) => sum + value * of(i), 0) / values.reduce((sum, value) => sum + value, 0);

describe('A centre frequency that is off moves everything', () => {
  const object = box(90, [40, 50], [30, 60]);
  test('by 0.5 pixels along the readout: 100 Hz at 200 Hz/px', () => {
    const { image } = simulate(object, uneven({ offset: 100, bandwidth: 200, sequence: 'spin-echo' }), acquisition);
    expect(centre(image.values, (i) => i % 90)).toBeCloseTo(44.5 + objectReference.displacement.readout, 9);
    expect(centre(image.values, (i) => Math.floor(i / 90))).toBeCloseTo(44.5, 9);
  });

  test('by 2.655 pixels along the phase encoding of an echo-planar scan: 50 Hz, 0.59 ms a line, 90 lines; half with R = 2', () => {
    const recipe = uneven({ offset: 50, sequence: 'echo-planar', echoSpacing: 0.59 });
    const { echoPlanar } = objectReference.displacement;
    for (const accelerationFactor of [1, 2]) {
      const { image } = simulate(object, recipe, { ...acquisition, accelerationFactor });
      expect(centre(image.values, (i) => Math.floor(i / 90))).toBeCloseTo(44.5 + echoPlanar / accelerationFactor, 9);
    }
  });
});

describe('Displacement', () => {
  /** Twelve pixels in a row, moved by u(x). */
  const moved = (values: number[], u: (x: number) => number, beyond: 'lost' | 'folded' = 'lost'): number[] => {
    const n = values.length;
    const plane = { ...centredGrid(1, n, [1e-3, 1e-3]), re: Float64Array.from(values), im: new Float64Array(n) };
    return [
      ...displaced(
        plane,
        1,
        Float64Array.from(values, (_, x) => u(x)),
        beyond,
      ).re,
    ];
  };

  test('by whole pixels is exact, by parts of one is shared by two', () => {
    expect(moved([0, 1, 2, 0, 0], () => 2)).toEqual([0, 0, 0, 1, 2]);
    expect(moved([0, 4, 0, 0], () => 0.25)).toEqual([0, 3, 1, 0]);
  });

  test('that stretches by a factor of two makes the signal half as dense: the Jacobian 1/|1 + ∂u/∂x|', () => {
    const result = moved(new Array<number>(16).fill(1), (x) => x - 8);
    for (let x = 2; x < 15; x++) expect(result[x]).toBeCloseTo(0.5, 12);
  });

  test('that presses together by two piles up twice the signal', () => {
    const result = moved(new Array<number>(16).fill(1), (x) => -(x - 8) / 2);
    for (const x of [6, 7, 8, 9, 10]) expect(result[x]).toBeCloseTo(2, 12);
  });

  test('onto one place keeps all signal there, and a map that folds over keeps it too', () => {
    const sum = (values: number[]) => values.reduce((total, value) => total + value, 0);
    // Edges of inner pixels meet at 3.2; the outermost reach from there to 2.7 and to 3.7, of which 0.2/0.5 lie in the next pixel.
    expect(moved([1, 1, 1, 1, 1, 1, 1], (x) => 3.2 - x)[3]).toBeCloseTo(6.6, 12);
    expect(sum(moved([0, 0, 1, 2, 3, 0, 0, 0, 0, 0], (x) => 5 - 2 * (x - 3)))).toBeCloseTo(6, 12);
  });

  test('beyond the edge is lost along the readout and comes in again along the phase encoding', () => {
    expect(moved([0, 0, 0, 1], () => 2)).toEqual([0, 0, 0, 0]);
    expect(moved([0, 0, 0, 1], () => 2, 'folded')).toEqual([0, 1, 0, 0]);
    expect(moved([0, 0, 0, 1], () => -9, 'folded')).toEqual([0, 0, 1, 0]);
  });
});

describe('In a gradient echo', () => {
  const even = box(16, [0, 16], [0, 16]);
  test('half a cycle across the slice leaves 2/π of the signal, a whole cycle nothing', () => {
    // 1 ppm of 64 MHz for 1000/128 ms is half a cycle.
    const left = (ppm: number) => {
      const recipe = uneven({ acrossSlice: ppm, sequence: 'gradient-echo', echoTime: 1000 / 128 });
      return simulate(even, recipe, acquisition).image.values[100];
    };
    expect(left(1)).toBeCloseTo(objectReference.halfCycle, 9);
    expect(left(2)).toBeCloseTo(0, 9);
  });

  test('a slope in the plane takes away as much, pixel by pixel, and a spin echo does not mind', () => {
    const field = { hertz: Float64Array.from({ length: 256 }, (_, i) => 50 * (i % 16)), acrossSlice: new Float64Array(256) };
    const readout = { imagingFrequency: 64, bandwidth: 1e9, echoTime: 10, echoSpacing: 0.6 };
    // 50 Hz a pixel for 10 ms is half a cycle; at 10⁹ Hz/px nothing moves by more than 1e-6.
    const echo = encodeOffResonance(even, field, { ...readout, sequence: 'gradient-echo' }, acquisition);
    expect(Math.hypot(echo.re[7 * 16 + 7] ?? NaN, echo.im[7 * 16 + 7] ?? NaN)).toBeCloseTo(objectReference.halfCycle, 5);
    const refocused = encodeOffResonance(even, field, { ...readout, sequence: 'spin-echo' }, acquisition);
    expect(refocused.re[7 * 16 + 7]).toBeCloseTo(1, 5);
  });

  test('the phase at the echo is −2π·Δf·TE', () => {
    const field = { hertz: new Float64Array(256).fill(30), acrossSlice: new Float64Array(256) };
    const readout = { sequence: 'gradient-echo', imagingFrequency: 64, bandwidth: 1e9, echoTime: 5, echoSpacing: 0.6 } as const;
    const { re, im } = encodeOffResonance(even, field, readout, acquisition);
    expect(Math.atan2(im[100] ?? NaN, re[100] ?? NaN)).toBeCloseTo(-2 * Math.PI * 30 * 0.005, 6);
  });

  test('sinc keeps its digits near 0', () => {
    expect(sinc(0)).toBe(1);
    // Both branches at their border, 1e-4 in angle: the next term, x⁴/120, is 1e-18.
    const border = 1e-4 / Math.PI;
    expect(sinc(border * 1.0000001)).toBeCloseTo(sinc(border * 0.9999999), 14);
  });
});

describe('The assumed field', () => {
  test('spreads over the range that was asked for, about 0, and another seed gives another', () => {
    const grid = centredGrid(40, 30, [1e-3, 1e-3]);
    const [one, two] = [1, 2].map((seed) => smoothField(grid, acquisition, randomOf(seed, 'field'), 128));
    expect(Math.max(...(one ?? [])) - Math.min(...(one ?? []))).toBeCloseTo(128, 9);
    expect(Math.max(...(one ?? [])) + Math.min(...(one ?? []))).toBeCloseTo(0, 9);
    expect(one).not.toEqual(two);
  });

  test('moves signal about and loses none of it: a spin echo keeps the sum', () => {
    const object = noisePlane(48, 48);
    const inner = box(48, [12, 36], [12, 36]);
    object.re.forEach((value, i) => (object.re[i] = Math.abs(value) * (inner.re[i] ?? NaN)));
    object.im.fill(0);
    const total = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0);
    for (const sequence of ['spin-echo', 'echo-planar']) {
      const { image } = simulate(object, uneven({ fieldRange: 4, bandwidth: 100, sequence }, 3), acquisition);
      expect(total(image.values)).toBeCloseTo(total(object.re), 8);
      expect(image.values).not.toEqual(object.re);
    }
  });
});
