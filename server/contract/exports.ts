/**
 * What leaves the product as a file. Every picture has SIMULATED, NOT FOR DIAGNOSIS in its pixels; every name of a file says simulated, and the
 * number of the case. Levels of 16 bits times the written slope are the values.
 */
import { z } from 'zod';
import { phaseEncodeSchema } from './facts';
import { recipeFileSchema } from './recipe-file';
import { everyMember, identifier, route } from './route';

/** In the order of a menu. */
export const trialFiles = [
  'derived.dcm',
  'image.png',
  'image16.png',
  'kspace.png',
  'kspace16.png',
  'image.npy',
  'kspace.npy',
  'recipe.json',
] as const;
export type TrialFile = (typeof trialFiles)[number];
export type ComputedFile = Exclude<TrialFile, 'recipe.json'>;

const computed = (file: ComputedFile, summary: string) =>
  route({
    method: 'get',
    path: `/api/cases/:caseId/trials/:trialId/${file}`,
    summary,
    access: everyMember,
    params: z.object({ caseId: identifier, trialId: identifier }),
    answers: 'binary',
  });

export const readTrialDicom = computed(
  'derived.dcm',
  'A trial as derived DICOM: new identifiers, no identity, its causes in Derivation Description',
);
export const readTrialImage = computed('image.png', 'The image of a trial as an 8-bit PNG, in the window of its source');
export const readTrialImage16 = computed('image16.png', 'The image of a trial as a 16-bit PNG');
export const readTrialKspace = computed('kspace.png', 'The k-space of a trial, log magnitude over four decades, as an 8-bit PNG');
export const readTrialKspace16 = computed('kspace16.png', 'The k-space of a trial, log magnitude over eight decades, as a 16-bit PNG');
export const readTrialImageArray = computed('image.npy', 'The image of a trial as a NumPy array, float32');
export const readTrialKspaceArray = computed('kspace.npy', 'The samples of a trial as acquired as a NumPy array, complex64');

export const readTrialRecipe = route({
  method: 'get',
  path: '/api/cases/:caseId/trials/:trialId/recipe.json',
  summary: 'The recipe of a trial as a file that another bench can open',
  access: everyMember,
  params: z.object({ caseId: identifier, trialId: identifier }),
  output: recipeFileSchema,
});

export const readDerivedImage = route({
  method: 'get',
  path: '/api/images/:imageId/derived.dcm',
  summary: 'A recipe on an image as derived DICOM, without a case; no recipe leaves the image as it is, rebuilt without identity',
  access: everyMember,
  params: z.object({ imageId: identifier }),
  query: z.object({
    frame: z.coerce.number().int().min(0).default(0),
    /** A recipe as JSON. */
    recipe: z.string().max(16_000).optional(),
    phaseEncode: phaseEncodeSchema.optional(),
  }),
  answers: 'binary',
});
