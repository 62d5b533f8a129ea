import { z } from 'zod';
import { idSchema, listOf, pageOf, timestampSchema } from './common';
import { roleSchema } from './roles';

export const adminUserSchema = z
  .strictObject({
    id: idSchema,
    email: z.string(),
    name: z.string(),
    isAdmin: z.boolean(),
    disabledAt: timestampSchema.nullable(),
    createdAt: timestampSchema,
    surveys: z.number().int(),
  })
  .meta({ id: 'AdminUser' });
export const adminUserListSchema = listOf(adminUserSchema);
export const setUserStateSchema = z.strictObject({ disabled: z.boolean() }).meta({ id: 'SetUserState' });

export const adminSurveySchema = z
  .strictObject({
    id: idSchema,
    name: z.string(),
    members: z.number().int(),
    ownRole: roleSchema.nullable().describe('the admin’s own role there; null = not joined'),
  })
  .meta({ id: 'AdminSurvey' });
export const adminSurveyListSchema = listOf(adminSurveySchema);
export const joinSurveySchema = z.strictObject({ role: roleSchema }).meta({ id: 'JoinSurvey' });

export const receivedMailSchema = z
  .strictObject({
    id: z.string(),
    receivedAt: timestampSchema,
    sender: z.string(),
    recipients: z.array(z.string()),
    subject: z.string(),
    text: z.string(),
  })
  .meta({ id: 'ReceivedMail' });
export const receivedMailPageSchema = pageOf(receivedMailSchema).extend({
  sink: z.boolean().describe('whether the local sink is in use; false = mail goes out by MAIL_URL'),
});

export const auditEventSchema = z
  .strictObject({
    id: z.string(),
    at: timestampSchema,
    actorName: z.string().nullable(),
    surveyId: idSchema.nullable(),
    action: z.string(),
    subject: z.string(),
    details: z.record(z.string(), z.unknown()),
  })
  .meta({ id: 'AuditEvent' });
export const auditEventPageSchema = pageOf(auditEventSchema);
