import { queryOptions } from '@tanstack/react-query';
import { sessionListSchema } from '../../../server/contract/session';
import { getJson } from '../../api/http';

export const accountKeys = { sessions: () => ['account', 'sessions'] as const };

export const sessionListQuery = queryOptions({
  queryKey: accountKeys.sessions(),
  queryFn: ({ signal }) => getJson('/sessions', sessionListSchema, { signal }),
});
