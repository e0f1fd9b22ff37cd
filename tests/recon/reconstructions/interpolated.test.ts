/** Zero-filled interpolation: more pixels, the same picture. */
import { transform } from '../../../recon/fourier';
import { fullyTaken } from '../../../recon/lines';
import { interpolated } from '../../../recon/reconstructions/interpolated';
import { contextOf } from '../../laws/samples';
import { columnEncoded } from '../act-on-kspace';
import { energy, noisePlane } from '../planes';

const made = (rows: number, columns: number, values: { size: string; matrix: number }) =>
  interpolated.reconstruct(fullyTaken(transform(noisePlane(rows, columns))), values, contextOf(columnEncoded));

describe('Interpolation', () => {
  test('to twice the matrix keeps every pixel and puts one between', () => {
    for (const [rows, columns] of [
      [16, 12],
      [15, 21],
    ] as const) {
      const object = noisePlane(rows, columns);
      const image = made(rows, columns, { size: 'twice', matrix: 512 });
      expect([image.rows, image.columns]).toEqual([2 * rows, 2 * columns]);
      for (let row = 0; row < rows; row++) {
        for (let column = 0; column < columns; column++) {
          // The centre of one is at floor(n/2), of the other at n: an odd matrix lies one finer pixel further on.
          const fine = (2 * row + (rows % 2)) * 2 * columns + 2 * column + (columns % 2);
          expect(image.re[fine]).toBeCloseTo(object.re[row * columns + column] ?? NaN, 12);
          expect(image.im[fine]).toBeCloseTo(object.im[row * columns + column] ?? NaN, 12);
        }
      }
    }
  });

  test('adds no detail: the energy grows with the pixels alone', () => {
    expect(energy(made(16, 12, { size: 'twice', matrix: 512 }))).toBeCloseTo(4 * energy(noisePlane(16, 12)), 8);
  });

  test('to a matrix makes the longer side as long and keeps the field of view', () => {
    const image = made(40, 30, { size: 'matrix', matrix: 64 });
    expect([image.rows, image.columns]).toEqual([64, 48]);
    expect(image.rows * image.spacing[0]).toBeCloseTo(40e-3, 12);
    expect(image.columns * image.spacing[1]).toBeCloseTo(30e-3, 12);
    expect(image.origin[0]).toBeCloseTo(-20e-3, 12);
  });

  test('never makes the matrix smaller', () => {
    expect(made(40, 30, { size: 'matrix', matrix: 32 }).rows).toBe(40);
  });
});
