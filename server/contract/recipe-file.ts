/**
 * A recipe as a file: JSON that another bench can open. It holds what was simulated and nothing of whom: no image, no case text, no date.
 * `version` goes up when a reader of the former one would misread the file.
 */
import { z } from 'zod';
import { phaseEncodeSchema } from './facts';
import { recipeSchema } from './recipe';
import { everyMember, identifier, route } from './route';

export const recipeFileSchema = z.object({
  schema: z.literal('pickglass-recipe', 'this is not a recipe file of this product'),
  version: z.literal(1, 'this recipe file is of another version than 1'),
  product: z.object({ name: z.string().max(60), version: z.string().max(60) }),
  notice: z.string().max(200),
  /** The recipe in words, for people; it is not read. */
  inWords: z.string().max(4000).default(''),
  phaseEncode: phaseEncodeSchema.optional(),
  recipe: recipeSchema,
});
export type RecipeFile = z.infer<typeof recipeFileSchema>;

/** Faults are named with their place: `recipe`, `steps`, 0, `parameters`, `frequency`. Nothing is stored. */
export const openRecipeFile = route({
  method: 'post',
  path: '/api/recipes',
  summary: 'Check a recipe file, and fill in what it leaves out as for the image named',
  access: everyMember,
  body: z.object({ file: recipeFileSchema, imageId: identifier.optional() }),
  output: z.object({ recipe: recipeSchema, phaseEncode: phaseEncodeSchema.nullable() }),
});
