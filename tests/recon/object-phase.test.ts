import { objectPhase, withObjectPhase } from '../../recon/object-phase';
import { absolute, noisePlane } from './planes';

describe('The synthetic phase of an object', () => {
  test.each([
    [64, 64],
    [31, 50],
    [2, 3],
  ])('spreads over exactly its range on %i × %i pixels', (rows, columns) => {
    for (const range of [0.5, 1.6, 2 * Math.PI]) {
      const theta = objectPhase({ rows, columns }, { range, seed: 3 });
      expect(Math.max(...theta) - Math.min(...theta)).toBeCloseTo(range, 12);
    }
  });

  test('is smooth: from pixel to pixel it changes by a few hundredths of its range', () => {
    const theta = objectPhase({ rows: 64, columns: 64 }, { range: 1, seed: 8 });
    // A quadratic over 63 steps changes by at most 4/63 of its range a step (a parabola with its vertex at one edge: 2/63 · range · 2).
    for (let i = 0; i < 64 * 63; i++) expect(Math.abs((theta[i + 64] ?? NaN) - (theta[i] ?? NaN))).toBeLessThan(4 / 63);
  });

  test('is quadratic: third differences along a row vanish', () => {
    const theta = objectPhase({ rows: 9, columns: 9 }, { range: 2, seed: 4 });
    const [a = NaN, b = NaN, c = NaN, d = NaN] = theta.subarray(9, 13);
    expect(d - 3 * c + 3 * b - a).toBeCloseTo(0, 12);
  });

  test('comes from its seed alone', () => {
    const phase = (seed: number) => objectPhase({ rows: 8, columns: 8 }, { range: 1, seed });
    expect(phase(5)).toEqual(phase(5));
    expect(phase(5)).not.toEqual(phase(6));
  });

  test('turns the object and leaves its magnitude', () => {
    const object = noisePlane(12, 10);
    const turned = withObjectPhase(object, { range: 3, seed: 1 });
    expect(absolute(turned, 5, 5)).toBeCloseTo(absolute(object, 5, 5), 12);
    const angle = objectPhase(object, { range: 3, seed: 1 })[17] ?? NaN;
    const i = 17;
    expect(turned.re[i]).toBeCloseTo((object.re[i] ?? NaN) * Math.cos(angle) - (object.im[i] ?? NaN) * Math.sin(angle), 12);
    expect(turned.im[i]).toBeCloseTo((object.re[i] ?? NaN) * Math.sin(angle) + (object.im[i] ?? NaN) * Math.cos(angle), 12);
  });

  test('has no spread on a single pixel, and refuses more than a full turn', () => {
    expect(objectPhase({ rows: 1, columns: 1 }, { range: 1, seed: 1 }).every(Number.isFinite)).toBe(true);
    expect(() => objectPhase({ rows: 8, columns: 8 }, { range: 7, seed: 1 })).toThrow('objectPhase.range must be 0 to 2π, got 7');
  });
});
