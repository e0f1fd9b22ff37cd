/**
 * The shape of a route. A route is typed once, here: the server parses its input and output with it, the client takes its
 * types from it, and the OpenAPI page is made from it. This folder holds zod and types only, so that the client may import it.
 */
import { z } from 'zod';

export const roles = ['technologist', 'lead-technologist', 'physicist', 'administrator'] as const;
export const roleSchema = z.enum(roles);
export type Role = z.infer<typeof roleSchema>;

/** Who may call a route: anyone at all, a scanner by its token, or members with one of the roles. There is no default: a route says it. */
export type Access = 'anyone' | 'scanner' | readonly Role[];
export const everyMember = roles;

/** `json` is the usual answer; `dicom-json` the same under DICOM's media type; `binary` is typed planes or a file; `empty` is 204. */
export type Answer<Output extends z.ZodType> = { kind: 'json'; schema: Output } | { kind: 'binary'; mediaType: string } | { kind: 'empty' };

export interface Route<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Output extends z.ZodType = z.ZodType,
> {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Express path, for example `/api/cases/:caseId`. */
  readonly path: string;
  readonly summary: string;
  readonly access: Access;
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  /** Status of a success. */
  readonly status: number;
  readonly output: Output;
  readonly answers: 'json' | 'dicom-json' | 'binary' | 'empty';
  /** Media type of the request body; JSON unless the route takes files: of a form, or DICOM objects as multipart/related. */
  readonly takes: 'json' | 'multipart' | 'multipart-dicom';
}

const nothing = z.object({}).strip();
type Nothing = typeof nothing;

interface RouteDraft<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, O extends z.ZodType> {
  method: Route['method'];
  path: string;
  summary: string;
  access: Access;
  params?: P;
  query?: Q;
  body?: B;
  status?: number;
  output?: O;
  answers?: Route['answers'];
  takes?: Route['takes'];
}

/** Declares a route. What is left out is an empty object; `answers` is `json` where an output is given. */
export function route<
  P extends z.ZodType = Nothing,
  Q extends z.ZodType = Nothing,
  B extends z.ZodType = Nothing,
  O extends z.ZodType = Nothing,
>(draft: RouteDraft<P, Q, B, O>): Route<P, Q, B, O> {
  return {
    status: 200,
    takes: 'json',
    answers: draft.output ? 'json' : 'empty',
    ...draft,
    params: draft.params ?? (nothing as unknown as P),
    query: draft.query ?? (nothing as unknown as Q),
    body: draft.body ?? (nothing as unknown as B),
    output: draft.output ?? (nothing as unknown as O),
  };
}

export const identifier = z.uuid();
export const timestamp = z.iso.datetime({ offset: true });
