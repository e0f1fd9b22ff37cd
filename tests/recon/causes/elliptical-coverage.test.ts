/** Elliptical coverage: how much is left, and the point spread of a disc. */
import { j1 } from 'cephes';
import { ellipticalCoverage } from '../../../recon/causes/elliptical-coverage';
import { homodyne } from '../../../recon/reconstructions/homodyne';
import { inverse } from '../../../recon/fourier';
import { centredGrid, complexZeros } from '../../../recon/grid';
import { fullyTaken } from '../../../recon/lines';
import { interpolated } from '../../../recon/reconstructions/interpolated';
import { contextOf } from '../../laws/samples';
import { actOnKspace, columnEncoded } from '../act-on-kspace';
import { absolute, largestDifference, noisePlane } from '../planes';

function ones(rows: number, columns: number) {
  const plane = complexZeros(centredGrid(rows, columns, [1e-3, 1e-3]));
  plane.re.fill(1);
  return fullyTaken(plane);
}

describe('Elliptical coverage', () => {
  test.each([
    [96, 96],
    [64, 120],
  ])('of %i × %i keeps π/4 of the samples, the 78.5 %% that headers state', (rows, columns) => {
    const { taken } = actOnKspace(ellipticalCoverage, ones(rows, columns), { size: 1 });
    // Samples along the edge of the ellipse are in or out whole: about one part in the matrix.
    expect(Math.abs(taken.reduce((sum, one) => sum + one, 0) / taken.length - Math.PI / 4)).toBeLessThan(1 / 96);
  });

  test('spreads a point as 2·J1(πr)/(πr) of acquired pixels, the same along rows and diagonals', () => {
    const kspace = actOnKspace(ellipticalCoverage, ones(64, 64), { size: 1 });
    const fine = interpolated.reconstruct(kspace, { size: 'matrix', matrix: 256 }, contextOf(columnEncoded));
    const peak = absolute(fine, 128, 128);
    for (let step = 1; step <= 16; step++) {
      for (const [row, column] of [
        [128, 128 + step],
        [128 + step, 128],
        [128 + step, 128 + step],
      ] as const) {
        const r = Math.hypot(row - 128, column - 128) / 4;
        const expected = Math.abs((2 * j1(Math.PI * r)) / (Math.PI * r));
        // The edge of the disc is one of whole samples, 1/64 of its diameter.
        expect(Math.abs(absolute(fine, row, column) / peak - expected)).toBeLessThan(0.015);
      }
    }
  });

  test('leaves a line and its mirror image alike: homodyne makes nothing up', () => {
    const kspace = actOnKspace(ellipticalCoverage, fullyTaken(noisePlane(24, 30)), { size: 0.8 });
    expect(largestDifference(homodyne.reconstruct(kspace, {}, contextOf(columnEncoded)), inverse(kspace))).toBe(0);
  });
});
