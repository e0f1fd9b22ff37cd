/** Truncation against the theory of Wilbraham and Gibbs and against numpy, on a grid fine enough to see the ringing. */
import type { Encoded } from '../../../recon/cause';
import { truncation } from '../../../recon/causes/truncation';
import { inverse } from '../../../recon/fourier';
import { magnitude } from '../../../recon/grid';
import { fullyTaken, linesOf, takenLines } from '../../../recon/lines';
import { homodyne } from '../../../recon/reconstructions/homodyne';
import { windowed } from '../../../recon/reconstructions/windowed';
import { initialValues, contextOf } from '../../laws/samples';
import { encodingReference as reference } from '../../reference/encoding-values';
import { actOnKspace, columnEncoded } from '../act-on-kspace';
import { largestDifference, noisePlane } from '../planes';
import { boxColumn, column, fullWidth } from '../point-spread';

const rows = 4096;
const truncated = (kspace: Encoded, nTaken: number) => actOnKspace(truncation, kspace, { fraction: nTaken / kspace.rows });
const filtered = (kspace: Encoded, window: string) =>
  windowed.reconstruct(kspace, { ...initialValues(windowed.parameters), window }, contextOf(columnEncoded));
/** Largest value over the inside of the box, of which the edge is at a quarter of the field of view, less 1. */
const overshoot = ({ re }: { re: Float64Array }) => Math.max(...re.subarray(0.65 * rows, 0.85 * rows)) - 1;

describe('Gibbs ringing', () => {
  test.each([32, 64, 128, 256] as const)('of a box from %i samples overshoots as numpy says, 9 % of the jump', (n) => {
    // 5e-4 is the tolerance of the reference: its grid and this one differ.
    expect(Math.abs(overshoot(inverse(truncated(boxColumn(rows), n))) - reference.gibbsOvershoot[n])).toBeLessThan(5e-4);
  });

  test('has its extrema at whole acquired pixels from the edge, Si(nπ)/π − ½ high', () => {
    const n = 256;
    const image = inverse(truncated(boxColumn(rows), n));
    const edge = rows / 2 + rows / 4;
    reference.gibbsLobes.forEach((lobe, i) => {
      const inside = image.re[edge - ((i + 1) * rows) / n] ?? NaN;
      // The other edge of the box, 128 acquired pixels away, rings by 1/(π²·128) = 8e-4 there, and in turn adds and subtracts.
      expect(Math.abs(inside - 1 - lobe)).toBeLessThan(1e-3);
    });
  });

  test.each(['hamming', 'hann'] as const)('is all but gone with a %s window, as numpy says', (window) => {
    const image = filtered(truncated(boxColumn(rows), 128), window);
    expect(Math.abs(overshoot(image) - reference.gibbsOvershootWindowed[window])).toBeLessThan(5e-4);
  });
});

describe('The width of a point', () => {
  const n = 128;
  const perPixel = rows / n;
  const point = truncated(
    column(rows, () => 1),
    n,
  );

  test('is 1.207 acquired pixels', () => {
    // Linear between 32 samples a pixel: 1e-4; n finite: sin(πx)/(n sin(πx/n)) differs from the sinc by 1e-5.
    expect(Math.abs(fullWidth(magnitude(inverse(point))) / perPixel - reference.pointWidth.sinc)).toBeLessThan(3e-4);
  });

  test('is followed by side lobes, the first of −0.217 of the peak', () => {
    const { re } = inverse(point);
    // The lobe is flat at its end: 32 samples a pixel miss it by 1e-4 at most; n finite: 1e-4.
    expect(Math.abs(Math.min(...re) / (re[rows / 2] ?? NaN) - reference.pointSideLobe)).toBeLessThan(3e-4);
  });

  test.each(['hamming', 'hann'] as const)('is that of the outside computation with a %s window', (window) => {
    expect(Math.abs(fullWidth(magnitude(filtered(point, window))) / perPixel - reference.pointWidth[window])).toBeLessThan(5e-4);
  });
});

describe('Truncation', () => {
  test.each([
    ['phase-encode', 10, 21],
    ['readout', 20, 11],
    ['both', 10, 11],
  ] as const)('along %s keeps a band about zero, and nothing beyond it', (direction, nLines, nSamples) => {
    const kspace = actOnKspace(truncation, fullyTaken(noisePlane(20, 21)), { fraction: 0.5, direction });
    expect(takenLines(kspace, linesOf(kspace, columnEncoded)).filter(Boolean)).toHaveLength(nLines);
    expect(takenLines(kspace, linesOf(kspace, { phaseEncode: 'row' })).filter(Boolean)).toHaveLength(nSamples);
    expect(kspace.taken[10 * 21 + 10]).toBe(1);
  });

  test('has no short side: homodyne makes nothing up, for even and odd bands', () => {
    for (const fraction of [0.5, 0.55]) {
      const kspace = actOnKspace(truncation, fullyTaken(noisePlane(20, 21)), { fraction, direction: 'both' });
      expect(largestDifference(homodyne.reconstruct(kspace, {}, contextOf(columnEncoded)), inverse(kspace))).toBe(0);
    }
  });
});
