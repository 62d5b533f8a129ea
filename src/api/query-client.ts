import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { hasCode } from './api-error';
import { shouldRetry } from './retry-rule';
import { meKey } from './session-queries';

/** Queries of a page that is left are kept for some minutes, so that going back is at once. */
export function createQueryClient(): QueryClient {
  const noteExpiry = (error: unknown) => {
    if (hasCode(error, 'unauthenticated')) client.setQueryData(meKey, null);
  };
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError: noteExpiry }),
    mutationCache: new MutationCache({ onError: noteExpiry }),
    defaultOptions: {
      queries: { staleTime: 15_000, retry: shouldRetry, networkMode: 'always' },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
  return client;
}
