/** A dead element against the root sum of squares of the coil images, written out. */
import { centredGrid, magnitude } from '../../../recon/grid';
import { sumOfSquares } from '../../../recon/coils';
import { simulate } from '../../../recon/simulate';
import { box, noisePlane } from '../planes';
import { disc, uniformityOfDisc } from '../uniformity';

const parameters = { elements: 6, remaining: 0, position: 40, radius: 0.7, width: 0.4 };
const broken = (object: Parameters<typeof simulate>[0], values: Partial<typeof parameters> = {}) =>
  simulate(
    object,
    {
      steps: [{ cause: 'dead-coil-element', parameters: { ...parameters, ...values } }],
      reconstruction: { method: 'zero-filled', parameters: {} },
      seed: 1,
    },
    { phaseEncode: 'column' },
  ).image.values;

/** |C_j| at a pixel, by the definition; positions in parts of the longer side. */
function sensitivity(j: number, row: number, column: number, rows: number, columns: number): number {
  const side = Math.max(rows, columns);
  const angle = ((40 + 60 * j) * Math.PI) / 180;
  const x = (column - Math.floor(columns / 2)) / side - 0.7 * Math.cos(angle);
  const y = (row - Math.floor(rows / 2)) / side - 0.7 * Math.sin(angle);
  return Math.exp(-(x * x + y * y) / (2 * 0.4 ** 2));
}

test('The image is the root sum of squares of the elements that are left, levelled by that of all', () => {
  // Roemer et al, Magn Reson Med 1990;16:192 (from memory).
  const object = noisePlane(20, 13);
  const before = magnitude(object).values;
  broken(object, { remaining: 30 }).forEach((value, i) => {
    const [row, column] = [Math.floor(i / 13), i % 13];
    const coils = [0, 1, 2, 3, 4, 5].map((j) => sensitivity(j, row, column, 20, 13));
    const left = coils.map((c, j) => (j === 0 ? 0.3 * c : c));
    expect(value).toBeCloseTo(((before[i] ?? NaN) * Math.hypot(...left)) / Math.hypot(...coils), 11);
  });
});

test('The shares of power that each element would take with it add up to one', () => {
  const uniform = box(32, [0, 32], [0, 32]);
  const lost = new Float64Array(32 * 32);
  for (let j = 0; j < 6; j++) {
    broken(uniform, { position: 60 * j }).forEach((value, i) => {
      lost[i] = (lost[i] ?? NaN) + 1 - value ** 2;
    });
  }
  lost.forEach((share) => expect(share).toBeCloseTo(1, 11));
});

test('At the centre all elements are equal: √(1 − 1/n) of the signal is left', () => {
  for (const elements of [4, 8, 16]) {
    const image = broken(box(32, [0, 32], [0, 32]), { elements });
    expect(image[16 * 32 + 16]).toBeCloseTo(Math.sqrt(1 - 1 / elements), 12);
  }
});

test('The dark sector lies on the side of the element, and the far side keeps its signal', () => {
  const image = broken(box(64, [0, 64], [0, 64]), { elements: 8, position: 90, width: 0.3 });
  expect(image[62 * 64 + 32]).toBeLessThan(0.75);
  expect(image[2 * 64 + 32]).toBeGreaterThan(0.999);
});

test('A uniform phantom fails the limit of 87.5 % with a dead element, and passes with all', () => {
  // J Appl Clin Med Phys 2022;23:e13730, table 3, below 3 T.
  const phantom = disc(64, 26);
  const grid = centredGrid(64, 64, [1e-3, 1e-3]);
  const uniformity = (remaining: number) =>
    uniformityOfDisc({ ...grid, values: broken(phantom, { elements: 8, width: 0.3, remaining }) }, 24);
  expect(uniformity(100)).toBeGreaterThan(99.9);
  expect(uniformity(0)).toBeLessThan(87.5);
});

test('The ring follows the body, not the matrix: pixels of half the height give the same coils on twice the rows', () => {
  const ring = { elements: 5, radius: 0.7, width: 0.4, firstAngle: 0.3 };
  const coarse = sumOfSquares({ rows: 16, columns: 16, spacing: [2e-3, 2e-3] }, ring);
  const fine = sumOfSquares({ rows: 32, columns: 16, spacing: [1e-3, 2e-3] }, ring);
  for (let row = 0; row < 16; row++) expect(fine[2 * row * 16 + 5]).toBeCloseTo(coarse[row * 16 + 5] ?? NaN, 12);
});
