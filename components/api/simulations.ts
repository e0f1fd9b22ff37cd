/**
 * Planes for the panes: an image as it is stored, and a recipe on an image, both in the 16-bit display form.
 *
 * While a slider moves, one simulation is on its way at a time and the newest recipe is asked for next: what lies between is never
 * sent, and what arrives is always shown, so that the pane follows however slow the server is. A request for another image
 * takes the place of the one on its way, which is aborted.
 */
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { DisplayPlane } from '@/components/image/display-plane';
import { readPixels } from '@/server/contract/images';
import { displayMediaType, metricsHeader, metricsSchema, planesHeader, type Metrics } from '@/server/contract/planes';
import type { Route } from '@/server/contract/route';
import { simulate, type SimulationRequest } from '@/server/contract/simulations';
import { ApiProblem } from './api-problem';
import { send } from './call';
import { decodePlanes } from './decode-planes';

export type Planes = ReadonlyMap<string, DisplayPlane>;

export interface Simulation {
  /** What was asked, as text: two recipes are the same when their keys are. */
  readonly key: string;
  readonly planes: Planes;
  readonly metrics: Metrics | null;
}

async function fetchPlanes(route: Route, input: Parameters<typeof send>[1], signal: AbortSignal): Promise<Omit<Simulation, 'key'>> {
  const response = await send(route, input, { accept: displayMediaType, signal });
  const numbers = response.headers.get(metricsHeader);
  const bytes = await response.arrayBuffer();
  try {
    return {
      planes: decodePlanes(bytes, response.headers.get(planesHeader) ?? '[]'),
      metrics: numbers ? metricsSchema.parse(JSON.parse(numbers)) : null,
    };
  } catch {
    throw new ApiProblem('not-understood', response.status, 'The planes of the server were not understood: reload the page.');
  }
}

/** An image as it is stored, or its k-space: log magnitude and phase of the transform of what is stored, or of its magnitude. */
export const usePixels = (imageId: string | null, domain: 'image' | 'kspace' | 'kspaceOfImage', frame = 0) =>
  useQuery({
    queryKey: ['pixels', imageId, domain, frame],
    queryFn: ({ signal }) => fetchPlanes(readPixels, { params: { imageId }, query: { domain, frame } }, signal),
    enabled: imageId !== null,
    staleTime: Infinity,
  });

/** Dropped from the cache as soon as no pane shows it: a slider makes hundreds a minute, of half a megabyte each. */
const keptForMs = 0;

export interface RunningSimulation {
  /** The newest that arrived; it stays while a newer one is on its way, or failed. */
  readonly shown: Simulation | null;
  /** Whether `shown` belongs to an older recipe than the one asked for. */
  readonly isBehind: boolean;
  readonly error: Error | null;
  readonly retry: () => void;
}

export function useSimulation(request: SimulationRequest | null): RunningSimulation {
  const key = request === null ? null : JSON.stringify(request);
  const [sent, setSent] = useState(request);
  const [shown, setShown] = useState<Simulation | null>(null);
  const sentKey = sent === null ? null : JSON.stringify(sent);
  const query = useQuery({
    queryKey: ['simulation', sentKey],
    queryFn: async ({ signal }) => ({ key: sentKey ?? '', ...(await fetchPlanes(simulate, { body: sent }, signal)) }),
    enabled: sent !== null,
    staleTime: Infinity,
    gcTime: keptForMs,
    retry: false,
  });
  const isOtherImage = sent?.imageId !== request?.imageId;
  if (key !== sentKey && (isOtherImage || !query.isFetching)) setSent(request);
  if (isOtherImage && shown !== null) setShown(null);
  else if (!isOtherImage && query.data && query.data !== shown) setShown(query.data);
  return {
    shown,
    isBehind: shown !== null && shown.key !== key,
    error: key === sentKey ? query.error : null,
    retry: () => void query.refetch(),
  };
}
