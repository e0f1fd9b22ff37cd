/** What parallel imaging leaves: nothing with true maps, copies N/R apart with others, noise of g·√R. */
import { parallelImagingResidual } from '../../../recon/causes/parallel-imaging-residual';
import type { ComplexPlane } from '../../../recon/grid';
import { centredGrid, complexZeros } from '../../../recon/grid';
import { randomOf } from '../../../recon/random';
import type { ParameterValues } from '../../../recon/recipe';
import { elementsAt, sensitivitiesAt } from '../../../recon/receive-array';
import { complexArray, geometryFactors } from '../../../recon/unfolding';
import { absolute, box, energy, largestDifference, noisePlane } from '../planes';

const quiet: ParameterValues = { accelerationFactor: 2, displacement: 0, fraction: 1, mapNoise: 0, noise: 0, elements: 8, width: 0.3 };

function unfolded(object: ComplexPlane, values: ParameterValues, phaseEncode: 'row' | 'column' = 'column', seed = 1): ComplexPlane {
  if (parallelImagingResidual.domain !== 'image') throw Error('it acts on the image');
  return parallelImagingResidual.apply(object, { ...quiet, ...values }, { acquisition: { phaseEncode }, random: randomOf(seed, 'test') });
}

describe('With the true maps', () => {
  test.each([
    [1, 8, 'column'],
    [2, 8, 'column'],
    [2, 4, 'row'],
    [3, 6, 'column'],
    [4, 16, 'row'],
  ] as const)('%i-fold acceleration and %i elements give the object back (phase encoding along the %s)', (R, elements, phaseEncode) => {
    const object = noisePlane(30, 26);
    // Rounding times the condition of the worst pixel, g up to 20.
    expect(largestDifference(unfolded(object, { accelerationFactor: R, elements }, phaseEncode), object)).toBeLessThan(1e-10);
  });
});

/** S_j at a pixel by the definition: a Gaussian and a linear phase about each of `n` elements, over their root sum of squares. */
function sensitivities(n: number, p: number, q: number, width: number): { re: number; im: number }[] {
  const elements = Array.from({ length: n }, (_, j) => {
    const angle = (2 * Math.PI * j) / n;
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    const size = Math.exp(-((p - 0.7 * c) ** 2 + (q - 0.7 * s) ** 2) / (2 * width ** 2));
    const phase = angle + Math.PI * (p * c + q * s);
    return { re: size * Math.cos(phase), im: size * Math.sin(phase) };
  });
  const root = Math.sqrt(elements.reduce((sum, { re, im }) => sum + re * re + im * im, 0));
  return elements.map(({ re, im }) => ({ re: re / root, im: im / root }));
}

test("Two-fold, a point comes back with the weights of the definition: (S'ᴴS')⁻¹S'ᴴS, at its place and half a field away", () => {
  const object = complexZeros(centredGrid(32, 24, [1e-3, 1e-3]));
  object.re[(16 + 5) * 24 + 12 + 3] = 1;
  const image = unfolded(object, { displacement: 4, width: 0.4 });
  const S = sensitivities(8, 5 / 32, 3 / 32, 0.4);
  const [A, B] = [sensitivities(8, (5 - 4) / 32, 3 / 32, 0.4), sensitivities(8, (5 - 16 - 4) / 32, 3 / 32, 0.4)];
  const dot = (u: typeof S, v: typeof S) => ({
    re: u.reduce((sum, { re, im }, j) => sum + re * (v[j]?.re ?? NaN) + im * (v[j]?.im ?? NaN), 0),
    im: u.reduce((sum, { re, im }, j) => sum + re * (v[j]?.im ?? NaN) - im * (v[j]?.re ?? NaN), 0),
  });
  // Cramer's rule for [1 h; h* 1][x y] = [a b]: every map has length 1.
  const [h, a, b] = [dot(A, B), dot(A, S), dot(B, S)];
  const determinant = 1 - h.re ** 2 - h.im ** 2;
  const x = { re: a.re - (h.re * b.re - h.im * b.im), im: a.im - (h.re * b.im + h.im * b.re) };
  const y = { re: b.re - (h.re * a.re + h.im * a.im), im: b.im - (h.re * a.im - h.im * a.re) };
  const [here, there] = [(16 + 5) * 24 + 15, 5 * 24 + 15];
  expect(image.re[here]).toBeCloseTo(x.re / determinant, 12);
  expect(image.im[here]).toBeCloseTo(x.im / determinant, 12);
  expect(image.re[there]).toBeCloseTo(y.re / determinant, 12);
  expect(image.im[there]).toBeCloseTo(y.im / determinant, 12);
  expect(absolute(image, 5, 15)).toBeGreaterThan(0.02);
});

