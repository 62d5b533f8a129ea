import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { meSchema, type changePasswordSchema, type updateMeSchema } from '../../../server/contract/session';
import { sendJson } from '../../api/http';
import { useForgetSession } from '../../api/session-mutations';
import { meKey } from '../../api/session-queries';
import { accountKeys } from './account-queries';

export function useUpdateMe() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.output<typeof updateMeSchema>) => sendJson('PATCH', '/me', body, meSchema),
    onSuccess: (me) => client.setQueryData(meKey, me),
  });
}

export function useChangePassword() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.output<typeof changePasswordSchema>) => sendJson('PUT', '/me/password', body, null),
    onSuccess: () => client.invalidateQueries({ queryKey: accountKeys.sessions() }),
  });
}

export function useSignOutEverywhere() {
  const forget = useForgetSession();
  return useMutation({
    mutationFn: () => sendJson('DELETE', '/sessions', undefined, null),
    onSuccess: forget,
  });
}
