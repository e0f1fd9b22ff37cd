/** The catalogue: what forms, swatches and the recipe are built from. Causes, reconstructions and corrections alike. */
import { z } from 'zod';
import { stepSchema } from './recipe';
import { everyMember, identifier, route } from './route';
import { sightingSchema } from './sighting';

/** Choices of the same model, each with the values for which a parameter matters; for others a form leaves it out, and its value stays. */
const whenSchema = z.record(z.string(), z.array(z.string()));

export const parameterSchema = z.union([
  z.object({
    id: z.string(),
    label: z.string(),
    unit: z.string(),
    min: z.number(),
    max: z.number(),
    step: z.number(),
    initial: z.number(),
    /** The scan fact that filled `initial`, in words, when an image was named in the query. */
    fromHeader: z.string().optional(),
    when: whenSchema.optional(),
  }),
  z.object({
    id: z.string(),
    label: z.string(),
    options: z.array(z.object({ value: z.string(), label: z.string() })),
    initial: z.string(),
    when: whenSchema.optional(),
  }),
]);
export type CatalogueParameter = z.infer<typeof parameterSchema>;

export const stages = ['object', 'encoding', 'receive', 'reconstruction'] as const;
export const stageSchema = z.enum(stages);
export type Stage = z.infer<typeof stageSchema>;

export const sourceSchema = z.object({
  citation: z.string(),
  year: z.number().int().optional(),
  doi: z.string().optional(),
  equation: z.string().optional(),
  /** `confirmed`: looked up. `from memory`: standard literature, not checked. `common practice`: a fact of the trade. */
  standing: z.enum(['confirmed', 'from memory', 'common practice']),
});
/** `changes`: up or down, as it is done. */
const moveSchema = z.enum(['rises', 'falls', 'changes']);

/** What a remedy moves besides the fault; what is left out stays as it is. */
export const movesSchema = z.object({
  /** Of the scan; `once` at the table or for an adjustment, after which the scan is as long as before. */
  time: z.union([moveSchema, z.literal('once')]).optional(),
  snr: moveSchema.optional(),
  contrast: z.literal('changes').optional(),
  sar: moveSchema.optional(),
  nerveStimulation: moveSchema.optional(),
  /** What the implant of a patient was cleared for may no longer hold. */
  implantConditions: z.literal('changes').optional(),
});
export type Moves = z.infer<typeof movesSchema>;

export const remedySchema = z.object({
  change: z.string(),
  who: z.enum(['technologist', 'physicist', 'licensed service']),
  /** In a sentence: all that `moves` names, how much, and what else is paid. */
  price: z.string(),
  moves: movesSchema,
});

/** What is said of causes and reconstructions alike. */
const entrySchema = z.object({
  id: z.string(),
  title: z.string(),
  stage: stageSchema,
  /** What is seen, in the words of a report. */
  seen: z.array(sightingSchema),
  runsAlong: z.enum(['phase-encode', 'readout', 'both', 'none']),
  /** The model, in TeX. */
  formula: z.string(),
  /** Scan facts that drive it, and how. */
  drivers: z.array(z.object({ fact: z.string(), does: z.string() })),
  parameters: z.array(parameterSchema),
  looks: z.object({ image: z.string(), kspace: z.string() }),
  /** Whether the bench starts it with a synthetic object phase: without one the model looks better than it is. */
  needsObjectPhase: z.boolean(),
  /** What the swatch is of. */
  phantom: z.object({ title: z.string(), fieldOfViewMm: z.number() }),
  /** The quantities that a swatch moves with its strength. */
  strength: z.array(
    z.object({
      label: z.string(),
      unit: z.string(),
      min: z.number(),
      max: z.number(),
      step: z.number(),
      mild: z.number(),
      strong: z.number(),
    }),
  ),
  remedies: z.array(remedySchema),
  sources: z.array(sourceSchema),
});
/** What a page of the catalogue is about. */
export type CatalogueEntry = z.infer<typeof entrySchema>;

export const causeSchema = entrySchema.extend({ stage: stageSchema.exclude(['reconstruction']) });
export type Cause = z.infer<typeof causeSchema>;

export const reconstructionSchema = entrySchema.extend({
  stage: z.literal('reconstruction'),
  /** The steps on which its swatch is shown, and with which the bench starts it. */
  shownOn: z.array(stepSchema.omit({ enabled: true })),
});
export type Reconstruction = z.infer<typeof reconstructionSchema>;

export const methodSchema = z.object({
  id: z.string(),
  title: z.string(),
  parameters: z.array(parameterSchema),
  looks: z.object({ image: z.string(), kspace: z.string() }),
  sources: z.array(sourceSchema),
});
export type Method = z.infer<typeof methodSchema>;

export const listCauses = route({
  method: 'get',
  path: '/api/causes',
  summary: 'Every modelled cause, in the order of the signal chain; with `imageId`, initial values come from its scan facts',
  access: everyMember,
  query: z.object({ imageId: identifier.optional() }),
  output: z.array(causeSchema),
});

/** Left half the picture, right half the middle of its k-space, as in the sample book; or one of the two. */
export const swatchDomains = ['half', 'image', 'kspace'] as const;
export type SwatchDomain = (typeof swatchDomains)[number];
export const readSwatch = route({
  method: 'get',
  path: '/api/causes/:causeId/swatch',
  summary:
    'A square PNG of the cause or reconstruction on the phantom that shows it best, computed by its own model: phase encoding left and right, strength 0 mild to 1 strong. Simulated, not for diagnosis',
  access: everyMember,
  params: z.object({ causeId: z.string().max(60) }),
  query: z.object({
    strength: z.coerce.number().min(0).max(1).default(0.5),
    domain: z.enum(swatchDomains).default('half'),
    /** Pixels of a side. */
    side: z.enum(['128', '256']).default('128'),
  }),
  answers: 'binary',
});

export const listReconstructions = route({
  method: 'get',
  path: '/api/reconstructions',
  summary: 'Every reconstruction method, the plainest first',
  access: everyMember,
  output: z.array(reconstructionSchema),
});
export const listCorrections = route({
  method: 'get',
  path: '/api/corrections',
  summary: 'Every correction that can be tried on a bad image',
  access: everyMember,
  output: z.array(methodSchema),
});
