/** A recipe file that somebody brings: checked against the catalogue, and completed as for the image it will run on. Nothing is kept. */
import { checkRecipe, completeRecipe } from '../../recon/recipe-check';
import { recipeSchema } from '../contract/recipe';
import type { openRecipeFile as openRecipeFileRoute } from '../contract/recipe-file';
import type { Database } from '../../db/client';
import type { z } from 'zod';
import { acquisitionOf } from '../dicom/acquisition';
import { AppError } from '../errors';
import { currentFacts, requireNamedImage } from './image-source';
import type { Caller } from './sessions';

export async function openRecipeFile(
  db: Database,
  caller: Caller,
  { file, imageId }: z.output<typeof openRecipeFileRoute.body>,
): Promise<z.input<typeof openRecipeFileRoute.output>> {
  const row = imageId === undefined ? undefined : await requireNamedImage(db, caller, imageId, ['imageId']);
  const acquisition = row && acquisitionOf(currentFacts(row));
  const phaseEncode = file.phaseEncode ?? acquisition?.phaseEncode;
  const recipe = completeRecipe(file.recipe, acquisition && phaseEncode && { ...acquisition, phaseEncode });
  const faults = checkRecipe(recipe);
  if (faults.length > 0) {
    throw new AppError('invalid-input', { issues: faults.map(({ path, message }) => ({ path: ['file', 'recipe', ...path], message })) });
  }
  return { recipe: recipeSchema.parse(recipe), phaseEncode: phaseEncode ?? null };
}
