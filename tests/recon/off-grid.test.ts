/** k-space between its samples, at places where rounding decides which samples lie under the kernel. */
import { transform } from '../../recon/fourier';
import { centredGrid } from '../../recon/grid';
import { fineKspace, sampleAt } from '../../recon/off-grid';

const [rows, columns] = [16, 12];
const image = {
  ...centredGrid(rows, columns, [0.001, 0.001]),
  re: Float64Array.from({ length: rows * columns }, (_, i) => Math.sin(0.7 * i) + 1),
  im: Float64Array.from({ length: rows * columns }, (_, i) => Math.cos(0.3 * i)),
};
const kspace = transform(image);
const largest = Math.max(...kspace.re.map((re, i) => Math.sqrt(re * re + (kspace.im[i] as number) ** 2)));

test('a place that misses a sample by the last bit of a number has the value of that sample', () => {
  const fine = fineKspace(kspace);
  const value = new Float64Array(2);
  for (let u = -rows / 2 + 1; u < rows / 2; u++) {
    for (const miss of [0, 2 ** -53, 2 ** -52, 2 ** -51, -(2 ** -53), -(2 ** -52), -(2 ** -51)]) {
      sampleAt(fine, u + miss, 0, value);
      const at = (u + rows / 2) * columns + columns / 2;
      // The kernel is within 1e-5 of the largest sample (off-grid.ts).
      expect(Math.abs((value[0] as number) - (kspace.re[at] as number))).toBeLessThan(1e-5 * largest);
      expect(Math.abs((value[1] as number) - (kspace.im[at] as number))).toBeLessThan(1e-5 * largest);
    }
  }
});
