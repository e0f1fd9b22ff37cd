/**
 * Self-describing parameters. From one record come the type of the model's argument, the check of a recipe, the form control,
 * the value filled from the header, and the extremes that the laws try.
 */
import type { Acquisition } from './acquisition';

/** Choices of the same model, each with the values for which a parameter matters; all of them must hold. For other values it is not shown, but
 *  kept and still checked. */
export type When = Readonly<Record<string, readonly string[]>>;

/** A number with a unit. `fromHeader` returns what the acquisition says, or undefined; `fact` names it in words. */
export interface Quantity {
  readonly kind: 'quantity';
  readonly label: string;
  readonly unit: string;
  readonly min: number;
  readonly max: number;
  readonly step: number;
  readonly initial: number;
  readonly fromHeader?: { readonly fact: string; readonly read: (acquisition: Acquisition) => number | undefined };
  readonly when?: When;
}

/** One of a few. */
export interface Choice<Value extends string = string> {
  readonly kind: 'choice';
  readonly label: string;
  readonly options: readonly { readonly value: Value; readonly label: string }[];
  readonly initial: Value;
  readonly when?: When;
}

export type Parameter = Quantity | Choice;
export type Parameters = Readonly<Record<string, Parameter>>;

/** The values that a model with these parameters receives. Of parameters that are not known by name: numbers or strings. */
export type ValuesOf<P extends Parameters> = {
  readonly [K in keyof P]: P[K] extends Choice<infer Value> ? Value : P[K] extends Quantity ? number : number | string;
};

export const quantity = (description: Omit<Quantity, 'kind'>): Quantity => ({ kind: 'quantity', ...description });

export const choice = <Value extends string>(description: {
  label: string;
  options: readonly { readonly value: Value; readonly label: string }[];
  initial: NoInfer<Value>;
  when?: When;
}): Choice<Value> => ({ kind: 'choice', ...description });

/** Whether a parameter matters at these values of the others. */
export const matters = ({ when = {} }: Pick<Parameter, 'when'>, values: Readonly<Record<string, number | string>>): boolean =>
  Object.entries(when).every(([id, shownAt]) => shownAt.some((value) => value === values[id]));
