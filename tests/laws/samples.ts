/** What the laws try on every cause and method: planes, acquisitions, and the corners of the parameters. */
import type { Acquisition } from '../../recon/acquisition';
import type { Context } from '../../recon/cause';
import type { ComplexPlane } from '../../recon/grid';
import { matters, type Parameter, type Parameters } from '../../recon/parameter';
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

/** Every combination of the choices, each with the quantities at the corners. */
const settings = (parameters: Parameters): ParameterValues[] => {
  const choices = Object.entries(parameters).filter(([, parameter]) => parameter.kind === 'choice');
  return choices.reduce<ParameterValues[]>(
    (before, [id, parameter]) => before.flatMap((values) => extremes(parameter).map((value) => ({ ...values, [id]: value }))),
    corners(Object.fromEntries(Object.entries(parameters).filter(([, { kind }]) => kind === 'quantity'))),
  );
};

/** Whether all planes hold the same bytes. */
export const isOneResult = (planes: readonly ComplexPlane[]): boolean =>
  planes.every(({ re, im }) => planes[0] !== undefined && isSameBytes(re, planes[0].re) && isSameBytes(im, planes[0].im));

const isSameBytes = (a: Float64Array, b: Float64Array): boolean =>
  Buffer.compare(Buffer.from(a.buffer, a.byteOffset, a.byteLength), Buffer.from(b.buffer, b.byteOffset, b.byteLength)) === 0;

export interface Turn {
  readonly id: string;
  /** The same setting but for the value of the parameter `id`. */
  readonly settings: readonly ParameterValues[];
}

/** Each parameter turned from end to end in every setting: those where `when` shows it, or those where it hides it. */
export const turns = (parameters: Parameters, isShown: boolean): Turn[] =>
  Object.entries(parameters).flatMap(([id, parameter]) =>
    settings(parameters)
      .filter((values) => matters(parameter, values) === isShown)
      .map((values) => ({
        id,
        settings: [parameter.initial, ...extremes(parameter)].map((value) => ({ ...values, [id]: value })),
      })),
  );
