/** The discussion of a case. */
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { addComment, listComments } from '@/server/contract/case-parts';
import { call } from './call';
import { callWithText } from './text-question';
import { timelineKey } from './timeline';

const commentsKey = (caseId: string) => ['comments', caseId] as const;

export const useComments = (caseId: string) =>
  useQuery({ queryKey: commentsKey(caseId), queryFn: ({ signal }) => call(listComments, { params: { caseId } }, signal) });

export function useAddComment(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (text: string) => callWithText(addComment, { params: { caseId }, body: { text } }),
    onSuccess: () => {
      void client.invalidateQueries({ queryKey: commentsKey(caseId) });
      void client.invalidateQueries({ queryKey: timelineKey(caseId) });
    },
  });
}
