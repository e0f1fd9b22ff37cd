/** Simulation: a recipe on an image of the department, planes and numbers back. */
import type { z } from 'zod';
import type { ImageRow } from '../../db/queries/images';
import type { Acquisition } from '../../recon/acquisition';
import type { Recipe as CompleteRecipe } from '../../recon/recipe';
import { checkRecipe, completeRecipe } from '../../recon/recipe-check';
import type { ImageSource, SimulationNumbers } from '../../workers/job';
import type { PhaseEncode } from '../contract/facts';
import { metricsHeader, type Metrics } from '../contract/planes';
import type { Recipe } from '../contract/recipe';
import type { simulate as simulateRoute } from '../contract/simulations';
import type { Dependencies } from '../dependencies';
import { acquisitionOf } from '../dicom/acquisition';
import { AppError, invalidAt } from '../errors';
import type { Binary } from '../serve';
import { requireAnalysable } from './analysable';
import { currentFacts, factsOfFrame, requireNamedImage, sourceOf } from './image-source';
import { planesAnswer, type PlaneForm } from './planes-answer';
import type { Caller } from './sessions';

interface Named {
  readonly imageId: string;
  readonly frame: number;
}

interface Wish {
  readonly imageId: string;
  readonly frame: number;
  readonly recipe: Recipe;
  readonly compareWith?: Named | null | undefined;
  readonly facts?: { readonly phaseEncode?: PhaseEncode | undefined } | undefined;
  /** What a kept trial ran with; left out, the scan facts of the image say. */
  readonly keptAcquisition?: Acquisition | null;
}

/** Everything that a run needs, checked: what a simulation and a trial have in common. */
export interface Run {
  readonly row: ImageRow;
  readonly source: ImageSource;
  readonly compareWith?: ImageSource;
  readonly acquisition: Acquisition;
  /** With every parameter filled in. */
  readonly recipe: CompleteRecipe;
}

export async function simulate(
  deps: Dependencies,
  caller: Caller,
  { outputs, form, ...wish }: z.output<typeof simulateRoute.body> & { form: PlaneForm },
  gone: AbortSignal,
): Promise<Binary> {
  const { row: _row, ...run } = await prepareRun(deps, caller, wish);
  const { numbers, ...planes } = await deps.workers.simulate({ kind: 'simulate', ...run, outputs, form }, gone);
  const metrics: Metrics = numbers;
  return planesAnswer(planes, form, { [metricsHeader]: JSON.stringify(metrics) });
}

/** Checks images, facts and recipe of a wish. Throws AppError with the path of what is wrong. */
export async function prepareRun(deps: Pick<Dependencies, 'db' | 'values'>, caller: Caller, wish: Wish): Promise<Run> {
  const row = await requireNamedImage(deps.db, caller, wish.imageId, ['imageId']);
  requireAnalysable(row, ['imageId']);
  const acquisition = wish.keptAcquisition ?? acquisitionForRun(row, wish.frame, wish.facts?.phaseEncode);
  if (row.component === 'complex' && wish.recipe.objectPhase !== undefined) {
    throw invalidAt(['recipe', 'objectPhase'], 'the image is complex: it has a phase of its own, and takes no synthetic one');
  }
  const recipe = checkedRecipe(wish.recipe, acquisition);
  const source = await sourceOf(deps, row, wish.frame);
  if (!wish.compareWith) return { row, source, acquisition, recipe };

  const other = await requireNamedImage(deps.db, caller, wish.compareWith.imageId, ['compareWith', 'imageId']);
  requireAnalysable(other, ['compareWith', 'imageId']);
  requireSamePlane(row, other);
  const compareWith = await sourceOf(deps, other, wish.compareWith.frame, ['compareWith', 'frame']);
  return { row, source, compareWith, acquisition, recipe };
}

/** The axis is never guessed: where neither header nor member nor request says it, the request is refused. */
function acquisitionForRun(row: ImageRow, frame: number, asked: PhaseEncode | undefined): Acquisition {
  const acquisition = acquisitionOf(factsOfFrame(row, frame));
  const phaseEncode = asked ?? acquisition.phaseEncode;
  if (phaseEncode === undefined) {
    throw invalidAt(['facts', 'phaseEncode'], 'the header does not say along which axis phase was encoded: choose row or column');
  }
  return { ...acquisition, phaseEncode };
}

function checkedRecipe(recipe: Recipe, acquisition: Acquisition): CompleteRecipe {
  const complete = completeRecipe(recipe, acquisition);
  const faults = checkRecipe(complete);
  if (faults.length > 0) {
    throw new AppError('invalid-input', { issues: faults.map(({ path, message }) => ({ path: ['recipe', ...path], message })) });
  }
  return complete;
}

/** Direction cosines that differ by more than this, about three degrees, mean another plane of space (common practice). */
const cosineTolerance = 0.05;

/** Images of two planes of space cannot be held against each other pixel by pixel. A silent header is given the benefit of the doubt. */
function requireSamePlane(one: ImageRow, other: ImageRow): void {
  const a = currentFacts(one).imageOrientation.value;
  const b = currentFacts(other).imageOrientation.value;
  if (a === null || b === null) return;
  const isSame = a.every((cosine, i) => Math.abs(cosine - (b[i] ?? 0)) <= cosineTolerance);
  if (!isSame) {
    const message = 'the two images lie in different planes of space and cannot be compared';
    throw new AppError('not-computable', { detail: message, issues: [{ path: ['compareWith', 'imageId'], message }] });
  }
}

/** Numbers without the time they took: what is kept. */
export function lasting({ computedInMs: _time, ...numbers }: SimulationNumbers): Metrics {
  return numbers;
}
