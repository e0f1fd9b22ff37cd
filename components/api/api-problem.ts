/** An answer that is not a success: RFC 9457 problem+json as an error. `message` is the sentence to show. */
import { problemSchema, type Issue, type ProblemCode } from '@/server/contract/problem';

/** `no-answer`: the server could not be reached. `not-understood`: it answered something that is not in the contract. */
export type ApiProblemCode = ProblemCode | 'no-answer' | 'not-understood';

export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';

  constructor(
    readonly code: ApiProblemCode,
    readonly status: number,
    message: string,
    readonly issues: readonly Issue[] = [],
  ) {
    super(message);
  }

  /** What is wrong with one field of the request, by its path: `issueAt('body', 'title')` or `issueAt('title')`. */
  issueAt(...path: (string | number)[]): string | undefined {
    const wanted = path.join('.');
    return this.issues.find((issue) => issue.path.join('.') === wanted || issue.path.slice(1).join('.') === wanted)?.message;
  }
}

export const isSignedOut = (error: unknown): boolean => error instanceof ApiProblem && error.code === 'not-signed-in';
export const isConflict = (error: unknown): boolean => error instanceof ApiProblem && error.code === 'version-conflict';

export function problemFrom(status: number, body: unknown): ApiProblem {
  const parsed = problemSchema.safeParse(body);
  if (!parsed.success) return new ApiProblem('not-understood', status, `The server answered with status ${status} and no explanation.`);
  const { code, title, detail, issues } = parsed.data;
  return new ApiProblem(code, status, detail ?? title, issues);
}

export const noAnswer = (): ApiProblem =>
  new ApiProblem('no-answer', 0, 'The server does not answer. What you typed is still here; try again when the network is back.');
