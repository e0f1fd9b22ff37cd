/** The parts of a case: trials, marks, comments, the finding, the timeline, and the steps of its life. */
import { z } from 'zod';
import { caseParams, caseSchema, caseStateSchema, findingSchema } from './cases';
import { phaseEncodeSchema } from './facts';
import { metricsSchema } from './planes';
import { confirmedText } from './questioned-text';
import { recipeSchema } from './recipe';
import { everyMember, identifier, roleSchema, route, timestamp } from './route';

const author = z.object({ id: identifier, name: z.string(), role: roleSchema });

export const trialSchema = z.object({
  id: identifier,
  /** 1, 2, 3 … within the case. */
  number: z.number().int(),
  note: z.string(),
  imageId: identifier,
  frame: z.number().int(),
  compareWith: z.object({ imageId: identifier, frame: z.number().int() }).nullable(),
  phaseEncode: phaseEncodeSchema,
  recipe: recipeSchema,
  metrics: metricsSchema,
  /** SHA-256 of the float32 image plane: the same recipe on the same image gives it again. */
  digest: z.string(),
  author,
  createdAt: timestamp,
});
export type Trial = z.infer<typeof trialSchema>;

export const keepTrial = route({
  method: 'post',
  path: '/api/cases/:caseId/trials',
  summary: 'Keep a recipe as a trial. The server runs it, and keeps numbers, picture and digest',
  access: everyMember,
  params: caseParams,
  status: 201,
  body: z.object({
    imageId: identifier,
    frame: z.number().int().min(0).default(0),
    compareWith: z
      .object({ imageId: identifier, frame: z.number().int().min(0).default(0) })
      .nullable()
      .default(null),
    recipe: recipeSchema,
    facts: z.object({ phaseEncode: phaseEncodeSchema.optional() }).optional(),
    note: z.string().trim().max(400).default(''),
    confirmedText,
  }),
  output: trialSchema,
});
export const listTrials = route({
  method: 'get',
  path: '/api/cases/:caseId/trials',
  summary: 'Trials of a case, newest first',
  access: everyMember,
  params: caseParams,
  output: z.array(trialSchema),
});
export const readTrialThumbnail = route({
  method: 'get',
  path: '/api/cases/:caseId/trials/:trialId/thumbnail',
  summary: 'A small PNG of a trial, marked as simulated',
  access: everyMember,
  params: z.object({ caseId: identifier, trialId: identifier }),
  query: z.object({ domain: z.enum(['image', 'kspace']).default('image') }),
  answers: 'binary',
});

export const markKinds = ['arrow', 'ellipse', 'rectangle', 'polyline', 'text', 'ruler', 'profile'] as const;
/** Points are [column, row] in pixels of the image, fractions allowed: a mark belongs to the image, not to the zoom. */
export const markSchema = z.object({
  id: identifier,
  imageId: identifier,
  frame: z.number().int(),
  domain: z.enum(['image', 'kspace']),
  kind: z.enum(markKinds),
  points: z
    .array(z.tuple([z.number(), z.number()]))
    .min(1)
    .max(200),
  text: z.string(),
  author,
  createdAt: timestamp,
});
export type Mark = z.infer<typeof markSchema>;

export const addMark = route({
  method: 'post',
  path: '/api/cases/:caseId/marks',
  summary: 'Mark an image or its k-space',
  access: everyMember,
  params: caseParams,
  status: 201,
  body: z.object({
    imageId: identifier,
    frame: z.number().int().min(0).default(0),
    domain: z.enum(['image', 'kspace']).default('image'),
    kind: z.enum(markKinds),
    points: z
      .array(z.tuple([z.number().min(-8192).max(8192), z.number().min(-8192).max(8192)]))
      .min(1)
      .max(200),
    text: z.string().trim().max(400).default(''),
    confirmedText,
  }),
  output: markSchema,
});
export const listMarks = route({
  method: 'get',
  path: '/api/cases/:caseId/marks',
  summary: 'Marks of a case',
  access: everyMember,
  params: caseParams,
  output: z.array(markSchema),
});
export const removeMark = route({
  method: 'delete',
  path: '/api/cases/:caseId/marks/:markId',
  summary: 'Take a mark away; its author, a lead technologist or a physicist may',
  access: everyMember,
  params: z.object({ caseId: identifier, markId: identifier }),
  status: 204,
});

export const commentSchema = z.object({ id: identifier, text: z.string(), author, createdAt: timestamp });
export type Comment = z.infer<typeof commentSchema>;
export const addComment = route({
  method: 'post',
  path: '/api/cases/:caseId/comments',
  summary: 'Write a note into the discussion',
  access: everyMember,
  params: caseParams,
  status: 201,
  body: z.object({ text: z.string().trim().min(1, 'an empty note cannot be saved').max(4000), confirmedText }),
  output: commentSchema,
});
export const listComments = route({
  method: 'get',
  path: '/api/cases/:caseId/comments',
  summary: 'The discussion, oldest first',
  access: everyMember,
  params: caseParams,
  output: z.array(commentSchema),
});

export const writeFinding = route({
  method: 'post',
  path: '/api/cases/:caseId/findings',
  summary: 'Write the finding, or a new version of it; the former stays in the timeline',
  access: ['lead-technologist', 'physicist'],
  params: caseParams,
  body: findingSchema.extend({ confirmedText }),
  output: caseSchema,
});

export const eventKinds = [
  'filed',
  'changed',
  'image-added',
  'fact-set',
  'trial-kept',
  'mark-added',
  'mark-removed',
  'commented',
  'finding-written',
  'assigned',
  'state-changed',
  'signed',
] as const;
export const eventSchema = z.object({
  id: identifier,
  at: timestamp,
  actor: author,
  kind: z.enum(eventKinds),
  from: caseStateSchema.nullable(),
  to: caseStateSchema.nullable(),
  text: z.string(),
});
export type CaseEvent = z.infer<typeof eventSchema>;
export const readTimeline = route({
  method: 'get',
  path: '/api/cases/:caseId/timeline',
  summary: 'Who did what, when; newest first; nobody can edit it',
  access: everyMember,
  params: caseParams,
  output: z.array(eventSchema),
});

/** The steps of a case's life. `assign` also takes a reported case under investigation. */
export const transitionSchema = z.discriminatedUnion('action', [
  z.object({ action: z.literal('assign'), memberId: identifier }),
  z.object({ action: z.literal('investigate') }),
  z.object({ action: z.literal('ask-for-sign-off') }),
  z.object({ action: z.literal('return'), reason: z.string().trim().min(1, 'say what is missing').max(1000), confirmedText }),
  z.object({
    action: z.literal('sign-off'),
    /** Typed to confirm: the number of the case. */
    caseNumber: z.number().int(),
    confidence: findingSchema.shape.confidence,
    lesson: findingSchema.shape.lesson,
    attested: z.array(z.object({ line: z.string().max(200), stands: z.boolean() })).max(12),
    confirmedText,
  }),
  z.object({ action: z.literal('reopen'), reason: z.string().trim().min(1, 'say why it is reopened').max(1000), confirmedText }),
]);
export type Transition = z.infer<typeof transitionSchema>;
export const moveCase = route({
  method: 'post',
  path: '/api/cases/:caseId/transitions',
  summary: 'Assign, investigate, ask for sign-off, return, sign off, reopen',
  access: everyMember,
  params: caseParams,
  body: transitionSchema,
  output: caseSchema,
});
