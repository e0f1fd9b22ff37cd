/** The recipe that the bench starts with. */
import { startRecipe } from '@/components/bench/recipe-start';
import { describeCause, describeReconstruction } from '@/recon/catalogue';
import { causes as modelled } from '@/recon/causes';
import { reconstructions } from '@/recon/reconstructions';

const causes = modelled.map((cause) => describeCause(cause));
const methods = reconstructions.map((method) => describeReconstruction(method));

test('Without a cause in the address nothing is done yet', () => {
  expect(startRecipe(methods, causes, undefined)).toEqual({
    steps: [],
    reconstruction: { method: 'zero-filled', parameters: {} },
    seed: 1,
  });
});

test('A cause in the address is the first step, at its initial values', () => {
  const { steps } = startRecipe(methods, causes, 'periodic-motion');
  expect(steps).toEqual([{ cause: 'periodic-motion', parameters: { frequency: 0.25, phaseSwing: 0.6, start: 0 } }]);
});

test('It brings an object phase where the cause needs one', () => {
  expect(startRecipe(methods, causes, 'uniform-undersampling').objectPhase).toEqual({ range: 1.6, seed: 1 });
  expect(startRecipe(methods, causes, 'periodic-motion').objectPhase).toBeUndefined();
});

test('A cause that is not in the catalogue starts nothing', () => {
  expect(startRecipe(methods, causes, 'gremlins').steps).toEqual([]);
});
