/** What the laws try on every cause and method: planes, acquisitions, and the corners of the parameters. */
import type { Acquisition } from '../../recon/acquisition';
import type { Context } from '../../recon/cause';
import type { Parameter, Parameters } from '../../recon/parameter';
import type { ParameterValues } from '../../recon/recipe';
import { randomOf } from '../../recon/random';

/** Even and odd, square and not, a single line, a size with a large prime. */
export const sizes: readonly (readonly [rows: number, columns: number])[] = [
  [16, 16],
  [15, 21],
  [12, 34],
  [1, 9],
];

export const acquisitions: readonly Acquisition[] = [{ phaseEncode: 'row' }, { phaseEncode: 'column', repetitionTime: 2, averages: 2 }];

export const contextOf = (acquisition: Acquisition, seed = 5): Context => ({ acquisition, random: randomOf(seed, 'law') });

export const initialValues = (parameters: Parameters): ParameterValues =>
  Object.fromEntries(Object.entries(parameters).map(([id, { initial }]) => [id, initial]));

const extremes = (parameter: Parameter): readonly (number | string)[] =>
  parameter.kind === 'quantity' ? [parameter.min, parameter.max] : parameter.options.map(({ value }) => value);

/** All initial, then each parameter at each of its ends with the others initial. */
export const corners = (parameters: Parameters): ParameterValues[] => [
  initialValues(parameters),
  ...Object.entries(parameters).flatMap(([id, parameter]) =>
    extremes(parameter).map((value) => ({ ...initialValues(parameters), [id]: value })),
  ),
];

/** Values that the check of a recipe must refuse. */
export const refused = (parameter: Parameter): readonly (number | string)[] =>
  parameter.kind === 'quantity'
    ? [parameter.min - parameter.step, parameter.max + parameter.step, NaN, Infinity, 'much']
    : ['none of these', 1];
