/** Signed difference and reading between samples: closed forms of bilinear interpolation on linear ramps, which it keeps exactly. */
import { differencePlane, valueAtMm } from '@/components/image/difference';
import { valueAt, type DisplayPlane } from '@/components/image/display-plane';

const plane = (rows: number, columns: number, spacing: number, value: (y: number, x: number) => number): DisplayPlane => {
  const origin = [-Math.floor(rows / 2) * spacing, -Math.floor(columns / 2) * spacing] as const;
  const samples = Uint16Array.from({ length: rows * columns }, (_, i) =>
    value(origin[0] + Math.floor(i / columns) * spacing, origin[1] + (i % columns) * spacing),
  );
  return { name: 'image', rows, columns, spacing: [spacing, spacing], origin, low: 0, high: 65535, samples };
};

describe('a difference', () => {
  const bad = plane(8, 8, 1, (y, x) => 1000 + 10 * y + 20 * x);

  it('is nothing between a picture and itself', () => {
    const difference = differencePlane(bad, bad, 1);
    // Zero lies between two of the 65,536 samples: half a step of ±1 at most.
    expect(Math.abs(valueAt(difference, 3, 3) ?? 1)).toBeLessThan(2 / 65535);
  });

  it('is bad minus gain times simulated, with its sign', () => {
    const half = plane(8, 8, 1, (y, x) => 500 + 5 * y + 10 * x);
    const difference = differencePlane(bad, half, 1);
    const expected = 500 + 5 * -4 + 10 * 3;
    // One step of the 16-bit scale between ± the peak, 520.
    expect(Math.abs((valueAt(difference, 0, 7) ?? 0) - expected)).toBeLessThan((2 * 550) / 65535);
    expect(valueAt(differencePlane(half, bad, 1), 0, 7)).toBeLessThan(0);
    expect(Math.abs(valueAt(differencePlane(bad, half, 2), 4, 4) ?? 1)).toBeLessThan(2 / 65535);
  });

  it('compares millimetre with millimetre where the grids differ', () => {
    const coarse = plane(4, 4, 2, (y, x) => 1000 + 10 * y + 20 * x);
    expect(valueAtMm(coarse, -1, 1)).toBeCloseTo(1010, 9);
    const difference = differencePlane(bad, coarse, 1);
    expect(Math.abs(valueAt(difference, 3, 5) ?? 1)).toBeLessThan(2 / 65535);
  });

  it('says nothing where the simulated picture does not reach', () => {
    const narrow = plane(4, 8, 1, () => 0);
    expect(valueAtMm(narrow, -4, 0)).toBeNull();
    const difference = differencePlane(bad, narrow, 1);
    expect(Math.abs(valueAt(difference, 0, 0) ?? 1)).toBeLessThan(2100 / 65535);
  });
});
