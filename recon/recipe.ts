/** A recipe: which causes act on an object, how the result is reconstructed, and the seed of all that is random in it. */

export type ParameterValues = Readonly<Record<string, number | string>>;

export interface Step {
  readonly cause: string;
  readonly parameters: ParameterValues;
  /** Left out means true. */
  readonly enabled?: boolean | undefined;
}

export interface Recipe {
  readonly steps: readonly Step[];
  readonly reconstruction: { readonly method: string; readonly parameters: ParameterValues };
  /** Total range of the synthetic smooth phase, radians, 0 to 2π; left out means none. */
  readonly objectPhase?: { readonly range: number; readonly seed: number } | undefined;
  readonly seed: number;
}

/** A fault of a recipe: where it is, as a path into the recipe, and what is wrong with it. */
export interface RecipeFault {
  readonly path: readonly (string | number)[];
  readonly message: string;
}
