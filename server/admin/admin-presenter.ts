import type { z } from 'zod';
import type {
  adminSurveySchema,
  adminUserSchema,
  auditEventSchema,
  receivedMailSchema,
} from '../contract/admin';
import type { AdminSurveyRow, AdminUserRow, AuditRow, MailRow } from './admin-store';

export const presentAdminUser = (row: AdminUserRow): z.infer<typeof adminUserSchema> => ({
  id: row.id,
  email: row.email,
  name: row.name,
  isAdmin: row.is_admin,
  disabledAt: row.disabled_at?.toISOString() ?? null,
  createdAt: row.created_at.toISOString(),
  surveys: row.surveys,
});

export const presentAdminSurvey = (row: AdminSurveyRow): z.infer<typeof adminSurveySchema> => ({
  id: row.id,
  name: row.name,
  members: row.members,
  ownRole: row.own_role,
});

export const presentMail = (row: MailRow): z.infer<typeof receivedMailSchema> => ({
  id: row.id,
  receivedAt: row.received_at.toISOString(),
  sender: row.sender,
  recipients: row.recipients,
  subject: row.subject,
  text: row.text,
});

export const presentAuditEvent = (row: AuditRow): z.infer<typeof auditEventSchema> => ({
  id: row.id,
  at: row.at.toISOString(),
  actorName: row.actor_name,
  surveyId: row.survey_id,
  action: row.action,
  subject: row.subject,
  details: row.details,
});
