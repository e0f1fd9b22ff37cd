/** The forward model as a whole: what comes out, in which order steps act, and what is kept. */
import type { Acquisition } from '../../recon/acquisition';
import { transform } from '../../recon/fourier';
import { asComplex, magnitude } from '../../recon/grid';
import { withObjectPhase } from '../../recon/object-phase';
import type { Recipe, Step } from '../../recon/recipe';
import { prepare, simulate } from '../../recon/simulate';
import { largestDifference, noisePlane } from './planes';

const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.5 };
const motion: Step = { cause: 'periodic-motion', parameters: { frequency: 0.3, phaseSwing: 0.7, start: 20 } };
const undersampling: Step = { cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 4 } };
const recipeOf = (steps: Step[], rest: Partial<Recipe> = {}): Recipe => ({
  steps,
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
  ...rest,
});

describe('A simulation', () => {
  const object = noisePlane(24, 18);

  test('without steps is the magnitude of the object, and its k-space the transform', () => {
    const { image, kspace, kspaceOfImage } = simulate(object, recipeOf([]), acquisition);
    magnitude(object).values.forEach((value, i) => expect(image.values[i]).toBeCloseTo(value, 12));
    expect(largestDifference(kspace, transform(object))).toBe(0);
    // By the symmetry of a real image, with other roundings: those of fourier.test.ts.
    expect(largestDifference(kspaceOfImage(), transform(asComplex(image)))).toBeLessThan(1e-13);
  });

  test('acts in the order of the signal chain, whatever the order of the recipe', () => {
    const one = simulate(object, recipeOf([motion, undersampling]), acquisition);
    const other = simulate(object, recipeOf([undersampling, motion]), acquisition);
    expect(one.image.values).toEqual(other.image.values);
    expect(one.image.values).not.toEqual(simulate(object, recipeOf([motion]), acquisition).image.values);
  });

  test('leaves out steps that are switched off', () => {
    const off = simulate(object, recipeOf([{ ...motion, enabled: false }]), acquisition);
    expect(off.image.values).toEqual(simulate(object, recipeOf([]), acquisition).image.values);
  });

  test('fills parameters that are left out with their initial values, from the header where it says one', () => {
    const step = { cause: 'field-of-view-reduction', parameters: {} };
    expect(simulate(object, recipeOf([step]), acquisition).image.rows).toBe(18);
    expect(simulate(object, recipeOf([step]), { ...acquisition, phaseFieldOfViewFraction: 0.5 }).image.rows).toBe(12);
  });

  test('gives the object its phase before it is encoded', () => {
    const objectPhase = { range: 1.6, seed: 9 };
    const { kspace } = simulate(object, recipeOf([], { objectPhase }), acquisition);
    expect(largestDifference(kspace, transform(withObjectPhase(object, objectPhase)))).toBe(0);
  });

  test('refuses a recipe that does not fit the catalogue, naming rule and value', () => {
    const wrong = recipeOf([{ cause: 'periodic-motion', parameters: { frequency: 99 } }]);
    expect(() => simulate(object, wrong, acquisition)).toThrow(/frequency must be a number from 0.05 to 3 Hz, got 99/);
    expect(() => simulate(object, recipeOf([{ cause: 'gremlins', parameters: {} }]), acquisition)).toThrow(
      /cause must be one of .*, got gremlins/,
    );
    const method = { method: 'magic', parameters: {} };
    expect(() => simulate(object, recipeOf([], { reconstruction: method }), acquisition)).toThrow(/got magic/);
  });
});

describe('A prepared object', () => {
  const object = noisePlane(20, 16);
  const objectPhase = { range: 1, seed: 2 };

  test('gives the same bytes as the object itself, again and again', () => {
    const prepared = prepare(object, objectPhase);
    const recipe = recipeOf([motion], { objectPhase });
    const expected = simulate(object, recipe, acquisition);
    for (let i = 0; i < 2; i++) {
      const { image, kspace } = simulate(prepared, recipe, acquisition);
      expect(image.values).toEqual(expected.image.values);
      expect(kspace.re).toEqual(expected.kspace.re);
    }
  });

  test('is transformed once, and never handed out: a caller may give the buffers of a result away', () => {
    const prepared = prepare(object);
    const { kspace } = simulate(prepared, recipeOf([]), acquisition);
    expect(prepared.kspace()).toBe(prepared.kspace());
    expect(kspace.re).not.toBe(prepared.kspace().re);
    kspace.re.fill(0);
    expect(simulate(prepared, recipeOf([]), acquisition).kspace.re).toEqual(transform(object).re);
  });

  test('with another phase than the recipe asks for is prepared anew', () => {
    const recipe = recipeOf([], { objectPhase });
    const result = simulate(prepare(object, { range: 2, seed: 3 }), recipe, acquisition);
    expect(result.kspace.re).toEqual(simulate(object, recipe, acquisition).kspace.re);
  });
});
