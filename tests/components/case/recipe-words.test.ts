/** A recipe in one line, as the list of trials shows it. */
import { recipeWords } from '@/components/case/view/recipe-words';
import { describeCause } from '@/recon/catalogue';
import { periodicMotion } from '@/recon/causes/periodic-motion';
import { causeSchema } from '@/server/contract/catalogue';

const catalogue = [causeSchema.parse(describeCause(periodicMotion))];
const recipe = (parameters: Record<string, number | string>, enabled = true) => ({
  steps: [{ cause: 'periodic-motion', parameters, enabled }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});
const motion = { moves: 'phase', frequency: 0.3, phaseSwing: 0.5, displacement: 5, modulation: 0.2 };

test('A step is its cause with the values that matter at the choices made', () => {
  expect(recipeWords(recipe(motion), catalogue)).toMatch(/^Periodic motion: .*frequency 0.3 Hz, .*phase swing 0.5 rad/);
  expect(recipeWords(recipe(motion), catalogue)).not.toMatch(/displacement|brightness/);
  expect(recipeWords(recipe({ ...motion, moves: 'along-readout' }), catalogue)).toMatch(/displacement 5 mm/);
});

test('A step that is switched off did nothing, and a recipe of no step says so', () => {
  expect(recipeWords(recipe(motion, false), catalogue)).toBe('no cause: the image as it is');
});
