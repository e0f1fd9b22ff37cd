import type { Recipe } from '../../recon/recipe';
import { checkRecipe, completeRecipe } from '../../recon/recipe-check';

/** Every parameter of a cause named by hand, and no other. */
const wrapAround = { fraction: 0.75, offCentre: 0.1 };
const complete: Recipe = {
  steps: [{ cause: 'field-of-view-reduction', parameters: wrapAround }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
};
const withStep = (cause: string, parameters: Record<string, number | string>): Recipe => ({ ...complete, steps: [{ cause, parameters }] });

describe('The check of a recipe', () => {
  test('finds nothing in a complete one', () => {
    expect(checkRecipe(complete)).toEqual([]);
  });

  test('names an unknown cause at the step where it stands, and the causes there are', () => {
    const recipe = { ...complete, steps: [...complete.steps, { cause: 'gremlins', parameters: {} }] };
    const [fault, ...others] = checkRecipe(recipe);
    expect(others).toEqual([]);
    expect(fault?.path).toEqual(['steps', 1, 'cause']);
    expect(fault?.message).toMatch(/periodic-motion.*got gremlins/);
  });

  test('names a missing and an unknown parameter', () => {
    const faults = checkRecipe(withStep('field-of-view-reduction', { fraction: 0.75, centre: 0 }));
    expect(faults.map(({ path }) => path)).toEqual([
      ['steps', 0, 'parameters', 'offCentre'],
      ['steps', 0, 'parameters', 'centre'],
    ]);
  });

  test('is not fooled by names that every object has', () => {
    const faults = checkRecipe(withStep('field-of-view-reduction', { ...wrapAround, constructor: 1 }));
    expect(faults.map(({ path }) => path)).toEqual([['steps', 0, 'parameters', 'constructor']]);
  });

  test('names a value out of range with its range, also in a step that is switched off', () => {
    const [fault] = checkRecipe({ ...complete, steps: [{ cause: 'partial-fourier', parameters: { fraction: 0.1 }, enabled: false }] });
    expect(fault).toEqual({
      path: ['steps', 0, 'parameters', 'fraction'],
      message: 'fraction must be a number from 0.625 to 1 of N, got 0.1',
    });
  });

  test('names an unknown method, and an object phase beyond a full turn', () => {
    const faults = checkRecipe({ ...complete, reconstruction: { method: 'magic', parameters: {} }, objectPhase: { range: 7, seed: 1 } });
    expect(faults.map(({ path }) => path)).toEqual([
      ['reconstruction', 'method'],
      ['objectPhase', 'range'],
    ]);
  });
});

describe('A completed recipe', () => {
  test('has the initial value for what was left out, and keeps what was given', () => {
    const recipe = completeRecipe(withStep('field-of-view-reduction', { offCentre: 0.1 }));
    expect(recipe.steps[0]?.parameters).toEqual(wrapAround);
    expect(checkRecipe(recipe)).toEqual([]);
  });

  test('takes from the scan facts what they say', () => {
    const facts = { phaseEncode: 'row', accelerationFactor: 3 } as const;
    const recipe = completeRecipe(withStep('uniform-undersampling', {}), facts);
    expect(recipe.steps[0]?.parameters).toEqual({ accelerationFactor: 3, calibrationLines: 0 });
  });

  test('keeps unknown causes and methods for the check to name', () => {
    const recipe = completeRecipe({ ...withStep('gremlins', { size: 1 }), reconstruction: { method: 'magic', parameters: {} } });
    expect(checkRecipe(recipe)).toHaveLength(2);
  });
});
