/** Laws that every reconstruction obeys. */
import { reconstructions } from '../../recon/reconstructions';
import { inverse, transform } from '../../recon/fourier';
import { magnitude } from '../../recon/grid';
import { fullyTaken, keepLines, linesOf } from '../../recon/lines';
import type { ParameterValues } from '../../recon/recipe';
import { checkRecipe } from '../../recon/recipe-check';
import { largestDifference, noisePlane } from '../recon/planes';
import { acquisitions, contextOf, corners, initialValues, isOneResult, refused, sizes, turns } from './samples';

/** All lines; every second; without the first third; one line alone. */
const samplings: readonly ((line: number, nLines: number, centre: number) => boolean)[] = [
  () => true,
  (line, _nLines, centre) => (line - centre) % 2 === 0,
  (line, nLines) => line >= nLines / 3,
  (line, _nLines, centre) => line === centre,
];

test('No two methods have the same id', () => {
  expect(new Set(reconstructions.map(({ id }) => id)).size).toBe(reconstructions.length);
});

describe.each(reconstructions.map((method) => [method.id, method] as const))('%s', (_id, method) => {
  test('gives finite numbers of the right shape for any sampling, leaves its input as it was, and repeats itself', () => {
    for (const [rows, columns] of sizes) {
      for (const acquisition of acquisitions) {
        for (const sampling of samplings) {
          for (const parameters of corners(method.parameters)) {
            const full = fullyTaken(noisePlane(rows, columns));
            const lines = linesOf(full, acquisition);
            const kspace = keepLines(full, lines, (line) => sampling(line, lines.nLines, lines.centre));
            const before = { re: kspace.re.slice(), im: kspace.im.slice(), taken: kspace.taken.slice() };
            const image = method.reconstruct(kspace, parameters, contextOf(acquisition));
            expect([image.re.length, image.im.length]).toEqual([image.rows * image.columns, image.rows * image.columns]);
            if (method.changesMatrix !== true) expect([image.rows, image.columns]).toEqual([rows, columns]);
            expect(image.re.every(Number.isFinite) && image.im.every(Number.isFinite)).toBe(true);
            expect([kspace.re, kspace.im, kspace.taken]).toEqual([before.re, before.im, before.taken]);
            const again = method.reconstruct(kspace, parameters, contextOf(acquisition));
            expect(largestDifference(again, image)).toBe(0);
          }
        }
      }
    }
  });

  test('restores the magnitude of an object of which all samples were taken, at the values that it declares as its identity', () => {
    const object = noisePlane(15, 21);
    for (const acquisition of acquisitions) {
      const parameters = method.identity ?? initialValues(method.parameters);
      const image = method.reconstruct(fullyTaken(transform(object)), parameters, contextOf(acquisition));
      const expected = magnitude(inverse(transform(object))).values;
      magnitude(image).values.forEach((value, i) => expect(value).toBeCloseTo(expected[i] ?? NaN, 12));
    }
  });

  test.each([
    ['a parameter that is not shown changes no byte', false],
    ['a parameter that is shown changes the result', true],
  ])('%s', (_law, isShown) => {
    const kspace = fullyTaken(noisePlane(12, 20));
    const lines = linesOf(kspace, { phaseEncode: 'row' });
    const short = keepLines(kspace, lines, (line) => line >= 8);
    const resultOf = (values: ParameterValues) => method.reconstruct(short, values, contextOf({ phaseEncode: 'row' }));
    for (const { id, settings } of turns(method.parameters, isShown)) {
      expect([id, settings[0], !isOneResult(settings.map(resultOf))]).toEqual([id, settings[0], isShown]);
    }
  });

  test('refuses parameters that are out of range', () => {
    for (const [id, parameter] of Object.entries(method.parameters)) {
      for (const value of refused(parameter)) {
        const parameters = { ...initialValues(method.parameters), [id]: value };
        const [fault] = checkRecipe({ steps: [], reconstruction: { method: method.id, parameters }, seed: 1 });
        expect(fault?.path).toEqual(['reconstruction', 'parameters', id]);
      }
    }
  });

  test('says what it looks like, what drives it, what can be changed, and where it is published', () => {
    expect(Math.min(method.looks.image.length, method.looks.kspace.length)).toBeGreaterThan(20);
    expect(method.sources.length).toBeGreaterThan(0);
    expect(Math.min(method.seen.length, method.drivers.length)).toBeGreaterThan(0);
    expect(method.remedies.some(({ who }) => who === 'technologist')).toBe(true);
  });
});
