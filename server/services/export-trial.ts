/**
 * Files of a trial, and of a recipe on an image. A file of a trial is computed anew with what it ran with, and handed out only if its pixels are
 * those that were kept: with a newer model they may not be.
 */
import { findTrial } from '../../db/queries/case-parts';
import { findCaseOf } from '../../db/queries/cases';
import type { ExportForm } from '../../workers/job';
import type { ComputedFile, TrialFile } from '../contract/exports';
import type { PhaseEncode } from '../contract/facts';
import { recipeSchema, type Recipe } from '../contract/recipe';
import type { RecipeFile } from '../contract/recipe-file';
import { frameFactsSchema } from '../contract/facts';
import type { Dependencies } from '../dependencies';
import type { Derivation } from '../dicom/derived/derivation';
import { departmentKey, replacedUid } from '../dicom/unique-identifiers';
import { AppError, invalidAt, issuesOf } from '../errors';
import type { Binary } from '../serve';
import { currentFacts } from './image-source';
import { recipeInWords, simulatedNotice } from './recipe-in-words';
import type { Caller } from './sessions';
import { prepareRun, type Run } from './simulate';

const mediaTypes: Readonly<Record<string, string>> = {
  dcm: 'application/dicom',
  png: 'image/png',
  npy: 'application/octet-stream',
};

interface Place {
  readonly caseId: string;
  readonly trialId: string;
}

export async function readTrialFile(
  deps: Dependencies,
  caller: Caller,
  { caseId, trialId }: Place,
  file: ComputedFile,
  gone: AbortSignal,
): Promise<Binary> {
  const { trial, caseNumber } = await requireTrialOf(deps, caller, { caseId, trialId });
  const { imageId, frame, phaseEncode, acquisition: keptAcquisition } = trial;
  const recipe = wireRecipe(trial.recipe);
  const run = await prepareRun(deps, caller, { imageId, frame, recipe, facts: { phaseEncode }, keptAcquisition });
  const about = derivationOf(deps, caller, run, {
    ...{ caseNumber, instanceNumber: trial.number, object: `trial ${trialId}`, study: `case ${caseId}` },
    title: `Pickglass ${deps.version}, trial ${trial.number} of case ${caseNumber}`,
  });
  const { bytes, digest } = await runExport(deps, run, about, file, gone);
  if (digest !== trial.digest) {
    const detail = 'The model changed since this trial was kept, and it no longer gives the same pixels: keep it again';
    throw new AppError('not-computable', { detail });
  }
  return fileAnswer(bytes, nameOf(caseNumber, trial.number, file));
}

export async function readTrialRecipe(deps: Pick<Dependencies, 'db' | 'version'>, caller: Caller, place: Place) {
  const { trial, caseNumber } = await requireTrialOf(deps, caller, place);
  const file: RecipeFile = {
    schema: 'pickglass-recipe',
    version: 1,
    product: { name: 'Pickglass', version: deps.version },
    notice: simulatedNotice,
    inWords: recipeInWords(trial.recipe),
    phaseEncode: trial.phaseEncode,
    recipe: wireRecipe(trial.recipe),
  };
  return { file, name: nameOf(caseNumber, trial.number, 'recipe.json') };
}

interface Wish {
  readonly imageId: string;
  readonly frame: number;
  readonly recipe?: string | undefined;
  readonly phaseEncode?: PhaseEncode | undefined;
}

/** A recipe on an image, without a case. */
export async function readDerivedImage(deps: Dependencies, caller: Caller, wish: Wish, gone: AbortSignal): Promise<Binary> {
  const { imageId, frame, phaseEncode } = wish;
  const run = await prepareRun(deps, caller, { imageId, frame, recipe: recipeOf(wish.recipe), facts: { phaseEncode } });
  const object = JSON.stringify([imageId, frame, run.recipe, run.acquisition]);
  const about = derivationOf(deps, caller, run, {
    ...{ caseNumber: null, instanceNumber: frame + 1, object, study: `image ${imageId}` },
    title: `Pickglass ${deps.version}`,
  });
  const { bytes } = await runExport(deps, run, about, 'derived.dcm', gone);
  return fileAnswer(bytes, 'simulated-derived.dcm');
}

const asItIs: Recipe = { steps: [], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 };

function recipeOf(json: string | undefined): Recipe {
  if (json === undefined) return asItIs;
  const parsed = recipeSchema.safeParse(parsedJson(json));
  if (parsed.success) return parsed.data;
  throw new AppError('invalid-input', {
    issues: issuesOf(parsed.error).map(({ path, message }) => ({ path: ['recipe', ...path], message })),
  });
}

function parsedJson(json: string): unknown {
  try {
    return JSON.parse(json);
  } catch (error) {
    if (error instanceof SyntaxError) throw invalidAt(['recipe'], 'the recipe must be JSON');
    throw error;
  }
}

/** A kept recipe in the form of the wire, which is the same but for being checked. */
const wireRecipe = (kept: unknown): Recipe => recipeSchema.parse(kept);

async function requireTrialOf({ db }: Pick<Dependencies, 'db'>, caller: Caller, { caseId, trialId }: Place) {
  const ofCase = await findCaseOf(db, caller.departmentId, caseId);
  const found = await findTrial(db, caseId, trialId);
  if (ofCase === undefined || found === undefined) throw new AppError('not-found');
  return { trial: found.trial, caseNumber: ofCase.row.number };
}

interface Named {
  readonly caseNumber: number | null;
  readonly instanceNumber: number;
  /** What the object and its study are of: the same twice has the same identifiers twice. */
  readonly object: string;
  readonly study: string;
  readonly title: string;
}

function derivationOf(deps: Dependencies, caller: Caller, { row, source, recipe, acquisition }: Run, named: Named): Derivation {
  const key = departmentKey(deps.identityKey, caller.departmentId);
  const made = (what: string) => replacedUid(key, `derived ${what}`);
  const facts = currentFacts(row);
  const frameFacts = frameFactsSchema.array().parse(row.frameFacts)[source.frame];
  return {
    ...{ caseNumber: named.caseNumber, instanceNumber: named.instanceNumber, facts, productVersion: deps.version },
    description: `${simulatedNotice}. ${named.title}. ${recipeInWords(recipe)}.`,
    uids: {
      study: made(`study of ${named.study}`),
      series: made(`series of ${named.object}`),
      image: made(`image of ${named.object}`),
      frameOfReference: made(`frame of reference of ${row.frameOfReferenceKey ?? named.object}`),
    },
    sourcePositionMm: frameFacts?.positionMm ?? facts.imagePositionMm.value,
    sourceRows: row.rows,
    sourceColumns: row.columns,
    phaseEncode: acquisition.phaseEncode,
    window: [row.rangeLow, row.rangeHigh],
  };
}

const runExport = (deps: Dependencies, { source, recipe, acquisition }: Run, about: Derivation, form: ExportForm, gone: AbortSignal) =>
  deps.workers.exported({ kind: 'export', form, source, recipe, acquisition, about }, gone);

const nameOf = (caseNumber: number, trialNumber: number, file: TrialFile): string =>
  `case-${caseNumber}-trial-${trialNumber}-simulated-${file}`;

/** A browser keeps it under this name. */
export const asFile = (name: string) => ({ 'Content-Disposition': `attachment; filename="${name}"` });

const fileAnswer = (bytes: Uint8Array, name: string): Binary => ({
  mediaType: mediaTypes[name.slice(name.lastIndexOf('.') + 1)] ?? 'application/octet-stream',
  bytes,
  headers: asFile(name),
});
