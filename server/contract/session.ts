import { z } from 'zod';
import { emailSchema, idSchema, listOf, nameSchema, timestampSchema } from './common';
import { roleSchema } from './roles';

export const passwordSchema = z
  .string()
  .min(12, 'must have at least 12 characters')
  .max(200)
  .describe('at least 12 characters');

export const signInSchema = z
  .strictObject({ email: emailSchema, password: z.string().min(1).max(200) })
  .meta({ id: 'SignIn' });

export const meSchema = z
  .strictObject({
    id: idSchema,
    email: z.string(),
    name: z.string(),
    isAdmin: z.boolean(),
    can: z.strictObject({ createSurveys: z.boolean(), administer: z.boolean() }),
  })
  .meta({ id: 'Me' });
export type Me = z.infer<typeof meSchema>;

export const updateMeSchema = z.strictObject({ name: nameSchema }).meta({ id: 'UpdateMe' });

export const sessionSchema = z
  .strictObject({
    handle: z.string().describe('names the session; never its secret'),
    createdAt: timestampSchema,
    expiresAt: timestampSchema,
    userAgent: z.string(),
    current: z.boolean(),
  })
  .meta({ id: 'Session' });
export const sessionListSchema = listOf(sessionSchema);

export const changePasswordSchema = z
  .strictObject({ currentPassword: z.string().min(1).max(200), newPassword: passwordSchema })
  .meta({ id: 'ChangePassword' });

export const requestPasswordResetSchema = z
  .strictObject({ email: emailSchema })
  .meta({ id: 'RequestPasswordReset' });
export const resetPasswordSchema = z
  .strictObject({ newPassword: passwordSchema })
  .meta({ id: 'ResetPassword' });

/** What an invitation's link shows before it is accepted. */
export const invitationOfferSchema = z
  .strictObject({
    email: z.string(),
    surveyName: z.string(),
    role: roleSchema,
    invitedBy: z.string(),
    hasAccount: z.boolean(),
    expiresAt: timestampSchema,
  })
  .meta({ id: 'InvitationOffer' });

export const acceptInvitationSchema = z
  .strictObject({
    name: nameSchema.optional().describe('needed when the address has no account yet'),
    password: z.string().min(1).max(200).describe('the new account’s, or the existing account’s own'),
  })
  .meta({ id: 'AcceptInvitation' });
