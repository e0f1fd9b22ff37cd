/** The catalogue: causes (with values from an image's scan facts when one is named), reconstructions, corrections. */
import { useQuery } from '@tanstack/react-query';
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

/** Address of the swatch of a cause. */
export const swatchOf = (causeId: string, query: NonNullable<CallInput<typeof readSwatch>['query']>): string =>
  addressOf(readSwatch.path, { causeId }, query);
