import { queryOptions } from '@tanstack/react-query';
import { invitationListSchema, memberListSchema } from '../../../server/contract/surveys';
import { getJson } from '../../api/http';
import { surveyKeys } from '../../api/survey-queries';

export const memberKeys = {
  members: (surveyId: string) => [...surveyKeys.detail(surveyId), 'members'] as const,
  invitations: (surveyId: string) => [...surveyKeys.detail(surveyId), 'invitations'] as const,
};

export const memberListQuery = (surveyId: string) =>
  queryOptions({
    queryKey: memberKeys.members(surveyId),
    queryFn: ({ signal }) => getJson(`/surveys/${surveyId}/members`, memberListSchema, { signal }),
  });

export const invitationListQuery = (surveyId: string) =>
  queryOptions({
    queryKey: memberKeys.invitations(surveyId),
    queryFn: ({ signal }) => getJson(`/surveys/${surveyId}/invitations`, invitationListSchema, { signal }),
  });
