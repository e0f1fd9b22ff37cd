/**
 * The log: JSON lines by pino. A request is logged by method, route pattern, status and time; never its address line, query, body,
 * cookies or file names, because any of them may carry what a person typed about a patient.
 */
import { randomUUID } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';
import type { RequestHandler } from 'express';
import { pino, type DestinationStream, type Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import { errorCode } from './error-code';

/** The log of a server; `destination` is standard output unless a test listens. */
export function openLog(level: string, destination?: DestinationStream): Logger {
  const options = {
    level,
    // The name of the machine says nothing that the owner of the log does not know.
    base: undefined,
    redact: ['req.headers', 'res.headers', '*.password', '*.cookie', '*.authorization'],
    serializers: { err: describeError },
  };
  return destination === undefined ? pino(options) : pino(options, destination);
}

/** Logs each request once it is answered. */
export function logRequests(log: Logger): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: () => randomUUID(),
    serializers: { req: () => undefined, res: () => undefined, err: describeError },
    quietReqLogger: true,
    customLogLevel: (_request, response, error) => (error !== undefined || response.statusCode >= 500 ? 'warn' : 'info'),
    customSuccessObject: (request, response, { responseTime }) => describeAnswer(request, response, responseTime),
    customErrorObject: (request, response, _error, { responseTime }) => describeAnswer(request, response, responseTime),
  });
}

const describeAnswer = (request: IncomingMessage, { statusCode }: ServerResponse, milliseconds: number) => ({
  method: request.method,
  route: routeOf(request),
  status: statusCode,
  milliseconds,
});

/** The pattern that matched, `/api/cases/:caseId`, without the values in it. */
const routeOf = (request: object): string => {
  const route = 'route' in request ? request.route : undefined;
  return typeof route === 'object' && route !== null && 'path' in route ? String(route.path) : 'none';
};

/** An error without the values in it: the database's messages repeat parameters and rows, so only their codes are kept. */
function describeError(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { type: typeof error };
  const fromDatabase = 'query' in error || 'severity' in error;
  return {
    type: error.name,
    code: errorCode(error),
    message: fromDatabase ? 'the database refused a statement' : error.message,
    constraint: 'constraint_name' in error ? error.constraint_name : undefined,
    stack: error.stack
      ?.split('\n')
      .filter((line) => /^\s+at /.test(line))
      .join('\n'),
    cause: error.cause === undefined ? undefined : describeError(error.cause),
  };
}
