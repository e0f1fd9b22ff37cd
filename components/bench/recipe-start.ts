/** The recipe that the bench starts with: nothing done yet, or what the address names of the catalogue, a cause or a reconstruction. */
import type { Cause, Reconstruction } from '@/server/contract/catalogue';
import type { Recipe } from '@/server/contract/recipe';
import { initialValues, usualObjectPhase } from './recipe-order';

const firstSeed = 1;

/**
 * The cause `add` as the only step and the first reconstruction of the catalogue; or the reconstruction `add` with the steps that show
 * it. With an object phase where it needs one and the image has none of its own.
 */
export function startRecipe(
  methods: readonly Reconstruction[],
  causes: readonly Cause[],
  add: string | undefined,
  ownPhase: boolean,
): Recipe {
  const cause = causes.find(({ id }) => id === add);
  const named = methods.find(({ id }) => id === add);
  const method = named ?? methods[0];
  return {
    steps: cause ? [{ cause: cause.id, parameters: initialValues(cause.parameters) }] : [...(named?.shownOn ?? [])],
    reconstruction: { method: method?.id ?? 'zero-filled', parameters: method ? initialValues(method.parameters) : {} },
    ...(!ownPhase && (cause ?? named)?.needsObjectPhase ? { objectPhase: { range: usualObjectPhase, seed: firstSeed } } : {}),
    seed: firstSeed,
  };
}
