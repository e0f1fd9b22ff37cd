/**
 * A recipe on the wire: ordered causes, a reconstruction, an object phase, a seed. It is generic (a cause's id and a record
 * of values); the server checks it against the catalogue and names the step that is wrong.
 */
import { z } from 'zod';

const parameterValues = z.record(z.string().max(60), z.union([z.number(), z.string().max(60)]));

export const stepSchema = z.object({
  cause: z.string().max(60),
  parameters: parameterValues,
  enabled: z.boolean().optional(),
});
export type RecipeStep = z.infer<typeof stepSchema>;

export const seedSchema = z.number().int().min(0).max(0xffffffff);

export const recipeSchema = z.object({
  steps: z.array(stepSchema).max(24),
  reconstruction: z.object({ method: z.string().max(60), parameters: parameterValues.default({}) }),
  /** Smooth synthetic phase of the object: total range in radians. Left out: none. */
  objectPhase: z
    .object({
      range: z
        .number()
        .min(0)
        .max(2 * Math.PI),
      seed: seedSchema,
    })
    .optional(),
  seed: seedSchema,
});
export type Recipe = z.infer<typeof recipeSchema>;
