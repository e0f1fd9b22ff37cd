/** Trials of a case: recipes that were kept, with their numbers and a picture marked as simulated. */
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { keepTrial, listTrials, readTrialThumbnail } from '@/server/contract/case-parts';
import { addressOf, call, type CallInput } from './call';
import { callWithText } from './text-question';
import { timelineKey } from './timeline';

export const trialsKey = (caseId: string) => ['trials', caseId] as const;

export const trialThumbnailOf = (caseId: string, trialId: string, domain: 'image' | 'kspace' = 'image'): string =>
  addressOf(readTrialThumbnail.path, { caseId, trialId }, domain === 'image' ? {} : { domain });

export const useTrials = (caseId: string) =>
  useQuery({ queryKey: trialsKey(caseId), queryFn: ({ signal }) => call(listTrials, { params: { caseId } }, signal) });

export function useKeepTrial(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CallInput<typeof keepTrial>['body']) => callWithText(keepTrial, { params: { caseId }, body }),
    onSuccess: () => {
      void client.invalidateQueries({ queryKey: trialsKey(caseId) });
      void client.invalidateQueries({ queryKey: timelineKey(caseId) });
    },
  });
}
