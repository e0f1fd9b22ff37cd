/** Members of the department, its scanners and their coils. */
import { useQuery } from '@tanstack/react-query';
import { listMembers, listScanners } from '@/server/contract/registry';
import { call } from './call';

export const useMembers = () =>
  useQuery({ queryKey: ['members'], queryFn: ({ signal }) => call(listMembers, {}, signal), staleTime: 300_000 });

export const useScanners = () =>
  useQuery({ queryKey: ['scanners'], queryFn: ({ signal }) => call(listScanners, {}, signal), staleTime: 60_000 });
