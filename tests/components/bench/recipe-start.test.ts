/** The recipe that the bench starts with. */
import { startRecipe } from '@/components/bench/recipe-start';
import type { Reconstruction } from '@/server/contract/catalogue';
import { causeWith } from '../cause/causes';

const swing = { id: 'swing', label: 'Swing', unit: 'rad', min: 0, max: 2, step: 0.1, initial: 0.6 };
const causes = [causeWith({ id: 'motion', parameters: [swing] }), causeWith({ id: 'undersampling', needsObjectPhase: true })];
const methodWith = (part: Partial<Reconstruction> & { id: string }): Reconstruction => ({
  ...causeWith({ id: part.id }),
  stage: 'reconstruction',
  shownOn: [],
  ...part,
});
const short = { cause: 'undersampling', parameters: { part: 0.75 } };
const methods = [methodWith({ id: 'zero-filled' }), methodWith({ id: 'homodyne', needsObjectPhase: true, shownOn: [short] })];

test('Without a cause in the address nothing is done yet', () => {
  expect(startRecipe(methods, causes, undefined, false)).toEqual({
    steps: [],
    reconstruction: { method: 'zero-filled', parameters: {} },
    seed: 1,
  });
});

test('A cause in the address is the first step, at its initial values', () => {
  const { steps } = startRecipe(methods, causes, 'motion', false);
  expect(steps).toEqual([{ cause: 'motion', parameters: { swing: 0.6 } }]);
});

test('It brings an object phase where the cause needs one', () => {
  expect(startRecipe(methods, causes, 'undersampling', false).objectPhase).toEqual({ range: 1.6, seed: 1 });
  expect(startRecipe(methods, causes, 'undersampling', true).objectPhase).toBeUndefined();
  expect(startRecipe(methods, causes, 'motion', false).objectPhase).toBeUndefined();
});

test('A reconstruction in the address comes with the steps that show it and the object phase that it needs', () => {
  expect(startRecipe(methods, causes, 'homodyne', false)).toEqual({
    steps: [short],
    reconstruction: { method: 'homodyne', parameters: {} },
    objectPhase: { range: 1.6, seed: 1 },
    seed: 1,
  });
});

test('A cause that is not in the catalogue starts nothing', () => {
  expect(startRecipe(methods, causes, 'gremlins', false).steps).toEqual([]);
});
