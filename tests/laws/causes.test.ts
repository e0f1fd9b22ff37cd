/** Laws that every cause obeys. A cause that is added to the list is tried by them without another line. */
import type { Cause, Context, Encoded } from '../../recon/cause';
import { causes } from '../../recon/causes';
import type { ComplexPlane } from '../../recon/grid';
import { fullyTaken } from '../../recon/lines';
import type { ParameterValues, Recipe } from '../../recon/recipe';
import { checkRecipe } from '../../recon/recipe-check';
import { largestDifference, noisePlane, transposed } from '../recon/planes';
import { acquisitions, contextOf, corners, initialValues, isOneResult, refused, sizes, turns } from './samples';

const recipeOf = (cause: Cause, parameters: ParameterValues): Recipe => ({
  steps: [{ cause: cause.id, parameters }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});

/** Object causes get the plane, the others the same numbers as k-space of which all is taken. */
function act(cause: Cause, input: Encoded, parameters: ParameterValues, context: Context): ComplexPlane & { taken?: Uint8Array } {
  return cause.domain === 'image' ? cause.apply(input, parameters, context) : cause.apply(input, parameters, context);
}

/** Every size, acquisition and corner of the parameters. */
function forAll(cause: Cause, law: (input: Encoded, parameters: ParameterValues, context: () => Context) => void): void {
  for (const [rows, columns] of sizes) {
    for (const acquisition of acquisitions) {
      for (const parameters of corners(cause.parameters))
        law(fullyTaken(noisePlane(rows, columns)), parameters, () => contextOf(acquisition));
    }
  }
}

test('No two causes have the same id', () => {
  expect(new Set(causes.map(({ id }) => id)).size).toBe(causes.length);
});

describe.each(causes.map((cause) => [cause.id, cause] as const))('%s', (_id, cause) => {
  test('accepts its initial values and both ends of every parameter', () => {
    for (const parameters of corners(cause.parameters)) expect(checkRecipe(recipeOf(cause, parameters))).toEqual([]);
  });

  test('refuses what is out of range, naming the parameter, the value and what is permitted', () => {
    for (const [id, parameter] of Object.entries(cause.parameters)) {
      for (const value of refused(parameter)) {
        const faults = checkRecipe(recipeOf(cause, { ...initialValues(cause.parameters), [id]: value }));
        expect(faults).toHaveLength(1);
        expect(faults[0]?.path).toEqual(['steps', 0, 'parameters', id]);
        expect(faults[0]?.message).toContain(id);
        expect(faults[0]?.message).toContain(String(value));
        if (parameter.kind === 'quantity') expect(faults[0]?.message).toContain(`${parameter.min} to ${parameter.max}`);
      }
    }
  });

  test('starts on a step of its range', () => {
    for (const parameter of Object.values(cause.parameters)) {
      if (parameter.kind === 'choice') continue;
      const steps = (parameter.initial - parameter.min) / parameter.step;
      expect(Math.abs(steps - Math.round(steps))).toBeLessThan(1e-9);
    }
  });

  test('leaves its input as it was, and returns arrays of its own', () => {
    forAll(cause, (input, parameters, context) => {
      const before = { re: input.re.slice(), im: input.im.slice(), taken: input.taken.slice() };
      const result = act(cause, input, parameters, context());
      expect([input.re, input.im, input.taken]).toEqual([before.re, before.im, before.taken]);
      expect(result.re).not.toBe(input.re);
      expect(result.im).not.toBe(input.im);
    });
  });

  test('gives the same bytes for the same seed', () => {
    forAll(cause, (input, parameters, context) => {
      const [first, second] = [act(cause, input, parameters, context()), act(cause, input, parameters, context())];
      expect([first.re, first.im]).toEqual([second.re, second.im]);
    });
  });

  test('gives finite numbers at both ends of every parameter', () => {
    forAll(cause, (input, parameters, context) => {
      const { re, im } = act(cause, input, parameters, context());
      expect(re.every(Number.isFinite) && im.every(Number.isFinite)).toBe(true);
    });
  });

  test('has the shape that its grid says, and keeps it unless it declares otherwise', () => {
    forAll(cause, (input, parameters, context) => {
      const result = act(cause, input, parameters, context());
      expect(result.re).toHaveLength(result.rows * result.columns);
      expect(result.im).toHaveLength(result.rows * result.columns);
      if (cause.domain === 'kspace') expect(result.taken).toHaveLength(result.rows * result.columns);
      if (cause.changesMatrix !== true) expect([result.rows, result.columns]).toEqual([input.rows, input.columns]);
    });
  });

  test('leaves samples that are not taken at zero', () => {
    forAll(cause, (input, parameters, context) => {
      const { re, im, taken } = act(cause, input, parameters, context());
      taken?.forEach((isTaken, i) => {
        if (isTaken === 0) expect([re[i], im[i]]).toEqual([0, 0]);
      });
    });
  });

  test('does nothing at the values that it declares as its identity', () => {
    const { identity } = cause;
    if (!identity) return;
    for (const [rows, columns] of sizes) {
      for (const acquisition of acquisitions) {
        const input = fullyTaken(noisePlane(rows, columns));
        const result = act(cause, input, identity, contextOf(acquisition));
        // Two transforms of samples about 5 at most: rounding.
        expect(largestDifference(result, input)).toBeLessThan(1e-13);
        expect(result.taken ?? input.taken).toEqual(input.taken);
      }
    }
  });

  test('acts along the other axis in the same way when phase encoding is swapped, or takes no notice of it where it runs along neither', () => {
    for (const parameters of corners(cause.parameters)) {
      const input = noisePlane(15, 21);
      const along = act(cause, fullyTaken(input), parameters, contextOf({ phaseEncode: 'column' }));
      if (cause.runsAlong === 'none') {
        const other = act(cause, fullyTaken(input), parameters, contextOf({ phaseEncode: 'row' }));
        expect([other.re, other.im]).toEqual([along.re, along.im]);
        continue;
      }
      const across = act(cause, fullyTaken(transposed(input)), parameters, contextOf({ phaseEncode: 'row' }));
      expect(largestDifference(transposed(across), along)).toBeLessThan(1e-13);
    }
  });

  const resultsOf = (input: Encoded, settings: readonly ParameterValues[]) =>
    settings.map((parameters) => act(cause, input, parameters, contextOf({ phaseEncode: 'row', repetitionTime: 0.7, averages: 2 })));

  test('a parameter that is not shown changes no byte', () => {
    const input = fullyTaken(noisePlane(12, 15));
    for (const { id, settings } of turns(cause.parameters, false)) {
      if (!isOneResult(resultsOf(input, settings))) expect([id, settings]).toEqual('one result');
    }
  });

  test('every parameter that is shown changes the result in some setting', () => {
    // Most show it on few samples; half a side of 48 lines holds the places of spikes.
    const inputs = [fullyTaken(noisePlane(12, 15)), fullyTaken(noisePlane(96, 96))];
    const shown = turns(cause.parameters, true);
    for (const id of Object.keys(cause.parameters)) {
      const turned = shown.filter((turn) => turn.id === id);
      const changes = inputs.some((input) => turned.some(({ settings }) => !isOneResult(resultsOf(input, settings))));
      expect([id, changes]).toEqual([id, true]);
    }
  });

  test('says what it looks like, where it is published, and what each remedy costs', () => {
    expect(cause.looks.image.length).toBeGreaterThan(20);
    expect(cause.looks.kspace.length).toBeGreaterThan(20);
    expect(cause.sources.length).toBeGreaterThan(0);
    expect(cause.remedies.some(({ who }) => who === 'technologist')).toBe(true);
    for (const { change, price } of cause.remedies) expect(Math.min(change.length, price.length)).toBeGreaterThan(8);
  });
});
