/** k-space between its samples, and lines of an object that moves: against explicit sums and an object that can be drawn in any pose. */
import { inverse, transform } from '../../recon/fourier';
import type { ComplexPlane } from '../../recon/grid';
import { centredGrid, complexZeros } from '../../recon/grid';
import { fullyTaken, linesOf } from '../../recon/lines';
import { fineKspace, sampleAt } from '../../recon/off-grid';
import type { Pose } from '../../recon/pose';
import { withPoses } from '../../recon/pose';
import { largestDifference, noisePlane } from './planes';

test.each([
  [16, 16],
  [15, 21],
  [12, 34],
])('K(u, v) of %i by %i samples is the sum over the image that the header states, to 1e-5 of the largest', (rows, columns) => {
  const image = noisePlane(rows, columns);
  const kspace = transform(image);
  const fine = fineKspace(kspace);
  const largest = kspace.re.reduce((most, re, i) => Math.max(most, Math.hypot(re, kspace.im[i] ?? NaN)), 0);
  const value = new Float64Array(2);
  for (const [u, v] of [
    [0, 0],
    [0.3, -1.7],
    [-3.25, 5.5],
    [rows / 2 - 0.1, 0.5 - columns / 2],
  ] as const) {
    let [re, im] = [0, 0];
    for (let row = 0; row < rows; row++) {
      for (let column = 0; column < columns; column++) {
        const phase = -2 * Math.PI * ((u * (row - Math.floor(rows / 2))) / rows + (v * (column - Math.floor(columns / 2))) / columns);
        const [a, b] = [image.re[row * columns + column] ?? NaN, image.im[row * columns + column] ?? NaN];
        re += a * Math.cos(phase) - b * Math.sin(phase);
        im += a * Math.sin(phase) + b * Math.cos(phase);
      }
    }
    sampleAt(fine, u, v, value);
    const scale = Math.sqrt(rows * columns);
    expect(Math.hypot((value[0] ?? NaN) - re / scale, (value[1] ?? NaN) - im / scale) / largest).toBeLessThan(1e-5);
  }
  sampleAt(fine, rows / 2 + 0.1, 0, value);
  expect([...value]).toEqual([0, 0]);
});

/** Two blobs in oblong pixels, so smooth that neither image nor k-space is cut off (1e-8), turned by `rotation` from rows to columns. */
function blobs({ alongPhaseEncode, alongReadout, rotation }: Pose): ComplexPlane {
  const plane = complexZeros(centredGrid(64, 72, [1.5e-3, 1e-3]));
  const [cosine, sine] = [Math.cos(rotation), Math.sin(rotation)];
  for (let row = 0; row < plane.rows; row++) {
    for (let column = 0; column < plane.columns; column++) {
      const y = plane.origin[0] + row * plane.spacing[0] - alongPhaseEncode;
      const x = plane.origin[1] + column * plane.spacing[1] - alongReadout;
      const [p, q] = [y * cosine + x * sine, x * cosine - y * sine];
      plane.re[row * plane.columns + column] = Math.exp(-((p - 0.006) ** 2 + (q - 0.002) ** 2) / (2 * 0.003 ** 2));
      plane.im[row * plane.columns + column] = 0.5 * Math.exp(-((p + 0.004) ** 2 + (q + 0.005) ** 2) / (2 * 0.0035 ** 2));
    }
  }
  return plane;
}

const still: Pose = { alongPhaseEncode: 0, alongReadout: 0, rotation: 0 };
const moved: Pose = { alongPhaseEncode: 0.0034, alongReadout: -0.0021, rotation: 0.15 };

test('An object that keeps one pose all the while is imaged in that pose', () => {
  const kspace = fullyTaken(transform(blobs(still)));
  const lines = linesOf(kspace, { phaseEncode: 'column' });
  const image = inverse(withPoses(kspace, lines, new Array<Pose>(lines.nLines).fill(moved)));
  // Of 1: interpolation to 1e-5 of the largest sample, and what the blobs lack at the edges.
  expect(largestDifference(image, blobs(moved))).toBeLessThan(1e-5);
});

test('Only the lines that are taken in a pose change', () => {
  const kspace = fullyTaken(transform(blobs(still)));
  const lines = linesOf(kspace, { phaseEncode: 'column' });
  const result = withPoses(kspace, lines, [...new Array<Pose>(40).fill(still), ...new Array<Pose>(24).fill(moved)]);
  const there = transform(blobs(moved));
  expect(result.re.subarray(0, 40 * 72)).toEqual(kspace.re.subarray(0, 40 * 72));
  for (let i = 40 * 72; i < result.re.length; i++) expect(Math.abs((result.re[i] ?? NaN) - (there.re[i] ?? NaN))).toBeLessThan(1e-4);
});

test('Samples that were not taken stay empty when the object turns', () => {
  const kspace = fullyTaken(transform(blobs(still)));
  kspace.taken.fill(0, 10 * 72, 20 * 72);
  kspace.re.fill(0, 10 * 72, 20 * 72);
  kspace.im.fill(0, 10 * 72, 20 * 72);
  const result = withPoses(kspace, linesOf(kspace, { phaseEncode: 'column' }), new Array<Pose>(64).fill(moved));
  expect(result.re.subarray(10 * 72, 20 * 72).every((value) => value === 0)).toBe(true);
});
