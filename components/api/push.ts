/** Push from the scanner: its inbox, its settings, its tokens. */
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { changePush, discardImages, drawToken, readInbox, readPush, revokeToken, type ScannerPush } from '@/server/contract/push';
import { call, type CallInput } from './call';

const pushKey = (scannerId: string) => ['push', scannerId] as const;
const inboxKey = (scannerId: string) => ['inbox', scannerId] as const;

/** A scanner sends while somebody looks. */
const lookAgainMs = 10_000;

export const usePush = (scannerId: string) =>
  useQuery({ queryKey: pushKey(scannerId), queryFn: ({ signal }) => call(readPush, { params: { scannerId } }, signal) });

export const useInbox = (scannerId: string) =>
  useQuery({
    queryKey: inboxKey(scannerId),
    queryFn: ({ signal }) => call(readInbox, { params: { scannerId } }, signal),
    refetchInterval: lookAgainMs,
  });

/** What a change of the settings gives back is the newest there is. */
function useKeepPush(scannerId: string) {
  const client = useQueryClient();
  return (push: ScannerPush): void => {
    client.setQueryData(pushKey(scannerId), push);
  };
}

export function useChangePush(scannerId: string) {
  const keep = useKeepPush(scannerId);
  return useMutation({
    mutationFn: (body: CallInput<typeof changePush>['body']) => call(changePush, { params: { scannerId }, body }),
    onSuccess: keep,
  });
}

export function useDrawToken(scannerId: string) {
  const keep = useKeepPush(scannerId);
  return useMutation({
    mutationFn: () => call(drawToken, { params: { scannerId } }),
    onSuccess: ({ push }) => keep(push),
  });
}

export function useRevokeToken(scannerId: string) {
  const keep = useKeepPush(scannerId);
  return useMutation({
    mutationFn: (tokenId: string) => call(revokeToken, { params: { scannerId, tokenId } }),
    onSuccess: keep,
  });
}

/** Images have left the inbox, or may have. */
export function useRefreshInbox(scannerId: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: inboxKey(scannerId) });
}

export function useDiscardImages(scannerId: string) {
  const refresh = useRefreshInbox(scannerId);
  return useMutation({
    mutationFn: (images: string[]) => call(discardImages, { params: { scannerId }, body: { images } }),
    onSettled: refresh,
  });
}
