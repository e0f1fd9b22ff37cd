/**
 * Asking before a text is sent that looks like a patient's name, date or number. A field asks beside itself; what nobody answered there is
 * asked once more in a dialog when the text is sent. The server refuses what was never asked (server/contract/questioned-text.ts).
 */
import { useSyncExternalStore } from 'react';
import type { z } from 'zod';
import { questionedFields } from '@/server/contract/questioned-text';
import type { Route } from '@/server/contract/route';
import { ApiProblem } from './api-problem';
import { call, type CallInput } from './call';

export interface TextQuestion {
  readonly text: string;
  readonly question: string;
  readonly answer: (keep: boolean) => void;
}

let open: TextQuestion | null = null;
const listeners = new Set<() => void>();

function show(next: TextQuestion | null): void {
  open = next;
  listeners.forEach((listener) => listener());
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** The question that waits for its answer. */
export const useTextQuestion = (): TextQuestion | null => useSyncExternalStore(subscribe, () => open);

/** Texts that somebody was asked about and keeps; forgotten with the page. */
const kept = new Set<string>();

export const keepText = (text: string): void => void kept.add(text.trim());

const ask = (text: string, question: string): Promise<boolean> =>
  new Promise((resolve) => {
    const answer = (keep: boolean): void => {
      show(null);
      resolve(keep);
    };
    show({ text, question, answer });
  });

/** `call` for a body with free text. Throws `text-questioned` at the field of a text that is not kept after all. */
export async function callWithText<R extends Route>(route: R, input: CallInput<R>): Promise<z.output<R['output']>> {
  const body = bodyOf(input);
  const questioned = questionedFields(body);
  for (const { field, question } of questioned) {
    const text = String(body[field]).trim();
    if (kept.has(text)) continue;
    if (!(await ask(text, question))) throw new ApiProblem('text-questioned', 422, question, [{ path: [field], message: question }]);
    keepText(text);
  }
  return call(route, questioned.length > 0 ? { ...input, body: { ...body, confirmedText: true } } : input);
}

const bodyOf = ({ body }: { readonly body?: unknown }): Readonly<Record<string, unknown>> =>
  typeof body === 'object' && body !== null ? { ...body } : {};
