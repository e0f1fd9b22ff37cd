/** Which lines partial Fourier takes. What becomes of the others is checked with the reconstructions. */
import type { Acquisition } from '../../../recon/acquisition';
import { partialFourier } from '../../../recon/causes/partial-fourier';
import { linesOf, takenLines } from '../../../recon/lines';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { actOnObject } from '../act-on-kspace';
import { noisePlane } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'row' };

function takenOf(n: number, fraction: number): readonly boolean[] {
  const recipe = {
    steps: [{ cause: 'partial-fourier', parameters: { fraction } }],
    reconstruction: { method: 'zero-filled', parameters: {} },
    seed: 1,
  };
  const { kspace } = simulate(noisePlane(6, n), recipe, acquisition);
  return takenLines(kspace, linesOf(kspace, acquisition));
}

describe('Partial Fourier', () => {
  test.each([0.625, 0.75, 0.875] as const)('of %f takes the lines ky ≥ −(2f−1)N/2: a symmetric band of 2f−1', (fraction) => {
    const n = 128;
    const taken = takenOf(n, fraction);
    expect(taken.filter(Boolean)).toHaveLength(fraction * n);
    const below = n / 2 - taken.indexOf(true);
    // Noll et al. 1991: both sides are complete within (2f−1)N/2.
    expect((2 * below) / n).toBe(reference.symmetricBand[fraction]);
    expect(taken.indexOf(true) - n / 2).toBe((-(2 * fraction - 1) * n) / 2);
    expect(taken.slice(taken.indexOf(true))).not.toContain(false);
  });

  test('does not show in the k-space of the magnitude image: both sides of it hold the same', () => {
    const recipe = {
      steps: [{ cause: 'partial-fourier', parameters: { fraction: 0.625 } }],
      reconstruction: { method: 'zero-filled', parameters: {} },
      seed: 1,
    };
    const { kspace, kspaceOfImage } = simulate(noisePlane(6, 64), recipe, acquisition);
    const column = (of: { re: Float64Array; im: Float64Array }, k: number): number =>
      [0, 1, 2, 3, 4, 5].reduce((sum, row) => sum + (of.re[row * 64 + 32 + k] ?? NaN) ** 2 + (of.im[row * 64 + 32 + k] ?? NaN) ** 2, 0);
    expect(column(kspace, -20)).toBe(0);
    expect(column(kspace, 20)).toBeGreaterThan(1);
    expect(column(kspaceOfImage(), -20)).toBeCloseTo(column(kspaceOfImage(), 20), 10);
  });

  test('along the readout takes the later part of every echo: the band about its middle is complete', () => {
    const { taken } = actOnObject(partialFourier, noisePlane(5, 32), { fraction: 0.75, direction: 'readout' });
    for (let row = 0; row < 5; row++) {
      expect(Array.from(taken.subarray(row * 32, (row + 1) * 32))).toEqual([...Array<number>(8).fill(0), ...Array<number>(24).fill(1)]);
    }
  });

  test('takes the nearest whole number of an odd count of lines', () => {
    expect(takenOf(51, 0.75).filter(Boolean)).toHaveLength(38);
  });
});
