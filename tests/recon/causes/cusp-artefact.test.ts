/** The cusp: where the spot lies, how bright it is, how echoes spread it. The model is ours; its closed forms are checked. */
import { cuspArtefact } from '../../../recon/causes/cusp-artefact';
import { uniformUndersampling } from '../../../recon/causes/uniform-undersampling';
import { inverse } from '../../../recon/fourier';
import type { ComplexPlane } from '../../../recon/grid';
import type { ParameterValues } from '../../../recon/recipe';
import { actOnKspace, actOnObject } from '../act-on-kspace';
import { absolute, box, energy, noisePlane } from '../planes';

const place: ParameterValues = { readoutPlace: 0.25, phasePlace: -0.25, tail: 1, echoTrainLength: 1, order: 'linear', strength: 3 };

/** What the cause adds to the image. */
function added(object: ComplexPlane, values: ParameterValues): ComplexPlane {
  const [with_, without] = [values, { ...values, strength: 0 }].map((v) => inverse(actOnObject(cuspArtefact, object, { ...place, ...v })));
  if (!with_ || !without) throw Error('two images were made');
  return { ...with_, re: with_.re.map((v, i) => v - (without.re[i] ?? NaN)), im: with_.im.map((v, i) => v - (without.im[i] ?? NaN)) };
}

// Half of the plane is 1: its 99th percentile is 1.
const object = box(64, [16, 48], [0, 64]);

describe('The cusp artefact', () => {
  test('of one echo is a spot as bright as asked, relative to the object, at its place', () => {
    for (const gain of [1, 20]) {
      const scaled = { ...object, re: object.re.map((value) => gain * value) };
      const spot = added(scaled, {});
      expect(absolute(spot, 32 - 16, 32 + 16)).toBeCloseTo(3 * gain, 9);
      expect(energy(spot)).toBeCloseTo((3 * gain) ** 2, 6);
    }
  });

  test('has a tail along the readout that falls off as the caustic 1/√(x0 − x)', () => {
    const spot = added(object, { tail: 8 });
    for (let j = 0; j < 8; j++) expect(absolute(spot, 16, 48 - j)).toBeCloseTo(3 * (Math.sqrt(j + 1) - Math.sqrt(j)), 9);
    expect(absolute(spot, 16, 49)).toBeCloseTo(0, 9);
    expect(absolute(spot, 16, 40)).toBeCloseTo(0, 9);
  });

  test('is spread along the phase encoding alone by the echoes, its energy kept', () => {
    const spot = added(object, { echoTrainLength: 8 });
    const columnEnergy = (column: number) =>
      Array.from({ length: 64 }, (_, row) => absolute(spot, row, column) ** 2).reduce((a, b) => a + b, 0);
    expect(columnEnergy(48)).toBeCloseTo(9, 6);
    expect(columnEnergy(47)).toBeCloseTo(0, 9);
    expect(absolute(spot, 16, 48)).toBeLessThan(2.9);
    // Eight bands of eight lines each: a sinc of eight pixels carries the pattern, nine tenths of it within its main lobe.
    const near = Array.from({ length: 17 }, (_, i) => absolute(spot, 8 + i, 48) ** 2).reduce((a, b) => a + b, 0);
    expect(near / 9).toBeGreaterThan(0.85);
  });

  test('in interleaved order is a row of dots N/E apart', () => {
    const spot = added(object, { echoTrainLength: 8, order: 'interleaved' });
    let dots = 0;
    for (let row = 0; row < 64; row++) {
      if ((row - 16) % 8 === 0) dots += absolute(spot, row, 48) ** 2;
      else expect(absolute(spot, row, 48)).toBeCloseTo(0, 9);
    }
    expect(dots).toBeCloseTo(9, 6);
  });

  test('is another for another seed, but for the place', () => {
    const one = inverse(actOnObject(cuspArtefact, noisePlane(32, 32), {}, undefined, 1));
    const other = inverse(actOnObject(cuspArtefact, noisePlane(32, 32), {}, undefined, 2));
    expect(one.re).not.toEqual(other.re);
  });
});

describe('Where the field of view is not square', () => {
  const wide = { ...noisePlane(32, 48) };
  wide.re.fill(1);
  wide.im.fill(0);

  test('each place is a part of its own direction', () => {
    const spot = added(wide, {});
    expect(absolute(spot, 16 - 8, 24 + 12)).toBeCloseTo(3, 9);
  });

  test('all of the tail has one phase', () => {
    const spot = added(wide, { tail: 6 });
    const phase = (column: number) => Math.atan2(spot.im[8 * 48 + column] ?? NaN, spot.re[8 * 48 + column] ?? NaN);
    for (let j = 1; j < 6; j++) expect(Math.cos(phase(36 - j) - phase(36))).toBeCloseTo(1, 9);
  });
});

test('Strength is relative to the brightest hundredth of the object, not to its mean', () => {
  const twoLevels = { ...object, re: object.re.map((value, i) => (i % 64 < 8 ? 3 * value : value)) };
  expect(absolute(added(twoLevels, {}), 16, 48)).toBeCloseTo(9, 9);
});

test('Phases from all around leave of a spot with an echo for every line no more than chance does', () => {
  // Of 64 random phases the sum is √64 on average: an eighth of the spot; three times that.
  expect(absolute(added(object, { echoTrainLength: 64 }), 16, 48)).toBeLessThan((3 * 3) / 8);
});

test('Nothing is added to lines that are not taken', () => {
  const skipped = actOnObject(uniformUndersampling, object, { accelerationFactor: 2 });
  const { re, im, taken } = actOnKspace(cuspArtefact, skipped, place);
  taken.forEach((isTaken, i) => {
    if (isTaken === 0) expect([re[i], im[i]]).toEqual([0, 0]);
  });
});
