/** Cases: find, file, read, change, move through their life, write the finding. */
import { keepPreviousData, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { moveCase, writeFinding, type Transition } from '@/server/contract/case-parts';
import { attachImage, changeCase, createCase, listCases, readCase, type Case, type Finding, type NewCase } from '@/server/contract/cases';
import { call, type CallInput } from './call';
import { callWithText } from './text-question';
import { timelineKey } from './timeline';

export type CaseQuery = NonNullable<CallInput<typeof listCases>['query']>;
export type CaseChange = CallInput<typeof changeCase>['body'];

export const casesKey = ['cases'] as const;
export const caseKey = (caseId: string) => ['case', caseId] as const;

export const useCases = (query: CaseQuery) =>
  useQuery({
    queryKey: [...casesKey, query],
    queryFn: ({ signal }) => call(listCases, { query }, signal),
    placeholderData: keepPreviousData,
  });

export const useCase = (caseId: string) =>
  useQuery({ queryKey: caseKey(caseId), queryFn: ({ signal }) => call(readCase, { params: { caseId } }, signal) });

/** A case came back from the server: it is the newest there is, and lists and the timeline are behind. */
export function keepCase(client: QueryClient, changed: Case): void {
  client.setQueryData(caseKey(changed.id), changed);
  void client.invalidateQueries({ queryKey: casesKey });
  void client.invalidateQueries({ queryKey: timelineKey(changed.id) });
}

export function useCreateCase() {
  const client = useQueryClient();
  return useMutation({ mutationFn: (body: NewCase) => callWithText(createCase, { body }), onSuccess: (filed) => keepCase(client, filed) });
}

export function useChangeCase(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CaseChange) => callWithText(changeCase, { params: { caseId }, body }),
    onSuccess: (changed) => keepCase(client, changed),
  });
}

export function useAttachImage(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CallInput<typeof attachImage>['body']) => call(attachImage, { params: { caseId }, body }),
    onSuccess: (changed) => keepCase(client, changed),
  });
}

export function useMoveCase(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Transition) => callWithText(moveCase, { params: { caseId }, body }),
    onSuccess: (moved) => keepCase(client, moved),
  });
}

export function useWriteFinding(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Finding) => callWithText(writeFinding, { params: { caseId }, body }),
    onSuccess: (changed) => keepCase(client, changed),
  });
}
