/** The one rule from mild to strong: through the initial value, on the step, within the range. */
import { defineCause, defineReconstruction, type Cause, type Encoded } from '../../recon/cause';
import { causes } from '../../recon/causes';
import { truncation } from '../../recon/causes/truncation';
import { choice, quantity } from '../../recon/parameter';
import { checkRecipe } from '../../recon/recipe-check';
import { reconstructions } from '../../recon/reconstructions';
import { movedBy, swatchRecipe } from '../../recon/swatch';

const draft = {
  id: 'sample',
  title: 'Sample',
  stage: 'encoding',
  domain: 'kspace',
  seen: [],
  runsAlong: 'none',
  formula: '',
  drivers: [],
  looks: { image: '', kspace: '' },
  sources: [],
  remedies: [],
} as const;
const parameters = {
  kind: choice({
    label: 'Kind',
    options: [
      { value: 'one', label: 'One' },
      { value: 'two', label: 'Two' },
    ],
    initial: 'two',
  }),
  swing: quantity({ label: 'Swing', unit: 'rad', min: 0, max: 10, step: 0.1, initial: 2 }),
  fraction: quantity({ label: 'Fraction', unit: '', min: 0.5, max: 1, step: 0.01, initial: 0.7 }),
  factor: quantity({ label: 'Factor', unit: '×', min: 1, max: 8, step: 1, initial: 2 }),
  offset: quantity({ label: 'Offset', unit: 'mm', min: -5, max: 5, step: 0.1, initial: 0 }),
};
const identity = { kind: 'one', swing: 0, fraction: 1, factor: 1, offset: 0 } as const;
const sample = defineCause({ ...draft, parameters, identity, apply: (kspace: Encoded) => kspace });
const endsOf = (label: string) => movedBy(sample).find(({ quantity }) => quantity.label === label)?.ends;
const valuesAt = (cause: Cause, strength: number) => swatchRecipe(cause, strength).steps[0]?.parameters;

test('A quantity goes from a quarter of its initial effect to two and a half times it, upwards or downwards', () => {
  expect(endsOf('Swing')).toEqual([0.5, 5]);
  // 1 − 0.25·0.3 = 0.925, on the step from 0.5; 1 − 2.5·0.3 = 0.25 lies below the range.
  expect(endsOf('Fraction')).toEqual([0.93, 0.5]);
});

test('A step coarser than the mild effect still leaves the identity', () => {
  expect(endsOf('Factor')).toEqual([2, 4]);
});

test('Choices, and what starts at its identity, stay as they are', () => {
  expect(valuesAt(sample, 1)).toEqual({ kind: 'two', swing: 5, fraction: 0.5, factor: 4, offset: 0 });
});

test('A cause may state its own ends, and then nothing else is moved', () => {
  const stated = defineCause({ ...draft, parameters, identity, strength: { offset: [1, -4] }, apply: (kspace: Encoded) => kspace });
  expect(valuesAt(stated, 0.5)).toEqual({ kind: 'two', swing: 2, fraction: 0.7, factor: 2, offset: -1.5 });
});

test('A reconstruction acts on the steps that it names, with what strength moves in them, and with the values that it holds', () => {
  const { offset } = parameters;
  const method = defineReconstruction({
    ...draft,
    id: 'put together',
    parameters: { kind: parameters.kind, offset },
    strength: { offset: [0, 5] },
    shownOn: { steps: [{ cause: truncation, strength: { fraction: [1, 0.5] } }], parameters: { kind: 'one' } },
    reconstruct: (kspace: Encoded) => kspace,
  });
  expect(swatchRecipe(method, 0.5)).toMatchObject({
    steps: [{ cause: 'truncation', parameters: { fraction: 0.75, direction: 'phase-encode' } }],
    reconstruction: { method: 'put together', parameters: { kind: 'one', offset: 2.5 } },
  });
  expect(movedBy(method).map(({ quantity, ends }) => [quantity.label, ...ends])).toEqual([
    ['Matrix acquired', 1, 0.5],
    ['Offset', 0, 5],
  ]);
});

test.each([...causes, ...reconstructions].map((entry) => [entry.id, entry] as const))(
  '%s moves something, and its recipe is valid at every strength',
  (_, entry) => {
    expect(movedBy(entry)).not.toEqual([]);
    for (const strength of [0, 0.25, 0.5, 0.75, 1]) expect(checkRecipe(swatchRecipe(entry, strength))).toEqual([]);
  },
);
