/** The network as the client sees it: `fetch` of the browser answers what a test lays out, and what was asked is kept. */
export interface Asked {
  readonly method: string;
  readonly address: string;
  readonly body: unknown;
}
export interface Answer {
  readonly status?: number;
  readonly json?: unknown;
}

/** Answers each request with what `answer` says for it; `null` means that the network is down. Returns what was asked. */
export function answerWith(answer: (asked: Asked) => Answer | null): Asked[] {
  const asked: Asked[] = [];
  const answered = async (address: string, options: { method?: string; body?: string } = {}) => {
    const request: Asked = {
      method: options.method ?? 'GET',
      address,
      body: options.body === undefined ? undefined : JSON.parse(options.body),
    };
    asked.push(request);
    const reply = answer(request);
    if (reply === null) throw new TypeError('Failed to fetch');
    const status = reply.status ?? 200;
    return { ok: status >= 200 && status < 300, status, json: async () => reply.json };
  };
  Object.defineProperty(globalThis, 'fetch', { configurable: true, writable: true, value: answered });
  return asked;
}

export const problem = (status: number, code: string, detail: string, issues: unknown[] = []): Answer => ({
  status,
  json: { type: `urn:pickglass:problem:${code}`, title: code, status, code, detail, issues },
});
