/** POCS: Haacke, Lindskog, Lin 1991; errors from numpy. */
import type { Acquisition } from '../../../recon/acquisition';
import { partialFourier } from '../../../recon/causes/partial-fourier';
import { uniformUndersampling } from '../../../recon/causes/uniform-undersampling';
import { inverse, transform } from '../../../recon/fourier';
import type { ComplexPlane, Plane } from '../../../recon/grid';
import { magnitude } from '../../../recon/grid';
import { twoEllipse } from '../../../recon/phantoms/two-ellipse';
import { homodyne } from '../../../recon/reconstructions/homodyne';
import { pocs } from '../../../recon/reconstructions/pocs';
import { contextOf } from '../../laws/samples';
import { encodingReference as reference } from '../../reference/encoding-values';
import { actOnKspace, actOnObject, columnEncoded } from '../act-on-kspace';
import { largestDifference, noisePlane, transposed } from '../planes';

const context = contextOf(columnEncoded);
const oneSided = (object: ComplexPlane, fraction: number, direction = 'phase-encode', acquisition: Acquisition = columnEncoded) =>
  actOnObject(partialFourier, object, { fraction, direction }, acquisition);

/** ‖image − object‖/‖object‖, no gain taken out. */
function errorOf(image: ComplexPlane, object: ComplexPlane): number {
  const size = ({ values }: Plane) => Math.sqrt(values.reduce((sum, value) => sum + value ** 2, 0));
  const [a, b] = [magnitude(image), magnitude(object)];
  return size({ ...a, values: a.values.map((value, i) => value - (b.values[i] ?? NaN)) }) / size(b);
}

describe('POCS', () => {
  test.each([
    ['real', reference.pocs.real],
    ['smoothPhase', reference.pocs.smoothPhase],
  ])('after 50 rounds on 5/8 of the lines of two ellipses (%s) has the error of the outside computation', (kind, expected) => {
    const object = twoEllipse({ phase: kind === 'smoothPhase' });
    const image = pocs.reconstruct(oneSided(object, 0.625), { iterations: 50 }, context);
    // The same arithmetic in float64 on both sides; the reference has six decimals.
    expect(errorOf(image, object)).toBeCloseTo(expected, 6);
  });

  test('comes closer with every round, and closer than homodyne', () => {
    const object = twoEllipse({ phase: true });
    const kspace = oneSided(object, 0.625);
    const error = (iterations: number) => errorOf(pocs.reconstruct(kspace, { iterations }, context), object);
    expect(error(3)).toBeLessThan(error(1));
    expect(error(10)).toBeLessThan(error(3));
    expect(error(10)).toBeLessThan(errorOf(homodyne.reconstruct(kspace, {}, context), object));
  });

  test('leaves the samples that were taken as they are', () => {
    const kspace = oneSided(noisePlane(32, 20), 0.75);
    const after = transform(pocs.reconstruct(kspace, { iterations: 4 }, context));
    kspace.taken.forEach((taken, i) => {
      if (taken === 1) expect(after.re[i]).toBeCloseTo(kspace.re[i] ?? NaN, 11);
    });
  });

  test('makes nothing up where no side is short: skipped lines stay skipped', () => {
    const skipped = actOnObject(uniformUndersampling, noisePlane(48, 8), { accelerationFactor: 3 });
    expect(largestDifference(pocs.reconstruct(skipped, { iterations: 3 }, context), inverse(skipped))).toBe(0);
  });

  test('fills the short side of the readout, and of both directions at once', () => {
    const object = twoEllipse({ phase: true });
    const along = oneSided(object, 0.75, 'readout');
    const both = actOnKspace(partialFourier, along, { fraction: 0.75, direction: 'phase-encode' });
    for (const kspace of [along, both]) {
      expect(errorOf(pocs.reconstruct(kspace, { iterations: 20 }, context), object)).toBeLessThan(0.5 * errorOf(inverse(kspace), object));
    }
  });
});

describe('Homodyne along the readout', () => {
  test('is homodyne along the phase encoding of the object turned over', () => {
    const object = twoEllipse({ phase: true });
    const along = homodyne.reconstruct(oneSided(object, 0.625, 'readout'), {}, context);
    const across = homodyne.reconstruct(oneSided(transposed(object), 0.625), {}, context);
    expect(largestDifference(transposed(along), across)).toBeLessThan(1e-12);
  });

  test('makes up the side that lacks more where both are short', () => {
    const object = twoEllipse({ phase: false });
    const both = actOnKspace(partialFourier, oneSided(object, 0.625, 'readout'), { fraction: 0.875, direction: 'phase-encode' });
    // What is left is the blur of 7/8 of the lines, zero-filled.
    const lines = errorOf(inverse(oneSided(object, 0.875)), object);
    const readout = errorOf(inverse(oneSided(object, 0.625, 'readout')), object);
    expect(errorOf(homodyne.reconstruct(both, {}, context), object)).toBeLessThan(lines + 0.3 * readout);
  });
});