describe('Maps that lie elsewhere', () => {
  test.each([2, 3, 4])('leave copies N/R away, R = %i, and nothing in between', (R) => {
    const image = unfolded(box(48, [22, 26], [10, 38]), { accelerationFactor: R, displacement: 3 });
    let outside = 0;
    for (let row = 0; row < 48; row++) {
      const onCopy = Array.from({ length: R }, (_, k) => (row - 22 + (k * 48) / R + 48) % 48).some((distance) => distance < 4);
      if (!onCopy) outside = Math.max(outside, absolute(image, row, 24));
    }
    expect(outside).toBeLessThan(1e-12);
    expect(absolute(image, (24 + 48 / R) % 48, 12)).toBeGreaterThan(0.01);
  });

  test('leave more the further off they are', () => {
    const object = box(64, [20, 44], [12, 52]);
    const residual = (displacement: number) => {
      const image = unfolded(object, { displacement });
      return energy({ ...image, re: image.re.map((value, i) => value - (object.re[i] ?? NaN)) });
    };
    expect(residual(4)).toBeGreaterThan(3 * residual(2));
    expect(residual(-4)).toBeCloseTo(residual(4), -1);
  });
});

test('Maps with noise leave copies too, and true maps with none of it do not', () => {
  const object = box(48, [22, 26], [10, 38]);
  expect(absolute(unfolded(object, { mapNoise: 20 }), 0, 24)).toBeGreaterThan(0.01);
  expect(absolute(unfolded(object, {}), 0, 24)).toBeLessThan(1e-12);
});

describe('A field of view smaller than the object', () => {
  test('shows what it holds, and true where nothing folds in', () => {
    const object = noisePlane(40, 10);
    object.re.fill(0, 0, 12 * 10).fill(0, 28 * 10);
    object.im.fill(0, 0, 12 * 10).fill(0, 28 * 10);
    const image = unfolded(object, { fraction: 0.5 });
    expect([image.rows, image.columns]).toEqual([20, 10]);
    for (let row = 0; row < 20; row++) {
      for (let column = 0; column < 10; column++) {
        expect(image.re[row * 10 + column]).toBeCloseTo(object.re[(row + 10) * 10 + column] ?? NaN, 11);
      }
    }
  });

  test('brings what reaches out of it back into its middle, half of it away, not to the edge as wrap-around does', () => {
    // 64 lines, of which 48 are shown; 24 fold. A bar at −28 … −25 lies a little outside, where −24 … 23 are shown: it folds to −4 … −1.
    const image = unfolded(box(64, [4, 8], [20, 44]), { fraction: 0.75 });
    expect(image.rows).toBe(48);
    const brightest = (from: number, to: number) => Math.max(...Array.from({ length: to - from }, (_, i) => absolute(image, from + i, 32)));
    expect(brightest(20, 24)).toBeGreaterThan(0.1);
    expect(brightest(24, 44)).toBeLessThan(1e-12);
    expect(brightest(0, 20)).toBeLessThan(1e-12);
  });
});

describe('Noise', () => {
  test('with all lines has the standard deviation asked for, in each part', () => {
    const object = box(128, [0, 128], [0, 128]);
    const { re, im } = unfolded(object, { accelerationFactor: 1, noise: 5 });
    const variance = re.reduce((sum, value) => sum + (value - 1) ** 2, 0) / re.length;
    // 16,384 samples: the standard deviation of a variance is √(2/16384) = 1.1 % of it; four of them.
    expect(variance / 0.05 ** 2).toBeGreaterThan(0.956);
    expect(variance / 0.05 ** 2).toBeLessThan(1.044);
    expect(im.reduce((sum, value) => sum + value ** 2, 0) / im.length / variance).toBeCloseTo(1, 1);
  });

  test.each([
    [2, 8],
    [3, 8],
    [4, 16],
  ])(
    'of %i-fold acceleration and %i elements is g·√R times that, pixel by pixel (Pruessmann 1999, SNR = SNR_full/(g√R))',
    (R, elements) => {
      // One column of 12 lines, 600 times over.
      const n = 12;
      const places = Float64Array.from({ length: n }, (_, i) => (i - n / 2) / n);
      const array = elementsAt({ elements, radius: 0.7, width: 0.3, firstAngle: 0 }, places, Float64Array.of(0));
      const object = complexZeros(centredGrid(n, 1, [1e-3, 1e-3]));
      object.re.fill(1);
      const sums = new Float64Array(n);
      for (let seed = 0; seed < 600; seed++) {
        const { re, im } = unfolded(object, { accelerationFactor: R, elements, noise: 10 }, 'column', seed);
        re.forEach((value, i) => (sums[i] = (sums[i] ?? NaN) + (value - 1) ** 2 + (im[i] ?? NaN) ** 2));
      }
      for (let folded = 0; folded < n / R; folded++) {
        const maps = { ...complexArray(elements * R), nElements: elements, nPlaces: R };
        for (let k = 0; k < R; k++) sensitivitiesAt(array, folded + (k * n) / R, 0, maps, k * elements);
        geometryFactors(maps).forEach((g, k) => {
          const grown = (sums[folded + (k * n) / R] ?? NaN) / (1200 * 0.1 ** 2);
          // 1200 samples: √(2/1200) = 4.1 % of the variance; four and a half of them for 12 pixels.
          expect(Math.abs(grown / (g * g * R) - 1)).toBeLessThan(0.18);
        });
      }
    },
  );
});
