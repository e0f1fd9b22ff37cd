/** The knots of a recipe: object first, steps in physical order, reconstruction last. */
import { firstKnot, knotsOf } from '@/components/bench/knots';
import type { Cause } from '@/server/contract/catalogue';

const motion: Cause = {
  id: 'motion',
  title: 'Periodic motion',
  stage: 'encoding',
  seen: [],
  runsAlong: 'none',
  formula: '',
  drivers: [],
  parameters: [],
  looks: { image: '', kspace: '' },
  needsObjectPhase: false,
  phantom: { title: 'Head', fieldOfViewMm: 240 },
  strength: [],
  remedies: [],
  sources: [],
};
const methods = [{ id: 'homodyne', title: 'Homodyne', parameters: [], looks: { image: '', kspace: '' }, sources: [] }];
const recipe = {
  steps: [{ cause: 'motion', parameters: {}, enabled: false }],
  reconstruction: { method: 'homodyne', parameters: {} },
  objectPhase: { range: 1.6, seed: 1 },
  seed: 1,
};

describe('the knots of a recipe', () => {
  it('name the object with its phase, each step, and the reconstruction', () => {
    expect(knotsOf(recipe, { causes: [motion], methods }, 'comparison').map(({ word }) => word)).toEqual([
      'comparison, phase 1.60',
      'Periodic motion',
      'Homodyne',
    ]);
  });

  it('leave a step that is switched off open', () => {
    expect(knotsOf(recipe, { causes: [motion], methods }, 'comparison')[1]?.isOn).toBe(false);
  });

  it('say when the recipe acts on the bad image itself', () => {
    expect(knotsOf({ ...recipe, objectPhase: undefined }, { causes: [motion], methods }, 'bad')[0]?.word).toBe('bad image itself');
  });

  it('lie open at the first step, and at the object where there is none', () => {
    expect(firstKnot(recipe)).toBe(0);
    expect(firstKnot({ ...recipe, steps: [] })).toBe('object');
  });
});
