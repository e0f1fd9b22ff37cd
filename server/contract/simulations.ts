/** Simulation: a recipe on an image, planes back. */
import { z } from 'zod';
import { phaseEncodeSchema } from './facts';
import { recipeSchema } from './recipe';
import { everyMember, identifier, route } from './route';

export const outputNames = ['image', 'kspace', 'kspaceOfImage'] as const;
export type OutputName = (typeof outputNames)[number];

/** `kspace`: samples as acquired, zero where none was taken. `kspaceOfImage`: the transform of the returned magnitude; a bad
 *  magnitude image is compared with this one only, because its own k-space is Hermitian. */
export const simulate = route({
  method: 'post',
  path: '/api/simulations',
  summary: 'Apply a recipe to an image',
  access: everyMember,
  body: z.object({
    imageId: identifier,
    frame: z.number().int().min(0).default(0),
    recipe: recipeSchema,
    outputs: z.array(z.enum(outputNames)).min(1).max(3),
    compareWith: z.object({ imageId: identifier, frame: z.number().int().min(0).default(0) }).optional(),
    facts: z.object({ phaseEncode: phaseEncodeSchema.optional() }).optional(),
  }),
  answers: 'binary',
});
export type SimulationRequest = z.input<typeof simulate.body>;
