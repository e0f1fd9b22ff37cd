/** The knots of the recipe in physical order: the object first, then each step, the reconstruction last. */
import type { Cause, Reconstruction } from '@/server/contract/catalogue';
import type { Recipe } from '@/server/contract/recipe';
import { fixed } from '@/components/ui/number-text';
import type { Knot } from './bench-view';
import { inPhysicalOrder } from './recipe-order';

export interface RecipeKnot {
  readonly knot: Knot;
  readonly stage: string;
  readonly word: string;
  /** A step that is switched off is an open knot. */
  readonly isOn: boolean;
}

interface Catalogue {
  readonly causes: readonly Cause[];
  readonly methods: readonly Pick<Reconstruction, 'id' | 'title'>[];
}

export function knotsOf(recipe: Recipe, { causes, methods }: Catalogue, runsOn: 'comparison' | 'bad'): RecipeKnot[] {
  const object = runsOn === 'comparison' ? 'comparison' : 'bad image itself';
  const phase = recipe.objectPhase ? `, phase ${fixed(recipe.objectPhase.range, 2)}` : '';
  const method = methods.find(({ id }) => id === recipe.reconstruction.method)?.title ?? recipe.reconstruction.method;
  return [
    { knot: 'object', stage: 'object', word: `${object}${phase}`, isOn: recipe.objectPhase !== undefined },
    ...inPhysicalOrder(recipe, causes).map(({ index, step, cause }) => ({
      knot: index,
      stage: cause.stage,
      word: cause.title,
      isOn: step.enabled !== false,
    })),
    { knot: 'reconstruction', stage: 'reconstruction', word: method, isOn: false },
  ];
}

/** The knot that lies open first: the first step where there is one, so that its sliders are at hand. */
export const firstKnot = ({ steps }: Recipe): Knot => (steps.length > 0 ? 0 : 'object');
