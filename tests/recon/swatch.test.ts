/** The one rule from mild to strong: through the initial value, on the step, within the range. */
import { defineCause, type Encoded } from '../../recon/cause';
import { causes } from '../../recon/causes';
import { choice, quantity } from '../../recon/parameter';
import { checkRecipe } from '../../recon/recipe-check';
import { strengthOf, swatchRecipe, valuesAt } from '../../recon/swatch';

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

test('A quantity goes from a quarter of its initial effect to two and a half times it, upwards or downwards', () => {
  expect(strengthOf(sample)).toMatchObject({ swing: [0.5, 5] });
  // 1 − 0.25·0.3 = 0.925, on the step from 0.5; 1 − 2.5·0.3 = 0.25 lies below the range.
  expect(strengthOf(sample).fraction).toEqual([0.93, 0.5]);
});

test('A step coarser than the mild effect still leaves the identity', () => {
  expect(strengthOf(sample).factor).toEqual([2, 4]);
});

test('Choices, and what starts at its identity, stay as they are', () => {
  expect(valuesAt(sample, 1)).toEqual({ kind: 'two', swing: 5, fraction: 0.5, factor: 4, offset: 0 });
});

test('A cause may state its own ends, and then nothing else is moved', () => {
  const stated = defineCause({ ...draft, parameters, identity, strength: { offset: [1, -4] }, apply: (kspace: Encoded) => kspace });
  expect(valuesAt(stated, 0.5)).toEqual({ kind: 'two', swing: 2, fraction: 0.7, factor: 2, offset: -1.5 });
});

test.each(causes.map((cause) => [cause.id, cause] as const))(
  '%s moves something, and its recipe is valid at every strength',
  (_, cause) => {
    expect(Object.keys(strengthOf(cause))).not.toEqual([]);
    for (const strength of [0, 0.25, 0.5, 0.75, 1]) expect(checkRecipe(swatchRecipe(cause, strength)).slice(1)).toEqual([]);
  },
);
