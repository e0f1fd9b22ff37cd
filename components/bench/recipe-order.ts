/** The order in which the steps of a recipe act: that of the catalogue, which is the signal chain, whatever the order of the clicks. */
import type { Cause, CatalogueParameter } from '@/server/contract/catalogue';
import type { Recipe, RecipeStep } from '@/server/contract/recipe';

export interface PlacedStep {
  /** Index within the recipe as it is stored. */
  readonly index: number;
  readonly step: RecipeStep;
  readonly cause: Cause;
}

/** The steps in physical order; steps of one cause keep the order in which they were added. Unknown causes are left out. */
export function inPhysicalOrder(recipe: Recipe, causes: readonly Cause[]): PlacedStep[] {
  const placed = recipe.steps.flatMap((step, index) => {
    const cause = causes.find(({ id }) => id === step.cause);
    return cause ? [{ index, step, cause }] : [];
  });
  return placed.sort((a, b) => causes.indexOf(a.cause) - causes.indexOf(b.cause) || a.index - b.index);
}

/** Every parameter at its initial value: the header's where the server filled it from there. */
export const initialValues = (parameters: readonly CatalogueParameter[]): Record<string, number | string> =>
  Object.fromEntries(parameters.map(({ id, initial }) => [id, initial]));

/** Total range of the object phase that the bench starts with, radians: ±0.8. */
export const usualObjectPhase = 1.6;
