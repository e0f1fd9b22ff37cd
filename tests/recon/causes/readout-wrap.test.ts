/** Wrap-around along the readout: the folded complex sum, common practice, times what the filter passes. */
import { readoutWrap } from '../../../recon/causes/readout-wrap';
import { inverse, transform } from '../../../recon/fourier';
import { actOnObject } from '../act-on-kspace';
import { box, largestDifference, noisePlane } from '../planes';

describe('Wrap-around along the readout', () => {
  test.each([
    [64, 0.75, 1, 0],
    [63, 0.6, 0.3, 0.1],
    [51, 0.5, 0, -0.2],
  ])(
    'of %i samples to %f of the field of view, filter passing %f, is the weighted sum of what lies n apart',
    (columns, fraction, passed, off) => {
      const object = noisePlane(5, columns);
      const n = Math.round(fraction * columns);
      const offset = Math.round(off * columns);
      const image = inverse(actOnObject(readoutWrap, object, { fraction, passed, offCentre: off }));
      expect([image.rows, image.columns]).toEqual([5, n]);
      for (let x = 0; x < n; x++) {
        let sum = 0;
        for (let m = -3; m <= 3; m++) {
          const from = x - Math.floor(n / 2) + offset + m * n + Math.floor(columns / 2);
          if (from >= 0 && from < columns) sum += (m === 0 ? 1 : passed) * (object.re[2 * columns + from] ?? NaN);
        }
        // Transforms there and back of samples about 5: rounding.
        expect(image.re[2 * n + x]).toBeCloseTo(sum, 12);
      }
    },
  );

  test('takes every second sample of k-space at half the field of view, and leaves the lines as they are', () => {
    const object = noisePlane(6, 32);
    const full = transform(object);
    const half = actOnObject(readoutWrap, object, { fraction: 0.5 });
    for (let k = -8; k < 8; k++) expect(half.re[16 * 2 + k + 8]).toBeCloseTo(Math.SQRT2 * (full.re[32 * 2 + 2 * k + 16] ?? NaN), 12);
    expect(half.taken).toEqual(new Uint8Array(6 * 16).fill(1));
  });

  test('runs along the rows where the phase encoding runs along the columns, and the other way round', () => {
    const object = box(32, [4, 28], [2, 30]);
    const along = (phaseEncode: 'row' | 'column') => actOnObject(readoutWrap, object, { fraction: 0.5 }, { phaseEncode });
    expect([along('column').rows, along('column').columns]).toEqual([32, 16]);
    expect([along('row').rows, along('row').columns]).toEqual([16, 32]);
  });

  test('is the object cut off, and nothing folded in, where the filter passes nothing', () => {
    const object = noisePlane(4, 40);
    const image = inverse(actOnObject(readoutWrap, object, { fraction: 0.5, passed: 0 }));
    const cut = { ...image, re: image.re.slice(), im: image.im.slice() };
    for (let row = 0; row < 4; row++) {
      cut.re.set(object.re.subarray(row * 40 + 10, row * 40 + 30), row * 20);
      cut.im.set(object.im.subarray(row * 40 + 10, row * 40 + 30), row * 20);
    }
    expect(largestDifference(image, cut)).toBeLessThan(1e-13);
  });
});
