/** Filters of k-space: their weights. Ringing and width of a point are checked with truncation. */
import { truncation } from '../../../recon/causes/truncation';
import { transform } from '../../../recon/fourier';
import { centredGrid, complexZeros } from '../../../recon/grid';
import { fullyTaken } from '../../../recon/lines';
import { windowed } from '../../../recon/reconstructions/windowed';
import type { ParameterValues } from '../../../recon/recipe';
import { contextOf, initialValues } from '../../laws/samples';
import { actOnKspace, columnEncoded } from '../act-on-kspace';

const plane = complexZeros(centredGrid(32, 16, [1e-3, 1e-3]));
plane.re.fill(1);

/** The weight of every sample: what is left of k-space that was 1 everywhere. */
const weightsOf = (values: ParameterValues, fraction = 1) => {
  const kspace = actOnKspace(truncation, fullyTaken(plane), { fraction, direction: 'both' });
  return transform(windowed.reconstruct(kspace, { ...initialValues(windowed.parameters), ...values }, contextOf(columnEncoded))).re;
};
const at = (weights: Float64Array, ky: number, kx: number) => weights[(16 + ky) * 16 + 8 + kx] ?? NaN;

describe('A filter of k-space', () => {
  test.each(['hamming', 'hann', 'tukey', 'fermi'])('%s leaves the centre, and with it the brightness', (window) => {
    expect(at(weightsOf({ window }), 0, 0)).toBeCloseTo(1, 12);
  });

  test('weights with the product of both axes, kmax at the edge of each', () => {
    const hamming = (r: number) => 0.54 + 0.46 * Math.cos(Math.PI * r);
    const hann = (r: number) => 0.5 + 0.5 * Math.cos(Math.PI * r);
    for (const [ky, kx] of [
      [3, -5],
      [-16, 2],
      [10, 7],
    ] as const) {
      expect(at(weightsOf({ window: 'hamming' }), ky, kx)).toBeCloseTo(hamming(ky / 16) * hamming(kx / 8), 12);
      expect(at(weightsOf({ window: 'hann' }), ky, kx)).toBeCloseTo(hann(ky / 16) * hann(kx / 8), 12);
    }
  });

  test('goes by what was taken, not by the size of the picture', () => {
    expect(at(weightsOf({ window: 'hann' }, 0.5), 4, 0)).toBeCloseTo(0.5, 12);
    expect(at(weightsOf({ window: 'hann' }, 1), 8, 0)).toBeCloseTo(0.5, 12);
  });

  test('of Tukey is flat up to its taper: a rectangle at 0, Hann at 1', () => {
    expect(at(weightsOf({ window: 'tukey', taper: 0.5 }), 8, 4)).toBeCloseTo(1, 12);
    expect(at(weightsOf({ window: 'tukey', taper: 0.5 }), 12, 0)).toBeCloseTo(0.5, 12);
    expect(at(weightsOf({ window: 'tukey', taper: 0 }), -16, 7)).toBeCloseTo(1, 12);
    expect(at(weightsOf({ window: 'tukey', taper: 1 }), 5, 0)).toBeCloseTo(at(weightsOf({ window: 'hann' }), 5, 0), 12);
  });

  test('of Fermi goes by the radius in the plane, one half where it reaches its own', () => {
    const weights = weightsOf({ window: 'fermi', radius: 0.5, width: 0.02 });
    expect(at(weights, 8, 0)).toBeCloseTo(0.5, 9);
    expect(at(weights, 0, 4)).toBeCloseTo(0.5, 9);
    // r = √(¼ + ¼) = 0.707.
    expect(at(weights, 8, 4)).toBeCloseTo(1 / (1 + Math.exp((Math.SQRT1_2 - 0.5) / 0.02)), 9);
  });
});
