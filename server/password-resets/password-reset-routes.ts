import { z } from 'zod';
import { requestPasswordResetSchema, resetPasswordSchema } from '../contract/session';
import { endpoint, type Endpoint } from '../http/endpoint';
import { requestPasswordReset, resetPassword } from './password-reset-service';

const tokenParams = z.strictObject({ token: z.string().min(20).max(100) });

export const passwordResetEndpoints: Endpoint[] = [
  endpoint({
    method: 'post',
    path: '/password-resets',
    summary: 'Ask for a link to set a new password; the answer is the same whether or not the account exists',
    tag: 'Account',
    access: 'public',
    body: requestPasswordResetSchema,
    answers: { 202: null },
    handle: (context, { body }) => requestPasswordReset(context, body.email),
  }),
  endpoint({
    method: 'put',
    path: '/password-resets/:token',
    summary: 'Set a new password by the link; every session of the account ends',
    tag: 'Account',
    access: 'public',
    params: tokenParams,
    body: resetPasswordSchema,
    answers: { 204: null },
    handle: (context, { params, body }) => resetPassword(context, params.token, body.newPassword),
  }),
];
