import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import type { Role } from '../../../server/contract/roles';
import {
  invitationSchema,
  memberSchema,
  type createInvitationSchema,
} from '../../../server/contract/surveys';
import { sendJson } from '../../api/http';
import { surveyKeys } from '../../api/survey-queries';
import { memberKeys } from './member-queries';

/** One's own role may be what changes, so the survey and what it allows are fetched anew as well. */
export function useSetRole(surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ userId, role }: { userId: string; role: Role }) =>
      sendJson('PUT', `/surveys/${surveyId}/members/${userId}`, { role }, memberSchema),
    onSuccess: () => client.invalidateQueries({ queryKey: surveyKeys.all }),
  });
}

export function useRemoveMember(surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (userId: string) =>
      sendJson('DELETE', `/surveys/${surveyId}/members/${userId}`, undefined, null),
    onSuccess: () => client.invalidateQueries({ queryKey: surveyKeys.all }),
  });
}

export function useInvite(surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.output<typeof createInvitationSchema>) =>
      sendJson('POST', `/surveys/${surveyId}/invitations`, body, invitationSchema),
    onSuccess: () => client.invalidateQueries({ queryKey: memberKeys.invitations(surveyId) }),
  });
}

export function useRevokeInvitation(surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (invitationId: string) =>
      sendJson('DELETE', `/surveys/${surveyId}/invitations/${invitationId}`, undefined, null),
    onSuccess: () => client.invalidateQueries({ queryKey: memberKeys.invitations(surveyId) }),
  });
}
