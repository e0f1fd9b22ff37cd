/**
 * Serving a route of the contract. In this order: the origin, the access rule (closed by default), the shape of the input, the
 * handler, the shape of the output. A handler sees parsed values only, and a member only where the contract asks for one.
 */
import type { Express, Request, RequestHandler, Response } from 'express';
import type { z } from 'zod';
import type { Route } from './contract/route';
import { routes } from './contract/routes';
import type { Dependencies } from './dependencies';
import { AppError, issuesOf } from './errors';
import { scannerOfToken, type SendingScanner } from './push/tokens';
import { readSession, type Caller } from './services/sessions';

/** Bytes that a binary route answers with. */
export interface Binary {
  readonly mediaType: string;
  readonly bytes: Uint8Array;
  readonly headers?: Readonly<Record<string, string>>;
}

/** What a handler returns: the output of the contract, or bytes (nothing, for 204) where the contract declares none. */
type Result<O extends z.ZodType> = [z.output<O>] extends [Record<string, never>] ? Binary | void : z.input<O>;

interface Call<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, Who> {
  readonly params: z.output<P>;
  readonly query: z.output<Q>;
  readonly body: z.output<B>;
  readonly caller: Who;
  readonly request: Request;
  readonly response: Response;
  /** Aborts when the client goes away before it has its answer. */
  readonly gone: AbortSignal;
}

type Handler<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, O extends z.ZodType, Who> = (
  call: Call<P, Q, B, Who>,
) => Promise<Result<O>>;

interface Options<O extends z.ZodType, Who> {
  /** Middleware between the access rule and the input: a multipart reader, which may ask whose request it is. */
  readonly reader?: (callerOf: (request: Request) => Who) => RequestHandler;
  /** Status of a success, where it depends on the output. */
  readonly status?: (output: z.output<O>) => number;
}

/** The application while routes are being added to it. */
export interface App {
  readonly express: Express;
  readonly deps: Dependencies;
  readonly served: Set<string>;
}

const nameOf = ({ method, path }: Route): string => `${method.toUpperCase()} ${path}`;

/** Serves a route that is for members. */
export function serve<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, O extends z.ZodType>(
  app: App,
  route: Route<P, Q, B, O>,
  handler: Handler<P, Q, B, O, Caller>,
  options: Options<O, Caller> = {},
): void {
  const { access } = route;
  if (typeof access === 'string') throw new Error(`${nameOf(route)} is not for members: use serveAnyone or serveScanner`);
  const admit = async (request: Request): Promise<Caller> => {
    const caller = await readSession(app.deps, request.headers.cookie);
    if (caller === undefined) throw new AppError('not-signed-in');
    if (!access.includes(caller.role)) throw new AppError('not-allowed');
    return caller;
  };
  register(app, route, { admit, handler, options });
}

/** Serves a route that the contract opens to anyone. */
export function serveAnyone<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, O extends z.ZodType>(
  app: App,
  route: Route<P, Q, B, O>,
  handler: Handler<P, Q, B, O, undefined>,
): void {
  if (route.access !== 'anyone') throw new Error(`${nameOf(route)} is for members: use serve`);
  register(app, route, { admit: () => Promise.resolve(undefined), handler, options: {} });
}

/** Serves a route that the contract opens to scanners, by a token of theirs. A session does not open it. */
export function serveScanner<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, O extends z.ZodType>(
  app: App,
  route: Route<P, Q, B, O>,
  handler: Handler<P, Q, B, O, SendingScanner>,
  options: Options<O, SendingScanner> = {},
): void {
  if (route.access !== 'scanner') throw new Error(`${nameOf(route)} is not for scanners`);
  const admit = async (request: Request): Promise<SendingScanner> => {
    const scanner = await scannerOfToken(app.deps.db, request.headers.authorization);
    if (scanner !== undefined) return scanner;
    request.res?.setHeader('WWW-Authenticate', 'Bearer');
    throw new AppError('wrong-token');
  };
  register(app, route, { admit, handler, options });
}

interface Served<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, O extends z.ZodType, Who> {
  readonly admit: (request: Request) => Promise<Who>;
  readonly handler: Handler<P, Q, B, O, Who>;
  readonly options: Options<O, Who>;
}

function register<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, O extends z.ZodType, Who>(
  app: App,
  route: Route<P, Q, B, O>,
  { admit, handler, options }: Served<P, Q, B, O, Who>,
): void {
  app.served.add(nameOf(route));
  const callers = new WeakMap<Request, Who>();
  const callerOf = (request: Request) => callers.get(request) as Who;

  const enter: RequestHandler = async (request, _response, next) => {
    callers.set(request, await admit(request));
    next();
  };
  const answer: RequestHandler = async (request, response) => {
    const call = {
      params: parsePath(route.params, request.params),
      query: parse(route.query, request.query),
      // A multipart body is not a value to parse: its reader has been over it.
      body: parse(route.body, route.takes === 'json' ? (request.body ?? {}) : {}),
      caller: callerOf(request),
      request,
      response,
      gone: goneSignal(response),
    };
    send(route, response, await handler(call), options.status);
  };
  app.express[route.method](route.path, enter, ...(options.reader ? [options.reader(callerOf)] : []), answer);
}

function parse<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw new AppError('invalid-input', { issues: issuesOf(parsed.error) });
  return parsed.data;
}

/** A path whose identifiers are not identifiers leads to nothing: that is a 404, not a fault of a form. */
function parsePath<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw new AppError('not-found');
  return parsed.data;
}

function goneSignal(response: Response): AbortSignal {
  const controller = new AbortController();
  response.once('close', () => {
    if (!response.writableFinished) controller.abort();
  });
  return controller.signal;
}

function send<O extends z.ZodType>(
  route: Route<z.ZodType, z.ZodType, z.ZodType, O>,
  response: Response,
  result: Result<O>,
  statusOf?: (output: z.output<O>) => number,
): void {
  if (route.answers === 'empty') {
    response.status(route.status).end();
    return;
  }
  if (route.answers === 'json' || route.answers === 'dicom-json') {
    const output = route.output.parse(result);
    if (route.answers === 'dicom-json') response.type('application/dicom+json');
    response.status(statusOf?.(output) ?? route.status).json(output);
    return;
  }
  if (!isBinary(result)) throw new TypeError(`${nameOf(route)} must answer with bytes`);
  const { bytes, mediaType, headers = {} } = result;
  response
    .status(route.status)
    .set(headers)
    .type(mediaType)
    .send(Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength));
}

const isBinary = (value: unknown): value is Binary => typeof value === 'object' && value !== null && 'bytes' in value;

/** Throws when the contract promises a route that nothing serves: such a server must not start. */
export function refuseUnserved({ served }: App): void {
  const missing = routes.map(nameOf).filter((name) => !served.has(name));
  if (missing.length > 0) throw new Error(`the contract has routes that nothing serves: ${missing.join(', ')}`);
}
