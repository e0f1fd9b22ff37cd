/**
 * The steps of a recipe acting one after another, with one plane kept from the last run: the one before the first step that had changed
 * since the run before it. While a hand moves one slider, that plane is the input of the slider's step, and what comes before it is
 * not worked out again. A step draws from its own stream of random numbers, so that what is kept holds the same bytes as a new run.
 */
import type { Cause, Context, Encoded } from './cause';
import { transform } from './fourier';
import type { ComplexPlane } from './grid';
import { allTaken, fullyTaken } from './lines';
import { copyOfBytes, giveBackPlane } from './spare-arrays';
import type { ParameterValues } from './recipe';

/** A step that is switched on. Steps of the same `key` on the same plane give the same bytes. */
export interface Action {
  readonly key: string;
  readonly cause: Cause;
  readonly parameters: ParameterValues;
  /** Made anew for each run: its stream of random numbers starts at the beginning. */
  context(): Context;
}

/** What steps act on: the object until it is encoded, k-space from then on. */
type State = { readonly domain: 'image'; readonly plane: ComplexPlane } | { readonly domain: 'kspace'; readonly plane: Encoded };

export interface Chain {
  /** k-space after all actions, which must be in the order of the signal chain. The arrays belong to the caller. */
  run(actions: readonly Action[]): Encoded;
}

/** How many entries two lists have in common from the start. */
function commonLength(a: readonly string[], b: readonly string[]): number {
  const differing = a.findIndex((key, i) => key !== b[i]);
  return differing < 0 ? a.length : differing;
}

/** A chain on one object, whose transform `kspace` is worked out where no step acts on the image. */
export function chainOf(object: ComplexPlane, kspace: () => ComplexPlane): Chain {
  let lastKeys: readonly string[] = [];
  let kept: { readonly nSteps: number; readonly state: State } | undefined;

  // Steps leave their input as it was: the transform that is kept may be one.
  const encode = (state: State): Encoded => {
    if (state.domain === 'kspace') return state.plane;
    const plane = state.plane === object ? kspace() : transform(state.plane);
    return { ...plane, taken: allTaken(plane.re.length) };
  };
  const act = (state: State, { cause, parameters, context }: Action): State => {
    if (cause.domain === 'kspace') return { domain: 'kspace', plane: cause.apply(encode(state), parameters, context()) };
    if (state.domain === 'kspace') throw Error(`${cause.id} acts on the image, and stands after a step on k-space`);
    return { domain: 'image', plane: cause.apply(state.plane, parameters, context()) };
  };

  return {
    run(actions) {
      const keys = actions.map(({ key }) => key);
      const unchanged = commonLength(keys, lastKeys);
      const usable = kept !== undefined && kept.nSteps <= unchanged ? kept : undefined;
      // The result goes to the caller: the input of the last step is the furthest that may be kept.
      const keepAt = Math.min(unchanged, keys.length - 1);
      let state: State = usable?.state ?? { domain: 'image', plane: object };
      lastKeys = keys;
      kept = usable;
      for (let step = usable?.nSteps ?? 0; step < actions.length; step++) {
        const action = actions[step] as Action;
        if (step === keepAt && step > 0) {
          // Encoded already where the next step asks for it, so that a slider on it does not transform again.
          if (action.cause.domain === 'kspace') state = { domain: 'kspace', plane: encode(state) };
          kept = { nSteps: step, state };
        }
        const before = state;
        state = act(before, action);
        // Its input goes to the next one that needs an array, unless it is kept.
        if (before.plane !== object && before !== kept?.state) giveBackPlane(before.plane);
      }
      if (state.plane === object) return fullyTaken(kspace());
      const result = encode(state);
      // A step may hand on the record of what was taken as it was.
      return { ...result, taken: copyOfBytes(result.taken) };
    },
  };
}
