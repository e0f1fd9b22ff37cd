/** The catalogue: causes (with values from an image's scan facts when one is named), reconstructions, corrections. */
import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { listCauses, listCorrections, listReconstructions, readSwatch } from '@/server/contract/catalogue';
import { addressOf, call, type CallInput } from './call';

export const causesKey = (imageId?: string) => ['causes', imageId ?? null] as const;

export const useCauses = (imageId?: string) =>
  useQuery({
    queryKey: causesKey(imageId),
    queryFn: ({ signal }) => call(listCauses, { query: { imageId } }, signal),
    staleTime: Infinity,
  });

export const useReconstructions = () =>
  useQuery({ queryKey: ['reconstructions'], queryFn: ({ signal }) => call(listReconstructions, {}, signal), staleTime: Infinity });

export const useCorrections = () =>
  useQuery({ queryKey: ['corrections'], queryFn: ({ signal }) => call(listCorrections, {}, signal), staleTime: Infinity });

/** All that has a page in the catalogue, in the order of the signal chain: the causes, then the reconstructions. */
export function useCatalogue() {
  const causes = useCauses();
  const methods = useReconstructions();
  const data = useMemo(() => (causes.data && methods.data ? [...causes.data, ...methods.data] : undefined), [causes.data, methods.data]);
  const refetch = () => Promise.all([causes.refetch(), methods.refetch()]);
  return { data, error: causes.error ?? methods.error, refetch };
}

/** Address of the swatch of a cause or a reconstruction. */
export const swatchOf = (causeId: string, query: NonNullable<CallInput<typeof readSwatch>['query']>): string =>
  addressOf(readSwatch.path, { causeId }, query);
