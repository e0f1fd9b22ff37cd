/**
 * The hook that follows a slider: one request on its way, the newest next, what arrives is shown. The network is the boundary of the
 * client: `fetch` is a server of ours that answers when the test says so.
 */
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, renderHook, waitFor } from '@testing-library/react';
import type { ReactNode } from 'react';
import { useSimulation } from '@/components/api/simulations';
import type { SimulationRequest } from '@/server/contract/simulations';

interface Arrived {
  readonly seed: number;
  readonly imageId: string;
  readonly signal: AbortSignal | null | undefined;
  readonly answer: (response: Partial<Response>) => void;
}

const header = JSON.stringify([{ name: 'image', rows: 1, columns: 1, type: 'uint16', spacing: [1, 1], origin: [0, 0], low: 0, high: 1 }]);
const planes = (): Partial<Response> => ({
  ok: true,
  headers: { get: (name: string) => (name === 'Pickglass-Planes' ? header : null) } as unknown as Headers,
  arrayBuffer: () => Promise.resolve(new ArrayBuffer(2)),
});
const refusal: Partial<Response> = {
  ok: false,
  status: 400,
  json: () =>
    Promise.resolve({
      type: 'about:blank',
      title: 'Invalid input',
      status: 400,
      code: 'invalid-input',
      issues: [{ path: ['recipe', 'seed'], message: 'no' }],
    }),
};

let arrived: Arrived[] = [];
const realFetch = globalThis.fetch;

beforeEach(() => {
  arrived = [];
  globalThis.fetch = ((_address: string, { body, signal }: RequestInit) =>
    new Promise((resolve) => {
      const { recipe, imageId } = JSON.parse(String(body)) as SimulationRequest;
      arrived.push({ seed: recipe.seed, imageId, signal, answer: (response) => resolve(response as Response) });
    })) as typeof fetch;
});
afterEach(() => {
  globalThis.fetch = realFetch;
});

const request = (seed: number, imageId = 'a'): SimulationRequest => ({
  imageId,
  recipe: { steps: [], reconstruction: { method: 'zero-filled', parameters: {} }, seed },
  outputs: ['image'],
});

function follow(first: SimulationRequest) {
  const client = new QueryClient();
  const wrapper = ({ children }: { children: ReactNode }) => <QueryClientProvider client={client}>{children}</QueryClientProvider>;
  return renderHook(({ asked }: { asked: SimulationRequest }) => useSimulation(asked), { wrapper, initialProps: { asked: first } });
}

const answerLast = (response: Partial<Response>) => act(async () => arrived.at(-1)?.answer(response));
const seedShown = (key: string | undefined) => (key === undefined ? undefined : (JSON.parse(key) as SimulationRequest).recipe.seed);

describe('a simulation that follows a slider', () => {
  it('has one request on its way, skips what lies between, and asks for the newest next', async () => {
    const { result, rerender } = follow(request(1));
    for (const seed of [2, 3, 4]) rerender({ asked: request(seed) });
    expect(arrived.map(({ seed }) => seed)).toEqual([1]);
    await answerLast(planes());
    await waitFor(() => expect(arrived.map(({ seed }) => seed)).toEqual([1, 4]));
    expect(seedShown(result.current.shown?.key)).toBe(1);
    expect(result.current.isBehind).toBe(true);
    await answerLast(planes());
    await waitFor(() => expect(seedShown(result.current.shown?.key)).toBe(4));
    expect(result.current.isBehind).toBe(false);
  });

  it('keeps the last picture when a recipe is refused, says that it is older, and why', async () => {
    const { result, rerender } = follow(request(1));
    await answerLast(planes());
    await waitFor(() => expect(result.current.shown).not.toBeNull());
    rerender({ asked: request(2) });
    await waitFor(() => expect(arrived).toHaveLength(2));
    await answerLast(refusal);
    await waitFor(() => expect(result.current.error?.message).toBe('Invalid input'));
    expect(seedShown(result.current.shown?.key)).toBe(1);
    expect(result.current.isBehind).toBe(true);
  });

  it('aborts what is on its way when another image takes its place', async () => {
    const { result, rerender } = follow(request(1, 'a'));
    rerender({ asked: request(1, 'b') });
    await waitFor(() => expect(arrived.map(({ imageId }) => imageId)).toEqual(['a', 'b']));
    expect(arrived[0]?.signal?.aborted).toBe(true);
    expect(result.current.shown).toBeNull();
  });
});
