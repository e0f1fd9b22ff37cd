/** The value that a parameter starts with: from the scan facts where they say one, else its own. */
import type { Acquisition } from './acquisition';
import type { Parameter, Quantity } from './parameter';

/** `fact` names the scan fact that gave the value. */
export interface Initial {
  readonly value: number | string;
  readonly fact?: string;
}

/** Within the range and on the nearest step from `min`; rounded to 12 digits, so that 0.4 + 35·0.01 is 0.75. */
export function onStep(value: number, { min, max, step }: Quantity): number {
  const stepped = min + Math.round((value - min) / step) * step;
  return Number(Math.min(max, Math.max(min, stepped)).toPrecision(12));
}

export function initialOf(parameter: Parameter, acquisition?: Acquisition): Initial {
  if (parameter.kind === 'choice' || !acquisition || !parameter.fromHeader) return { value: parameter.initial };
  const read = parameter.fromHeader.read(acquisition);
  if (read === undefined || !Number.isFinite(read)) return { value: parameter.initial };
  return { value: onStep(read, parameter), fact: parameter.fromHeader.fact };
}
