/**
 * The cache of what was fetched. A session that has ended anywhere is forgotten here, and the team's layout then shows the door.
 * A refusal is not tried again; a server that does not answer is, twice.
 */
import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiProblem, isSignedOut } from './api-problem';
import { sessionKey } from './session';

const worthAnotherTry = (failures: number, error: Error): boolean =>
  failures < 2 && (!(error instanceof ApiProblem) || error.status === 0 || error.status >= 500);

export function createQueryClient(): QueryClient {
  const forget = (error: Error): void => {
    if (isSignedOut(error)) client.setQueryData(sessionKey, null);
  };
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError: forget }),
    mutationCache: new MutationCache({ onError: forget }),
    defaultOptions: { queries: { staleTime: 15_000, retry: worthAnotherTry } },
  });
  return client;
}
