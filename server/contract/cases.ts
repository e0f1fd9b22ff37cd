/** Cases: file, list and find, read, change. */
import { z } from 'zod';
import { confirmedText } from './questioned-text';
import { everyMember, identifier, roleSchema, route, timestamp } from './route';
import { sightings, sightingSchema } from './sighting';

export const caseStates = ['reported', 'under-investigation', 'awaiting-sign-off', 'closed'] as const;
export const caseStateSchema = z.enum(caseStates);
export type CaseState = z.infer<typeof caseStateSchema>;

export const directions = ['phase-encode', 'frequency-encode', 'both', 'none', 'unknown'] as const;
export const frequencies = ['once', 'on-and-off', 'every-scan', 'unknown'] as const;
export const imageCosts = ['usable', 'repeated', 'abandoned', 'unknown'] as const;
export const imageRoles = ['bad', 'comparison', 'phantom', 'other-slice', 'noise-only', 'coil-element', 'verification'] as const;
export const confidences = ['consistent', 'reproduced', 'removed', 'reproduced-and-removed', 'excluded-others', 'not-found'] as const;

const person = z.object({ id: identifier, name: z.string(), role: roleSchema });

export const caseImageSchema = z.object({ imageId: identifier, role: z.enum(imageRoles), addedAt: timestamp });

export const caseSummarySchema = z.object({
  id: identifier,
  number: z.number().int(),
  title: z.string(),
  state: caseStateSchema,
  scanner: z.object({ id: identifier, name: z.string() }).nullable(),
  coil: z.object({ id: identifier, name: z.string() }).nullable(),
  seen: z.array(sightingSchema),
  direction: z.enum(directions),
  assignee: person.nullable(),
  /** Image whose picture stands for the case. */
  pictureImageId: identifier.nullable(),
  openedAt: timestamp,
  updatedAt: timestamp,
});
export type CaseSummary = z.infer<typeof caseSummarySchema>;

export const findingSchema = z.object({
  /** Id of a cause of the catalogue, or null: not found. */
  cause: z.string().max(60).nullable(),
  confidence: z.enum(confidences),
  text: z.string().trim().min(1).max(4000),
  lesson: z.string().trim().max(2000).default(''),
});
export type Finding = z.infer<typeof findingSchema>;

export const signatureSchema = z.object({
  member: person,
  at: timestamp,
  /** Lines the physicist stood by, and lines left open. */
  attested: z.array(z.object({ line: z.string(), stands: z.boolean() })),
  /** SHA-256 over the case as it was signed. */
  digest: z.string(),
});

export const caseSchema = caseSummarySchema.extend({
  version: z.number().int(),
  howOften: z.enum(frequencies),
  cost: z.enum(imageCosts),
  bodyRegion: z.string(),
  protocol: z.string(),
  description: z.string(),
  tried: z.string(),
  seenOn: z.iso.date().nullable(),
  reporter: person,
  images: z.array(caseImageSchema),
  finding: findingSchema.extend({ author: person, at: timestamp }).nullable(),
  signature: signatureSchema.nullable(),
  /** What the asking member may do now; the server enforces it, the client shows it. */
  may: z.object({ edit: z.boolean(), assign: z.boolean(), writeFinding: z.boolean(), transitions: z.array(z.string()) }),
});
export type Case = z.infer<typeof caseSchema>;

const caseFields = {
  title: z.string().trim().min(1, 'a case needs a title').max(160),
  scannerId: identifier.nullable(),
  coilId: identifier.nullable(),
  seen: z.array(sightingSchema).max(sightings.length),
  direction: z.enum(directions),
  howOften: z.enum(frequencies),
  cost: z.enum(imageCosts),
  bodyRegion: z.string().trim().max(80),
  protocol: z.string().trim().max(120),
  description: z.string().trim().max(4000),
  tried: z.string().trim().max(4000),
  seenOn: z.iso.date().nullable(),
};

export const caseParams = z.object({ caseId: identifier });

export const createCase = route({
  method: 'post',
  path: '/api/cases',
  summary: 'File a case',
  access: everyMember,
  status: 201,
  body: z
    .object(caseFields)
    .partial()
    .required({ title: true })
    .extend({
      images: z
        .array(z.object({ imageId: identifier, role: z.enum(imageRoles) }))
        // A series from a scanner's inbox becomes a case in one step.
        .max(1000)
        .default([]),
      confirmedText,
    }),
  output: caseSchema,
});
export type NewCase = z.input<typeof createCase.body>;

export const caseOrders = ['age', 'number', 'title', 'state'] as const;
export const listCases = route({
  method: 'get',
  path: '/api/cases',
  summary: 'Find cases of the own department',
  access: everyMember,
  query: z.object({
    q: z.string().trim().max(200).optional(),
    state: z.enum(['open', ...caseStates]).optional(),
    scannerId: identifier.optional(),
    seen: sightingSchema.optional(),
    /** Cases whose finding is this cause of the catalogue. */
    cause: z.string().max(60).optional(),
    order: z.enum(caseOrders).default('age'),
    descending: z.enum(['true', 'false']).default('false'),
    offset: z.coerce.number().int().min(0).default(0),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  output: z.object({
    cases: z.array(caseSummarySchema),
    total: z.number().int(),
    /** How many there are in each state under the other filters. */
    counts: z.record(caseStateSchema, z.number().int()),
  }),
});

export const readCase = route({
  method: 'get',
  path: '/api/cases/:caseId',
  summary: 'One case',
  access: everyMember,
  params: caseParams,
  output: caseSchema,
});

export const changeCase = route({
  method: 'patch',
  path: '/api/cases/:caseId',
  summary: 'Change what a case says. `version` is the one that was read: a newer one is a 409',
  access: everyMember,
  params: caseParams,
  body: z.object(caseFields).partial().extend({ version: z.number().int(), confirmedText }),
  output: caseSchema,
});

export const attachImage = route({
  method: 'post',
  path: '/api/cases/:caseId/images',
  summary: 'Put an uploaded image on a case, in a role',
  access: everyMember,
  params: caseParams,
  status: 201,
  body: z.object({ imageId: identifier, role: z.enum(imageRoles) }),
  output: caseSchema,
});
