/** Series: the slices around an image, and which files of an upload have arrived. */
import { useQuery, type QueryClient } from '@tanstack/react-query';
import { findSentFiles, readSlices, type Slice } from '@/server/contract/series';
import { call } from './call';

export const slicesQuery = (imageId: string) => ({
  queryKey: ['slices', imageId] as const,
  queryFn: ({ signal }: { signal: AbortSignal }) => call(readSlices, { params: { imageId } }, signal),
  staleTime: 60_000,
});

/** The slices of the series that an image belongs to, in the order of space. */
export const useSlices = (imageId: string | null) => useQuery({ ...slicesQuery(imageId ?? ''), enabled: imageId !== null });

/** The same as they are now: more of a series may have come in since. */
export const fetchSlices = (client: QueryClient, imageId: string): Promise<Slice[]> =>
  client.fetchQuery({ ...slicesQuery(imageId), staleTime: 0 });

export async function findSent(digests: readonly string[]): Promise<ReadonlyMap<string, readonly string[]>> {
  const sent = await call(findSentFiles, { body: { digests: [...digests] } });
  return new Map(sent.map(({ digest, imageIds }) => [digest, imageIds]));
}
