/**
 * Errors of the server. A service throws AppError with a code of the closed list; the one middleware here turns every error into
 * problem+json (RFC 9457). What is not ours becomes `unexpected`: logged once, nothing of it sent.
 */
import type { ErrorRequestHandler } from 'express';
import { MulterError } from 'multer';
import type { Logger } from 'pino';
import type { z } from 'zod';
import { isQueueFull } from '../workers/pool';
import { problemStatus, type Issue, type Problem, type ProblemCode } from './contract/problem';
import { errorCode } from './error-code';

const titles: Record<ProblemCode, string> = {
  'invalid-input': 'Something in the request is not as it must be',
  'not-signed-in': 'Sign in first',
  'wrong-credentials': 'E-mail or password is wrong',
  'wrong-token': 'The token of a scanner is needed',
  'not-allowed': 'Your role does not allow this',
  'foreign-origin': 'The request comes from another site',
  'not-found': 'There is no such thing here',
  'version-conflict': 'Somebody changed this meanwhile',
  'transition-not-possible': 'The case cannot take this step now',
  'too-large': 'Too much was sent',
  'unsupported-media-type': 'This is not taken in this form',
  'nothing-accepted': 'None of the files could be taken',
  'not-computable': 'This cannot be computed',
  'text-questioned': 'This text may name a patient',
  'too-many-attempts': 'Too many attempts',
  unexpected: 'Something went wrong on the server',
  'database-away': 'The database is not reachable',
  busy: 'The server is too busy',
};

interface ProblemExtras {
  readonly detail?: string | undefined;
  readonly issues?: readonly Issue[];
  readonly retryAfterSeconds?: number;
}

/** A refusal that the client can act on. */
export class AppError extends Error {
  readonly code: ProblemCode;
  readonly detail: string | undefined;
  readonly issues: readonly Issue[] | undefined;
  readonly retryAfterSeconds: number | undefined;

  constructor(code: ProblemCode, { detail, issues, retryAfterSeconds }: ProblemExtras = {}) {
    super(detail ?? code);
    this.name = 'AppError';
    this.code = code;
    this.detail = detail;
    this.issues = issues;
    this.retryAfterSeconds = retryAfterSeconds;
  }
}

/** `invalid-input` at one field. */
export const invalidAt = (path: Issue['path'], message: string): AppError =>
  new AppError('invalid-input', { detail: message, issues: [{ path, message }] });

/** The issues of a failed parse. */
export const issuesOf = (error: z.ZodError): Issue[] =>
  error.issues.map(({ path, message }) => ({ path: path.map((part) => (typeof part === 'symbol' ? part.toString() : part)), message }));

/** The body of an answer for `error`. */
export function problemOf({ code, detail, issues }: AppError): Problem {
  return {
    type: `urn:pickglass:problem:${code}`,
    title: titles[code],
    status: problemStatus[code],
    code,
    ...(detail === undefined ? {} : { detail }),
    ...(issues === undefined ? {} : { issues: [...issues] }),
  };
}

/** Codes of PostgreSQL (class 08, 57P01–57P03) and of the driver that mean: no connection. */
const databaseAway = /^(08...|57P0[123]|CONNECT_TIMEOUT|CONNECTION_(CLOSED|ENDED|DESTROYED|CONNECT_TIMEOUT))$/;
const networkAway = new Set(['ECONNREFUSED', 'ECONNRESET', 'ENOTFOUND', 'EPIPE', 'ETIMEDOUT']);

/** Whether `error`, or the error it wraps, says that the database cannot be reached. */
export function isDatabaseAway(error: unknown): boolean {
  const code = errorCode(error) ?? '';
  if (databaseAway.test(code) || networkAway.has(code)) return true;
  return error instanceof Error && error.cause !== undefined && isDatabaseAway(error.cause);
}

const uploadLimits: Partial<Record<MulterError['code'], string>> = {
  LIMIT_FILE_COUNT: 'There are too many files in one upload',
  LIMIT_PART_COUNT: 'There are too many parts in one upload',
  LIMIT_FILE_SIZE: 'A file is too large',
};

/** Gives any thrown value its place in the closed list. */
export function asAppError(error: unknown): AppError {
  if (error instanceof AppError) return error;
  if (error instanceof MulterError) return fromMulter(error);
  if (isDatabaseAway(error)) return new AppError('database-away');
  if (isQueueFull(error)) return new AppError('busy', { retryAfterSeconds: 1 });
  return fromBodyParser(error) ?? new AppError('unexpected');
}

function fromMulter(error: MulterError): AppError {
  const limit = uploadLimits[error.code];
  if (limit !== undefined) return new AppError('too-large', { detail: limit });
  if (error.code === 'LIMIT_UNEXPECTED_FILE') return invalidAt(['files'], 'files are sent in the field `files`');
  return invalidAt([], 'the multipart body cannot be read');
}

/** Errors of body-parser and busboy carry an HTTP status of their own; their text may repeat the body and is not passed on. */
function fromBodyParser(error: unknown): AppError | undefined {
  if (!(error instanceof Error)) return undefined;
  const status = 'status' in error ? error.status : undefined;
  if (status === 413) return new AppError('too-large', { detail: 'The body of the request is too large' });
  if (status === 404) return new AppError('not-found');
  if (typeof status === 'number' && status >= 400 && status < 500) return invalidAt([], 'the body of the request cannot be read');
  if (/^(Malformed part header|Multipart: Boundary not found|Unexpected end of form)$/.test(error.message)) {
    return invalidAt([], 'the multipart body cannot be read');
  }
  return undefined;
}

/** What is left when a client goes away: a stopped job, half an upload. Nobody waits for an answer, and nothing is wrong here. */
const isDeparture = (error: unknown): boolean =>
  error instanceof Error && (error.name === 'AbortError' || /^Request (aborted|closed)$/.test(error.message));

/** The one error middleware. */
export function answerErrors(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.destroyed && isDeparture(error)) return;
    const problem = asAppError(error);
    if (problem.code === 'unexpected') log.error({ err: error, method: request.method }, 'unexpected error');
    if (response.headersSent) {
      next(error);
      return;
    }
    if (problem.retryAfterSeconds !== undefined) response.set('Retry-After', String(problem.retryAfterSeconds));
    response
      .status(problemStatus[problem.code])
      .type('application/problem+json')
      .send(JSON.stringify(problemOf(problem)));
  };
}
