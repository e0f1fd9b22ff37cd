/** Unfolding: geometry factors worked out outside, the solution against the definition, the noise against the inverse matrix. */
import { randomOf } from '../../recon/random';
import type { Sensitivities } from '../../recon/unfolding';
import { complexArray, factorise, geometryFactors, project, solveLower, solveUpper } from '../../recon/unfolding';
import { unfoldingReference as reference } from '../reference/unfolding';

/** From rows of elements, each [re, im] by place. */
function mapsOf(rows: readonly (readonly (readonly [number, number])[])[]): Sensitivities {
  const nPlaces = rows[0]?.length ?? 0;
  const maps = { ...complexArray(rows.length * nPlaces), nElements: rows.length, nPlaces };
  rows.forEach((row, j) =>
    row.forEach(([re, im], place) => {
      maps.re[place * rows.length + j] = re;
      maps.im[place * rows.length + j] = im;
    }),
  );
  return maps;
}

function randomMaps(nElements: number, nPlaces: number): Sensitivities {
  const random = randomOf(3, 'maps');
  const normals = () => Float64Array.from({ length: nElements * nPlaces }, () => random.normal());
  return { re: normals(), im: normals(), nElements, nPlaces };
}

describe('The geometry factor', () => {
  test.each(['overlapping', 'threeWithPhase', 'apart'] as const)(
    'of sensitivities that are %s is that of the outside calculation',
    (name) => {
      // Nine decimals are stored.
      geometryFactors(mapsOf(reference.sensitivities[name])).forEach((g) => expect(g).toBeCloseTo(reference.geometryFactor[name], 9));
    },
  );

  test('is 1 where there is one place to a pixel', () => {
    expect(geometryFactors(randomMaps(5, 1))[0]).toBeCloseTo(1, 12);
  });

  test('stays finite where no element tells two places apart', () => {
    const [alike] = geometryFactors(
      mapsOf([
        [
          [1, 0],
          [1, 0],
        ],
        [
          [0, 1],
          [0, 1],
        ],
      ]),
    );
    // Pivots below 1e-6 of the mean diagonal are raised to it: g = √(1 + 1e6) at most about that.
    expect(alike).toBeGreaterThan(100);
    expect(alike).toBeLessThan(1.1e3);
  });
});

test('Sensitivities that reach nowhere are refused', () => {
  expect(() =>
    factorise(
      mapsOf([
        [
          [0, 0],
          [0, 0],
        ],
      ]),
      complexArray(4),
    ),
  ).toThrow(RangeError);
});

test.each([2, 3, 4])('What six elements see of %i places is told apart again', (nPlaces) => {
  const maps = randomMaps(6, nPlaces);
  const places = { re: Float64Array.of(1, -2, 0.5, 3).slice(0, nPlaces), im: Float64Array.of(0.3, 1, -4, 0).slice(0, nPlaces) };
  const signal = complexArray(6);
  for (let j = 0; j < 6; j++) {
    for (let p = 0; p < nPlaces; p++) {
      const [a, b] = [maps.re[p * 6 + j] ?? NaN, maps.im[p * 6 + j] ?? NaN];
      const [c, d] = [places.re[p] ?? NaN, places.im[p] ?? NaN];
      signal.re[j] = (signal.re[j] ?? NaN) + a * c - b * d;
      signal.im[j] = (signal.im[j] ?? NaN) + a * d + b * c;
    }
  }
  const factor = complexArray(nPlaces * nPlaces);
  const solved = complexArray(nPlaces);
  factorise(maps, factor);
  project(maps, signal, solved);
  solveLower(factor, nPlaces, solved);
  solveUpper(factor, nPlaces, solved);
  for (let p = 0; p < nPlaces; p++) {
    // Rounding, times the condition of random maps, under 100.
    expect(solved.re[p]).toBeCloseTo(places.re[p] ?? NaN, 12);
    expect(solved.im[p]).toBeCloseTo(places.im[p] ?? NaN, 12);
  }
});
