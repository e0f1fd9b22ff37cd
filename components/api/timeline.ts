/** The timeline of a case: who did what, when. Nobody can edit it. */
import { useQuery } from '@tanstack/react-query';
import { readTimeline } from '@/server/contract/case-parts';
import { call } from './call';

export const timelineKey = (caseId: string) => ['timeline', caseId] as const;

export const useTimeline = (caseId: string) =>
  useQuery({ queryKey: timelineKey(caseId), queryFn: ({ signal }) => call(readTimeline, { params: { caseId } }, signal) });
