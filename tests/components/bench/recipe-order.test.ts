/** The order of steps: that of the catalogue, which is the signal chain. */
import { initialValues, inPhysicalOrder } from '@/components/bench/recipe-order';
import type { Cause } from '@/server/contract/catalogue';

const cause = (id: string, stage: Cause['stage']): Cause => ({
  id,
  title: id,
  stage,
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
});
const causes = [cause('phase', 'object'), cause('wrap', 'encoding'), cause('motion', 'encoding')];
const recipe = (...ids: string[]) => ({
  steps: ids.map((id) => ({ cause: id, parameters: {} })),
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});

describe('the steps of a recipe', () => {
  it('stand in the order of the signal chain, and keep the index under which they are stored', () => {
    expect(inPhysicalOrder(recipe('wrap', 'motion', 'phase'), causes).map(({ cause: { id }, index }) => [id, index])).toEqual([
      ['phase', 2],
      ['wrap', 0],
      ['motion', 1],
    ]);
  });

  it('leave out a cause that the catalogue does not know', () => {
    expect(inPhysicalOrder(recipe('unheard-of'), causes)).toEqual([]);
  });

  it('start at the initial values of their parameters', () => {
    expect(
      initialValues([
        { id: 'f', label: 'f', unit: 'Hz', min: 0, max: 1, step: 0.1, initial: 0.3 },
        { id: 'mode', label: 'mode', options: [], initial: 'sine' },
      ]),
    ).toEqual({ f: 0.3, mode: 'sine' });
  });
});
