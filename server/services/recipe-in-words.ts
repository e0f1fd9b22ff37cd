/** A recipe in words of the catalogue: what stands in Derivation Description and in a recipe file. */
import type { Parameters } from '../../recon/parameter';
import { matters } from '../../recon/parameter';
import type { ParameterValues, Recipe, Step } from '../../recon/recipe';
import { causeOf, reconstructionOf } from '../../recon/recipe-check';

export const simulatedNotice = 'SIMULATED, NOT FOR DIAGNOSIS';

/** `Periodic motion: frequency 0.25 Hz, swing 0.5 rad`. Steps that are switched off did nothing and are left out. */
export function recipeInWords({ steps, reconstruction, objectPhase, seed }: Recipe): string {
  const acting = steps.filter(({ enabled }) => enabled !== false).map(stepInWords);
  const method = reconstructionOf(reconstruction.method);
  return [
    acting.length > 0 ? acting.join('; ') : 'No cause: the image as it is',
    withValues(`Reconstruction: ${method?.title ?? reconstruction.method}`, method?.parameters, reconstruction.parameters),
    ...(objectPhase ? [`Synthetic object phase over ${figures(objectPhase.range)} rad, seed ${objectPhase.seed}`] : []),
    `Seed ${seed}`,
  ].join('. ');
}

const stepInWords = ({ cause: id, parameters }: Step): string => {
  const cause = causeOf(id);
  return withValues(cause?.title ?? id, cause?.parameters, parameters, ': ');
};

function withValues(title: string, parameters: Parameters = {}, values: ParameterValues, separator = ', '): string {
  const words = Object.entries(parameters).flatMap(([id, parameter]) => {
    const value = values[id];
    if (value === undefined || !matters(parameter, values)) return [];
    if (parameter.kind === 'choice')
      return [`${parameter.label} ${parameter.options.find((option) => option.value === value)?.label ?? value}`];
    return [`${parameter.label} ${typeof value === 'number' ? figures(value) : value} ${parameter.unit}`.trim()];
  });
  return words.length > 0 ? `${title}${separator}${words.join(', ')}` : title;
}

/** Four figures are finer than any control. */
const figures = (value: number): string => String(Number(value.toPrecision(4)));
