/** Recipes against the catalogue: what is wrong with one, and one with every value filled in. */
import type { Acquisition } from './acquisition';
import type { Cause, Reconstruction } from './cause';
import { causes } from './causes/index';
import { initialOf } from './initial';
import type { Parameter, Parameters } from './parameter';
import type { ParameterValues, Recipe, RecipeFault } from './recipe';
import { reconstructions } from './reconstructions/index';

export const causeOf = (id: string): Cause | undefined => causes.find((cause) => cause.id === id);
export const reconstructionOf = (id: string): Reconstruction | undefined => reconstructions.find((method) => method.id === id);
/** What the catalogue has under this name. */
export const entryOf = (id: string): Cause | Reconstruction | undefined => causeOf(id) ?? reconstructionOf(id);

const listed = (ids: readonly string[]): string => ids.join(', ');

function valueFault(id: string, parameter: Parameter, value: number | string): string | undefined {
  if (parameter.kind === 'choice') {
    const values = parameter.options.map((option) => option.value);
    return values.some((offered) => offered === value) ? undefined : `${id} must be one of ${listed(values)}, got ${value}`;
  }
  const { min, max, unit } = parameter;
  const isWithin = typeof value === 'number' && value >= min && value <= max;
  return isWithin ? undefined : `${id} must be a number from ${min} to ${max} ${unit}, got ${value}`;
}

function valueFaults(parameters: Parameters, values: ParameterValues, path: RecipeFault['path']): RecipeFault[] {
  const faults: RecipeFault[] = [];
  for (const [id, parameter] of Object.entries(parameters)) {
    const value = Object.hasOwn(values, id) ? values[id] : undefined;
    const message = value === undefined ? `${id} is missing` : valueFault(id, parameter, value);
    if (message) faults.push({ path: [...path, id], message });
  }
  for (const id of Object.keys(values)) {
    if (Object.hasOwn(parameters, id)) continue;
    const known = Object.keys(parameters);
    faults.push({
      path: [...path, id],
      message: `${id} is not a parameter here; ${known.length ? `known: ${listed(known)}` : 'there are none'}`,
    });
  }
  return faults;
}

/** Every fault of a recipe that should be complete. Disabled steps are checked too: they are stored and can be switched on. */
export function checkRecipe(recipe: Recipe): RecipeFault[] {
  const faults = recipe.steps.flatMap((step, index): RecipeFault[] => {
    const cause = causeOf(step.cause);
    if (cause) return valueFaults(cause.parameters, step.parameters, ['steps', index, 'parameters']);
    const known = listed(causes.map(({ id }) => id));
    return [{ path: ['steps', index, 'cause'], message: `cause must be one of ${known}, got ${step.cause}` }];
  });
  const { method: id, parameters } = recipe.reconstruction;
  const method = reconstructionOf(id);
  if (method) faults.push(...valueFaults(method.parameters, parameters, ['reconstruction', 'parameters']));
  else {
    const known = listed(reconstructions.map((known) => known.id));
    faults.push({ path: ['reconstruction', 'method'], message: `method must be one of ${known}, got ${id}` });
  }
  const range = recipe.objectPhase?.range;
  if (range !== undefined && !(range >= 0 && range <= 2 * Math.PI)) {
    faults.push({ path: ['objectPhase', 'range'], message: `range must be a number from 0 to 2π rad, got ${range}` });
  }
  return faults;
}

const filledIn = (parameters: Parameters, values: ParameterValues, acquisition?: Acquisition): ParameterValues => ({
  ...Object.fromEntries(Object.entries(parameters).map(([id, parameter]) => [id, initialOf(parameter, acquisition).value])),
  ...values,
});

/**
 * The recipe with the initial value for every parameter that was left out: the one the catalogue announces for this acquisition.
 * What is stored is the completed recipe, so that it gives the same bytes again when a default changes. Unknown causes and methods are
 * left as they are, for `checkRecipe` to name.
 */
export function completeRecipe(recipe: Recipe, acquisition?: Acquisition): Recipe {
  const { method, parameters } = recipe.reconstruction;
  return {
    ...recipe,
    steps: recipe.steps.map((step) => ({
      ...step,
      parameters: filledIn(causeOf(step.cause)?.parameters ?? {}, step.parameters, acquisition),
    })),
    reconstruction: { method, parameters: filledIn(reconstructionOf(method)?.parameters ?? {}, parameters, acquisition) },
  };
}
