/** What is kept between the steps of a recipe: it saves time, and changes not one byte. */
import type { Acquisition } from '../../recon/acquisition';
import type { Cause, Encoded } from '../../recon/cause';
import { defineCause } from '../../recon/cause';
import { causes } from '../../recon/causes';
import type { Action } from '../../recon/chain';
import { chainOf } from '../../recon/chain';
import { transform } from '../../recon/fourier';
import { quantity } from '../../recon/parameter';
import type { Recipe, Step } from '../../recon/recipe';
import { prepare, simulate } from '../../recon/simulate';
import { contextOf, initialValues } from '../laws/samples';
import { noisePlane } from './planes';

const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.5 };
const object = noisePlane(20, 16);

/** Multiplies by `factor` and counts how often it did. */
function counting(domain: 'image' | 'kspace'): { cause: Cause; calls: () => number } {
  let calls = 0;
  const scaled = (values: Float64Array, factor: number) => values.map((value) => value * factor);
  const described = {
    id: `counting-${domain}`,
    title: 'Counting',
    stage: 'encoding',
    seen: [],
    runsAlong: 'none',
    formula: '',
    drivers: [],
    parameters: { factor: quantity({ label: 'Factor', unit: '', min: 0, max: 9, step: 1, initial: 2 }) },
    looks: { image: '', kspace: '' },
    sources: [],
    remedies: [],
  } as const;
  const cause =
    domain === 'image'
      ? defineCause({
          ...described,
          domain,
          apply: (plane, { factor }) => (calls++, { ...plane, re: scaled(plane.re, factor), im: scaled(plane.im, factor) }),
        })
      : defineCause({
          ...described,
          domain,
          apply: (plane, { factor }) => (calls++, { ...plane, re: scaled(plane.re, factor), im: scaled(plane.im, factor) }),
        });
  return { cause, calls: () => calls };
}

const actionOf = (cause: Cause, factor: number): Action => ({
  key: `${cause.id} ${factor}`,
  cause,
  parameters: { factor },
  context: () => contextOf(acquisition),
});

describe('The chain of steps', () => {
  test('works the steps before the one that moves out once, and once more when the hand goes to another', () => {
    const [onImage, first, second] = [counting('image'), counting('kspace'), counting('kspace')];
    let transforms = 0;
    const chain = chainOf(object, () => (transforms++, transform(object)));
    const run = (a: number, b: number, c: number) =>
      chain.run([actionOf(onImage.cause, a), actionOf(first.cause, b), { ...actionOf(second.cause, c), key: `second ${c}` }]);
    const counts = () => [onImage.calls(), first.calls(), second.calls()];
    run(2, 2, 2);
    expect(counts()).toEqual([1, 1, 1]);
    run(2, 2, 3); // the last step moves: everything again, and its input is kept
    run(2, 2, 4);
    run(2, 2, 5);
    expect(counts()).toEqual([2, 2, 4]);
    run(2, 3, 5); // now the one before it
    run(2, 4, 5);
    expect(counts()).toEqual([3, 4, 6]);
    run(3, 4, 5);
    run(4, 4, 5); // the first has nothing before it
    expect(counts()).toEqual([5, 6, 8]);
    expect(transforms).toBe(0);
  });

  test('gives arrays away: what a caller does with them does not come back', () => {
    const { cause } = counting('kspace');
    const chain = chainOf(object, () => transform(object));
    const actions = [actionOf(cause, 2), { ...actionOf(cause, 3), key: 'again' }];
    const expected = chain.run(actions).re.slice();
    for (let i = 0; i < 3; i++) {
      const { re, im, taken } = chain.run(actions);
      expect(re).toEqual(expected);
      expect(taken).toEqual(new Uint8Array(20 * 16).fill(1));
      for (const values of [re, im, taken]) values.fill(0);
    }
  });

  test('refuses a step on the image after one on k-space', () => {
    const [image, kspace] = [counting('image').cause, counting('kspace').cause];
    expect(() => chainOf(object, () => transform(object)).run([actionOf(kspace, 1), actionOf(image, 1)])).toThrow(
      'counting-image acts on the image, and stands after a step on k-space',
    );
  });
});

describe('A prepared object under a hand', () => {
  /** Every cause of the catalogue, as far as it fits the size, with one value of one parameter after another. */
  const steps: Step[] = causes.map(({ id, parameters }) => ({ cause: id, parameters: initialValues(parameters) }));
  const recipeOf = (changed: readonly Step[], seed = 3): Recipe => ({
    steps: changed,
    reconstruction: { method: 'zero-filled', parameters: {} },
    objectPhase: { range: 1, seed: 4 },
    seed,
  });
  const bytesOf = ({ re, im, taken }: Encoded) => [re, im, taken].map((values) => Buffer.from(values.slice().buffer).toString('base64'));

  test('gives the same bytes with what was kept as without, whichever step and value moves, is switched or taken away', () => {
    const prepared = prepare(object, { range: 1, seed: 4 });
    const moved = (i: number): Step[] =>
      steps.map((step, place) => {
        const [name, parameter] = Object.entries(causes[i]?.parameters ?? {})[0] ?? [];
        if (place !== i || name === undefined || parameter?.kind !== 'quantity') return step;
        return { ...step, parameters: { ...step.parameters, [name]: parameter.min } };
      });
    const recipes = [
      recipeOf(steps),
      ...steps.flatMap((_, i) => [recipeOf(moved(i)), recipeOf(steps)]),
      recipeOf(steps.map((step, i) => (i === 1 ? { ...step, enabled: false } : step))),
      recipeOf(steps.slice(0, -1)),
      recipeOf([]),
      recipeOf(steps, 8),
      recipeOf(steps),
    ];
    for (const recipe of recipes) {
      const kept = simulate(prepared, recipe, acquisition);
      const anew = simulate(object, recipe, acquisition);
      expect(bytesOf(kept.kspace)).toEqual(bytesOf(anew.kspace));
      expect(kept.image.values).toEqual(anew.image.values);
    }
  });

  test('keeps nothing of another acquisition', () => {
    const prepared = prepare(object, { range: 1, seed: 4 });
    const across: Acquisition = { ...acquisition, phaseEncode: 'row' };
    simulate(prepared, recipeOf(steps), acquisition);
    expect(simulate(prepared, recipeOf(steps), across).kspace.re).toEqual(simulate(object, recipeOf(steps), across).kspace.re);
  });
});
