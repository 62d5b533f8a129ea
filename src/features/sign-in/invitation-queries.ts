import { queryOptions } from '@tanstack/react-query';
import { invitationOfferSchema } from '../../../server/contract/session';
import { getJson } from '../../api/http';

export const invitationOfferQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitation-offers', token] as const,
    queryFn: ({ signal }) =>
      getJson(`/invitations/${encodeURIComponent(token)}`, invitationOfferSchema, { signal }),
    staleTime: Infinity,
    gcTime: 0,
  });
