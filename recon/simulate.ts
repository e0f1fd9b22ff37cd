/**
 * The forward model: object phase → causes that act on the image → Fourier → causes that act on k-space → reconstruction → magnitude.
 * Steps may stand in any order in a recipe; they act in the order of the list of causes, which is that of the signal chain. Two steps
 * of one cause act in the order of the recipe.
 */
import type { Acquisition } from './acquisition';
import type { Encoded } from './cause';
import type { Action, Chain } from './chain';
import { chainOf } from './chain';
import { causes } from './causes/index';
import { transform, transformOfReal } from './fourier';
import type { ComplexPlane, Plane } from './grid';
import { magnitude } from './grid';
import type { ObjectPhase } from './object-phase';
import { withObjectPhase } from './object-phase';
import type { Recipe } from './recipe';
import { causeOf, checkRecipe, completeRecipe, reconstructionOf } from './recipe-check';
import { randomOf } from './random';
import { giveBack, giveBackBytes, giveBackPlane } from './spare-arrays';

/** An object with its phase; its transform is worked out once, when it is first asked for, and kept with it, and so is one plane between
 *  the steps of the last recipe. */
export interface PreparedObject {
  readonly source: ComplexPlane;
  readonly phase: ObjectPhase | undefined;
  readonly object: ComplexPlane;
  kspace(): ComplexPlane;
  readonly chain: Chain;
}

export interface Simulation {
  /** Samples as acquired, zero where none was taken. */
  readonly kspace: Encoded;
  /** Reconstructed magnitude. */
  readonly image: Plane;
  /** The transform of `image`: the only one to hold against the k-space of a stored magnitude image. */
  kspaceOfImage(): ComplexPlane;
  /** Hands all its arrays on to the next simulation. Nobody may read them after this. */
  giveBack(): void;
}

/** What a caller keeps between simulations of one object, so that its transform is not repeated while a slider moves. */
export function prepare(source: ComplexPlane, phase?: ObjectPhase): PreparedObject {
  const object = phase ? withObjectPhase(source, phase) : source;
  let transformed: ComplexPlane | undefined;
  const kspace = (): ComplexPlane => (transformed ??= transform(object));
  return { source, phase, object, kspace, chain: chainOf(object, kspace) };
}

const isPrepared = (object: ComplexPlane | PreparedObject): object is PreparedObject => 'source' in object;

function withPhaseOf(object: ComplexPlane | PreparedObject, { objectPhase: phase }: Recipe): PreparedObject {
  if (!isPrepared(object)) return prepare(object, phase);
  const isSame = object.phase?.range === phase?.range && object.phase?.seed === phase?.seed;
  return isSame ? object : prepare(object.source, phase);
}

/** The steps that are switched on, in the order of the signal chain. The stream of a step is named by its cause and by how many
 *  steps of that cause stand before it, so that no other step, on or off, changes its noise. */
function actionsOf(recipe: Recipe, acquisition: Acquisition): Action[] {
  const seen = new Map<string, number>();
  const actions: Action[] = [];
  for (const { cause: id, parameters, enabled } of recipe.steps) {
    const occurrence = seen.get(id) ?? 0;
    seen.set(id, occurrence + 1);
    const cause = causeOf(id);
    if (!cause || enabled === false) continue;
    const stream = `${id} ${occurrence}`;
    actions.push({
      key: JSON.stringify([stream, parameters, recipe.seed, acquisition]),
      cause,
      parameters,
      context: () => ({ acquisition, random: randomOf(recipe.seed, stream) }),
    });
  }
  return actions.sort((a, b) => causes.indexOf(a.cause) - causes.indexOf(b.cause));
}

/**
 * Applies `recipe` to `object`, [row, column] complex. Parameters left out take their initial values for `acquisition`.
 * Inputs are not changed. Throws RangeError with the first fault of a recipe that does not fit the catalogue.
 */
export function simulate(object: ComplexPlane | PreparedObject, recipe: Recipe, acquisition: Acquisition): Simulation {
  const complete = completeRecipe(recipe, acquisition);
  const method = reconstructionOf(complete.reconstruction.method);
  if (!method) throw RangeError(`reconstruction.method must be in the catalogue, got ${complete.reconstruction.method}`);
  const [fault] = checkRecipe(complete);
  if (fault) throw RangeError(`${fault.path.join('.')}: ${fault.message}`);

  const prepared = withPhaseOf(object, complete);
  const kspace = prepared.chain.run(actionsOf(complete, acquisition));
  const context = { acquisition, random: randomOf(complete.seed, method.id) };
  const reconstructed = method.reconstruct(kspace, complete.reconstruction.parameters, context);
  const image = magnitude(reconstructed);
  giveBackPlane(reconstructed);
  let ofImage: ComplexPlane | undefined;
  return {
    kspace,
    image,
    kspaceOfImage: () => (ofImage ??= transformOfReal(image)),
    giveBack() {
      if (ofImage) giveBackPlane(ofImage);
      giveBackPlane(kspace);
      giveBackBytes(kspace.taken);
      giveBack(image.values);
    },
  };
}
