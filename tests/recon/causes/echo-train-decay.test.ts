/** Decay along the echo train: the weights of each order, the point spread (numpy), the ghosts of a comb. */
import type { Encoded } from '../../../recon/cause';
import { echoTrainDecay } from '../../../recon/causes/echo-train-decay';
import { uniformUndersampling } from '../../../recon/causes/uniform-undersampling';
import { inverse } from '../../../recon/fourier';
import { magnitude } from '../../../recon/grid';
import type { ParameterValues } from '../../../recon/recipe';
import { encodingReference as reference } from '../../reference/encoding-values';
import { actOnKspace } from '../act-on-kspace';
import { absolute } from '../planes';
import { column, fullWidth } from '../point-spread';

const ones = (rows: number): Encoded => column(rows, () => 1);
const decayed = (kspace: Encoded, values: ParameterValues): Encoded => actOnKspace(echoTrainDecay, kspace, values);

/** How many echo spacings after the centre line each line is taken, from ln W = −(e − e0)·s/T2. */
const echoesAfterCentre = (values: ParameterValues, rows = 8): number[] =>
  Array.from(decayed(ones(rows), { echoSpacing: 10, transverseRelaxation: 100, ...values }).re, (w) => Math.round(-10 * Math.log(w)) + 0);

describe('The order of the phase encoding', () => {
  // Written out by hand: 8 lines, the centre line at index 4; 4 echoes, so bands of two lines.
  test.each([
    ['linear', [-2, -2, -1, -1, 0, 0, 1, 1]],
    ['reverse', [2, 2, 1, 1, 0, 0, -1, -1]],
    ['centric', [3, 2, 1, 0, 0, 1, 2, 3]],
    ['interleaved', [0, 1, 2, 3, 0, 1, 2, 3]],
  ])('%s gives every line its echo', (order, expected) => {
    expect(echoesAfterCentre({ echoTrainLength: 4, order })).toEqual(expected);
  });

  test('counts the lines that are taken: skipped lines take no echo', () => {
    const skipped = actOnKspace(uniformUndersampling, ones(8), { accelerationFactor: 2 });
    const { re } = decayed(skipped, { echoTrainLength: 4, order: 'linear', echoSpacing: 10, transverseRelaxation: 100 });
    // Lines 0, 2, 4, 6 are echoes 0 to 3; the centre line is the third.
    [-2, -1, 0, 1].forEach((echo, i) => expect(re[2 * i]).toBeCloseTo(Math.exp(-echo / 10), 12));
    expect(re[1]).toBe(0);
  });
});

describe('Decay along the echo train', () => {
  test('leaves exp(−160/80) of the echo that comes 16 spacings of 10 ms after the centre at T2 80 ms', () => {
    const { re } = decayed(ones(34), { echoTrainLength: 17, order: 'centric', echoSpacing: 10, transverseRelaxation: 80 });
    expect(re[17]).toBe(1);
    expect(re[0]).toBeCloseTo(reference.sixteenEchoes, 9);
  });

  test('of 160 ms at T2 80 ms in linear order widens a point to the width of the outside computation', () => {
    const kspace = decayed(ones(128), { echoTrainLength: 128, order: 'linear', echoSpacing: 1.25, transverseRelaxation: 80 });
    const padded = column(4096, (k) => kspace.re[k + 64] ?? 0);
    // 0.02 is the tolerance of the reference.
    expect(Math.abs(fullWidth(magnitude(inverse(padded))) / 32 - reference.pointWidthDecay)).toBeLessThan(0.02);
  });

  test('leaves the brightness: the centre line has the weight 1 in every order', () => {
    for (const order of ['linear', 'reverse', 'centric', 'interleaved']) expect(decayed(ones(30), { order }).re[15]).toBe(1);
  });

  test('interleaved makes ghosts at multiples of N/E, the Fourier coefficients of one period of the decay', () => {
    const E = 8;
    const image = inverse(decayed(ones(64), { echoTrainLength: E, order: 'interleaved', echoSpacing: 10, transverseRelaxation: 80 }));
    const q = Math.exp(-10 / 80);
    for (let j = 0; j < E; j++) {
      // Geometric series: |1/E Σ q^e exp(i2πje/E)| = (1 − q^E)/(E·|1 − q·exp(i2πj/E)|), for the centre line in the first tooth of the comb.
      const angle = (2 * Math.PI * j) / E;
      const coefficient = (1 - q ** E) / (E * Math.hypot(1 - q * Math.cos(angle), q * Math.sin(angle)));
      expect(absolute(image, (32 + (64 * j) / E) % 64, 0)).toBeCloseTo(8 * coefficient, 10);
    }
    expect(absolute(image, 32 + 3, 0)).toBeCloseTo(0, 10);
  });
});

test('Lines that do not fill the last train leave it short: ten lines in trains of four are groups of three', () => {
  expect(echoesAfterCentre({ echoTrainLength: 4, order: 'linear' }, 10)).toEqual([-1, -1, -1, 0, 0, 0, 1, 1, 1, 2]);
});
