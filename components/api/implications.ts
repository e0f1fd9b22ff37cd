/** What the scan facts of an image imply: worked out on the server, shown in the facts panel. */
import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { readImplications } from '@/server/contract/images';
import { call } from './call';

export const implicationsKey = (imageId: string) => ['implications', imageId] as const;

export const useImplications = (imageId: string, ghostFrequencyHz: number) =>
  useQuery({
    queryKey: [...implicationsKey(imageId), ghostFrequencyHz],
    queryFn: ({ signal }) => call(readImplications, { params: { imageId }, query: { ghostFrequencyHz } }, signal),
    placeholderData: keepPreviousData,
  });
