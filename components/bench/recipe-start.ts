/** The recipe that the bench starts with: nothing done yet, or one cause of the catalogue where the address names it. */
import type { Cause, Method } from '@/server/contract/catalogue';
import type { Recipe } from '@/server/contract/recipe';
import { initialValues, usualObjectPhase } from './recipe-order';

const firstSeed = 1;

/** The first reconstruction of the catalogue; the cause `add` as the only step, with an object phase where it needs one. */
export function startRecipe([method]: readonly Method[], causes: readonly Cause[], add: string | undefined): Recipe {
  const cause = causes.find(({ id }) => id === add);
  return {
    steps: cause ? [{ cause: cause.id, parameters: initialValues(cause.parameters) }] : [],
    reconstruction: { method: method?.id ?? 'zero-filled', parameters: method ? initialValues(method.parameters) : {} },
    ...(cause?.needsObjectPhase ? { objectPhase: { range: usualObjectPhase, seed: firstSeed } } : {}),
    seed: firstSeed,
  };
}
