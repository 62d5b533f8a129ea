import { queryOptions } from '@tanstack/react-query';
import { meSchema, type Me } from '../../server/contract/session';
import { hasCode } from './api-error';
import { getJson } from './http';

export const meKey = ['me'] as const;

/** Who is signed in; null when nobody is, which is an answer and no fault. */
export const meQuery = queryOptions({
  queryKey: meKey,
  queryFn: async ({ signal }): Promise<Me | null> => {
    try {
      return await getJson('/me', meSchema, { signal });
    } catch (error) {
      if (hasCode(error, 'unauthenticated')) return null;
      throw error;
    }
  },
  staleTime: 60_000,
});
