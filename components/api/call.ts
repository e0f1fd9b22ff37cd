/**
 * One call for every route of the contract: the address, the types and the check of the answer come from the route itself.
 * Same origin, the session is a cookie. Whatever goes wrong is an ApiProblem.
 */
import type { z } from 'zod';
import type { Route } from '@/server/contract/route';
import { ApiProblem, noAnswer, problemFrom } from './api-problem';

type Part<Name extends string, Schema extends z.ZodType> =
  Record<never, never> extends z.input<Schema> ? { [K in Name]?: z.input<Schema> } : { [K in Name]: z.input<Schema> };

/** What a route is called with: a part that has no required field may be left out. */
export type CallInput<R extends Route> = Part<'params', R['params']> & Part<'query', R['query']> & Part<'body', R['body']>;

type Loose = { params?: unknown; query?: unknown; body?: unknown };
const entriesOf = (value: unknown): [string, unknown][] => Object.entries(value ?? {});

/** `/api/cases/:caseId` with its values, and the query behind it; a value that is undefined is left out. */
export function addressOf(path: string, params: unknown, query: unknown): string {
  const values = new Map(entriesOf(params));
  const filled = path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(values.get(name))));
  const search = new URLSearchParams();
  for (const [name, value] of entriesOf(query)) if (value !== undefined && value !== '') search.set(name, String(value));
  const text = search.toString();
  return text ? `${filled}?${text}` : filled;
}

/** Sends the request and returns the answer when it is a success. */
export async function send(route: Route, input: Loose, options: { accept?: string; signal?: AbortSignal } = {}): Promise<Response> {
  const hasBody = route.method !== 'get' && route.method !== 'delete';
  const response = await fetch(addressOf(route.path, input.params, input.query), {
    method: route.method.toUpperCase(),
    credentials: 'same-origin',
    headers: { accept: options.accept ?? 'application/json', ...(hasBody ? { 'content-type': 'application/json' } : {}) },
    ...(hasBody ? { body: JSON.stringify(input.body ?? {}) } : {}),
    ...(options.signal ? { signal: options.signal } : {}),
  }).catch((cause: unknown) => {
    if (cause instanceof DOMException && cause.name === 'AbortError') throw cause;
    throw noAnswer();
  });
  if (response.ok) return response;
  throw problemFrom(response.status, await response.json().catch(() => null));
}

export async function call<R extends Route>(route: R, input: CallInput<R>, signal?: AbortSignal): Promise<z.output<R['output']>> {
  const response = await send(route, input, signal ? { signal } : {});
  const body: unknown = route.answers === 'empty' ? {} : await response.json().catch(() => undefined);
  const parsed = route.output.safeParse(body);
  if (!parsed.success)
    throw new ApiProblem('not-understood', response.status, 'The answer of the server was not understood: reload the page.');
  return parsed.data as z.output<R['output']>;
}
