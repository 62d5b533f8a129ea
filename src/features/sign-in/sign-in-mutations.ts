import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  meSchema,
  type acceptInvitationSchema,
  type requestPasswordResetSchema,
  type resetPasswordSchema,
  type signInSchema,
} from '../../../server/contract/session';
import { sendJson } from '../../api/http';
import { useForgetSession } from '../../api/session-mutations';
import { meKey } from '../../api/session-queries';

export function useSignIn() {
  const client = useQueryClient();
  const forget = useForgetSession();
  return useMutation({
    mutationFn: (body: z.output<typeof signInSchema>) => sendJson('POST', '/session', body, meSchema),
    onSuccess: (me) => {
      forget();
      client.setQueryData(meKey, me);
    },
  });
}

export const useRequestPasswordReset = () =>
  useMutation({
    mutationFn: (body: z.output<typeof requestPasswordResetSchema>) =>
      sendJson('POST', '/password-resets', body, null),
  });

export const useResetPassword = (token: string) =>
  useMutation({
    mutationFn: (body: z.output<typeof resetPasswordSchema>) =>
      sendJson('PUT', `/password-resets/${encodeURIComponent(token)}`, body, null),
  });

export function useAcceptInvitation(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.output<typeof acceptInvitationSchema>) =>
      sendJson('POST', `/invitations/${encodeURIComponent(token)}/acceptance`, body, meSchema),
    onSuccess: (me) => {
      // the offer on screen stays until the page is left: asked for again it would be found spent
      client.removeQueries({ type: 'inactive' });
      client.setQueryData(meKey, me);
    },
  });
}
