/** Marks on the images of a case. A mark belongs to the image, not to the zoom. */
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { addMark, listMarks, removeMark } from '@/server/contract/case-parts';
import { call, type CallInput } from './call';
import { callWithText } from './text-question';
import { timelineKey } from './timeline';

export const marksKey = (caseId: string) => ['marks', caseId] as const;

export const useMarks = (caseId: string) =>
  useQuery({ queryKey: marksKey(caseId), queryFn: ({ signal }) => call(listMarks, { params: { caseId } }, signal) });

export function useAddMark(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CallInput<typeof addMark>['body']) => callWithText(addMark, { params: { caseId }, body }),
    onSuccess: () => {
      void client.invalidateQueries({ queryKey: marksKey(caseId) });
      void client.invalidateQueries({ queryKey: timelineKey(caseId) });
    },
  });
}

export function useRemoveMark(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (markId: string) => call(removeMark, { params: { caseId, markId } }),
    onSuccess: () => {
      void client.invalidateQueries({ queryKey: marksKey(caseId) });
      void client.invalidateQueries({ queryKey: timelineKey(caseId) });
    },
  });
}
