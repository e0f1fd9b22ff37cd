/** Errors on the wire: RFC 9457 problem+json with a closed list of codes. */
import { z } from 'zod';

/** Every code there is, with the status it is sent under. */
export const problemStatus = {
  'invalid-input': 400,
  'not-signed-in': 401,
  'wrong-credentials': 401,
  'wrong-token': 401,
  'not-allowed': 403,
  'foreign-origin': 403,
  'not-found': 404,
  'version-conflict': 409,
  'transition-not-possible': 409,
  'too-large': 413,
  'unsupported-media-type': 415,
  'nothing-accepted': 422,
  'not-computable': 422,
  'text-questioned': 422,
  'too-many-attempts': 429,
  unexpected: 500,
  'database-away': 503,
  busy: 503,
} as const;

export type ProblemCode = keyof typeof problemStatus;
export const problemCodes = Object.keys(problemStatus) as ProblemCode[];

/** One offending field: `path` is the way to it in the request body, params or query. */
export const issueSchema = z.object({ path: z.array(z.union([z.string(), z.number()])), message: z.string() });
export type Issue = z.infer<typeof issueSchema>;

export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  code: z.enum(problemCodes as [ProblemCode, ...ProblemCode[]]),
  detail: z.string().optional(),
  issues: z.array(issueSchema).optional(),
});
export type Problem = z.infer<typeof problemSchema>;
