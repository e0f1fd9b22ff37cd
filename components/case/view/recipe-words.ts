/** A recipe in one line: 'Wrap-around: field of view 0.5; Partial Fourier: fraction 0.62'. */
import { shownParameters } from '@/components/bench/shown-parameters';
import type { Cause } from '@/server/contract/catalogue';
import type { Recipe } from '@/server/contract/recipe';

const figures = (value: number): string => String(Number(value.toPrecision(3))).replace('-', '−');

export function recipeWords(recipe: Recipe, causes: readonly Cause[]): string {
  const active = recipe.steps.filter((step) => step.enabled !== false);
  if (active.length === 0) return 'no cause: the image as it is';
  return active
    .map((step) => {
      const cause = causes.find(({ id }) => id === step.cause);
      if (!cause) return step.cause;
      const values = shownParameters(cause.parameters, step.parameters).flatMap((parameter) => {
        const value = step.parameters[parameter.id];
        if (value === undefined) return [];
        if ('options' in parameter) return [parameter.options.find((option) => option.value === value)?.label ?? String(value)];
        return typeof value === 'number' ? [`${parameter.label.toLowerCase()} ${figures(value)} ${parameter.unit}`.trim()] : [];
      });
      return values.length > 0 ? `${cause.title}: ${values.join(', ')}` : cause.title;
    })
    .join('; ');
}
