/** Wrap-around as the folded complex sum, and as k-space on a wider raster. */
import type { Acquisition } from '../../../recon/acquisition';
import { fieldOfViewReduction } from '../../../recon/causes/field-of-view-reduction';
import { inverse, transform } from '../../../recon/fourier';
import type { ComplexPlane } from '../../../recon/grid';
import { centredGrid, complexZeros } from '../../../recon/grid';
import { fullyTaken } from '../../../recon/lines';
import { withObjectPhase } from '../../../recon/object-phase';
import { randomOf } from '../../../recon/random';
import { simulate } from '../../../recon/simulate';
import { box, largestDifference, noisePlane } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'column' };
const context = { acquisition, random: randomOf(1, 'test') };

const wrapped = (object: ComplexPlane, fraction: number, offCentre = 0): ComplexPlane => {
  if (fieldOfViewReduction.domain === 'image') throw Error('acts on k-space');
  return inverse(fieldOfViewReduction.apply(fullyTaken(transform(object)), { fraction, offCentre }, context));
};

/** I'(y) = Σ_m I(y + y0 + m·n), written out: every y of the object goes to the pixel of the window that it is a multiple of n from. */
function folded(object: ComplexPlane, n: number, y0: number): ComplexPlane {
  const result = complexZeros(centredGrid(n, object.columns, object.spacing));
  for (let row = 0; row < n; row++) {
    const y = row - Math.floor(n / 2);
    for (let m = -4; m <= 4; m++) {
      const from = y + y0 + m * n + Math.floor(object.rows / 2);
      if (from < 0 || from >= object.rows) continue;
      for (let x = 0; x < object.columns; x++) {
        result.re[row * object.columns + x] = (result.re[row * object.columns + x] ?? NaN) + (object.re[from * object.columns + x] ?? NaN);
        result.im[row * object.columns + x] = (result.im[row * object.columns + x] ?? NaN) + (object.im[from * object.columns + x] ?? NaN);
      }
    }
  }
  return result;
}

describe('Wrap-around', () => {
  // Common practice: sampling k-space 1/r more coarsely repeats the image at r of the field of view.
  const cases = [
    [64, 0.75, 0],
    [63, 0.75, 0],
    [64, 0.7, 0.1],
    [51, 0.5, -0.2],
    [64, 1, 0.25],
  ] as const;
  test.each(cases)('of %i lines to %f of the field of view, centre moved by %f, is the folded complex sum', (rows, r, offCentre) => {
    const object = noisePlane(rows, 10);
    const expected = folded(object, Math.round(r * rows), Math.round(offCentre * rows));
    // Two transforms there and two back, of samples about 5: rounding.
    expect(largestDifference(wrapped(object, r, offCentre), expected)).toBeLessThan(1e-13);
  });

  test('to half the field of view takes every second line of k-space', () => {
    if (fieldOfViewReduction.domain === 'image') throw Error('acts on k-space');
    const kspace = transform(noisePlane(32, 6));
    const half = fieldOfViewReduction.apply(fullyTaken(kspace), { fraction: 0.5, offCentre: 0 }, context);
    for (let k = -8; k < 8; k++) {
      // Orthonormal on half as many lines: √2 larger.
      expect(half.re[(k + 8) * 6]).toBeCloseTo(Math.SQRT2 * (kspace.re[(2 * k + 16) * 6] ?? NaN), 12);
    }
    expect(half.spacing[0]).toBeCloseTo(2 * kspace.spacing[0], 9);
  });

  test('keeps the pixel size and centres the new, smaller window', () => {
    const recipe = {
      steps: [{ cause: 'field-of-view-reduction', parameters: { fraction: 0.75, offCentre: 0 } }],
      reconstruction: { method: 'zero-filled', parameters: {} },
      seed: 1,
    };
    const { image } = simulate(box(64, [4, 60], [20, 40]), recipe, acquisition);
    expect([image.rows, image.columns]).toEqual([48, 64]);
    expect(image.spacing[0]).toBeCloseTo(1e-3, 15);
    expect(image.origin[0]).toBeCloseTo(-24e-3, 15);
  });

  test('brings what reaches out on one side in on the other, and adds before the magnitude: opposite phases subtract', () => {
    const inPhase = box(64, [2, 62], [20, 40]);
    const image = wrapped(inPhase, 0.75);
    // 60 rows in 48: 6 rows at each edge lie twofold.
    expect(image.re[2 * 64 + 30]).toBeCloseTo(2, 12);
    expect(image.re[24 * 64 + 30]).toBeCloseTo(1, 12);
    const turned = withObjectPhase(inPhase, { range: Math.PI, seed: 4 });
    const complexSum = wrapped(turned, 0.75);
    const moduli = Array.from({ length: 6 }, (_, row) =>
      Math.hypot(complexSum.re[row * 64 + 30] ?? NaN, complexSum.im[row * 64 + 30] ?? NaN),
    );
    expect(Math.min(...moduli)).toBeLessThan(1.9);
  });

  test('leaves no line out: k-space does not show it', () => {
    if (fieldOfViewReduction.domain === 'image') throw Error('acts on k-space');
    const { taken } = fieldOfViewReduction.apply(fullyTaken(noisePlane(20, 4)), { fraction: 0.6, offCentre: 0 }, context);
    expect(taken).toEqual(new Uint8Array(48).fill(1));
  });

  test('starts with the fraction of the header where that is below one', () => {
    const { fraction } = fieldOfViewReduction.parameters;
    const read = fraction?.kind === 'quantity' ? fraction.fromHeader?.read : undefined;
    expect(read?.({ ...acquisition, phaseFieldOfViewFraction: 0.8 })).toBe(0.8);
    expect(read?.({ ...acquisition, phaseFieldOfViewFraction: 1 })).toBeUndefined();
  });
});
