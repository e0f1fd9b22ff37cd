import { magnitude } from '../../../recon/grid';
import type { Plane } from '../../../recon/grid';
import { ghostRatio, objectMask } from '../../../recon/metrics/ghost-ratio';
import { box } from '../planes';

/** An object of 100 with a faint ghost behind it along the rows' direction, over a floor of 1. */
function ghosted(ghost: number): Plane {
  const plane = magnitude(box(64, [24, 40], [20, 44]));
  const values = plane.values.map((value) => 1 + 99 * value);
  for (let row = 0; row < 64; row++)
    for (let column = 20; column < 44; column++) if (values[row * 64 + column] === 1) values[row * 64 + column] = ghost;
  return { ...plane, values };
}

describe('Ghost ÷ signal', () => {
  test('is the mean of the air before and behind the object along the phase encoding, over the mean of the object', () => {
    const ratio = ghostRatio(ghosted(8), 'column');
    expect(ratio.regions.object).toEqual({ nPixels: 16 * 24, mean: 100 });
    expect(ratio.regions.ghost.mean).toBeCloseTo(8, 12);
    expect(ratio.regions.otherAir.mean).toBeCloseTo(1, 12);
    expect(ratio.value).toBeCloseTo(0.08, 12);
    expect(ratio).not.toHaveProperty('because');
  });

  test('does not count that ghost where the phase encoding runs the other way', () => {
    const ratio = ghostRatio(ghosted(8), 'row');
    expect(ratio.value).toBeCloseTo(0.01, 12);
    expect(ratio.regions.otherAir.mean).toBeGreaterThan(3);
  });

  test('counts holes of the object to the object', () => {
    const plane = ghosted(1);
    plane.values[32 * 64 + 32] = 0;
    expect(objectMask(plane)[32 * 64 + 32]).toBe(1);
    expect(ghostRatio(plane, 'column').regions.object.nPixels).toBe(16 * 24);
  });

  test('is not measurable where the object leaves no air along the phase encoding, and says so', () => {
    const full = magnitude(box(64, [0, 64], [20, 44]));
    const ratio = ghostRatio({ ...full, values: full.values.map((value) => 1 + 99 * value) }, 'column');
    expect(ratio.value).toBeNull();
    expect(ratio.because).toBe('the object leaves no air along the phase encoding');
  });

  test('is not measurable where the air is blanked or the picture empty, and says so', () => {
    expect(ghostRatio(magnitude(box(64, [24, 40], [20, 44])), 'column').because).toMatch(/blanked/);
    expect(ghostRatio(magnitude(box(64, [0, 0], [0, 0])), 'column').because).toMatch(/no object/);
  });
});
