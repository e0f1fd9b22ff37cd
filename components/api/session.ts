/** Who is signed in, signing in, signing out. `null` means nobody. */
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { signIn, signOut, whoAmI, type Session } from '@/server/contract/session';
import { isSignedOut } from './api-problem';
import { call } from './call';

export const sessionKey = ['session'] as const;

export const readSession = async (signal?: AbortSignal): Promise<Session | null> =>
  call(whoAmI, {}, signal).catch((error: unknown) => {
    if (isSignedOut(error)) return null;
    throw error;
  });

export const useSession = () => useQuery({ queryKey: sessionKey, queryFn: ({ signal }) => readSession(signal), staleTime: 60_000 });

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (credentials: { email: string; password: string }) => call(signIn, { body: credentials }),
    onSuccess: (session) => client.setQueryData(sessionKey, session),
  });
}

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(signOut, {}),
    onSuccess: () => {
      client.clear();
      client.setQueryData(sessionKey, null);
    },
  });
}
