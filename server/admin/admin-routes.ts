import { z } from 'zod';
import {
  adminSurveyListSchema,
  adminSurveySchema,
  adminUserListSchema,
  adminUserSchema,
  auditEventPageSchema,
  joinSurveySchema,
  receivedMailPageSchema,
  setUserStateSchema,
} from '../contract/admin';
import { idSchema, pageQuerySchema } from '../contract/common';
import { endpoint, type Endpoint } from '../http/endpoint';
import { joinSurvey, listAuditEvents, listMail, listSurveys, listUsers, setUserState } from './admin-service';

export const adminEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/admin/users',
    summary: 'All accounts',
    tag: 'Administration',
    access: 'admin',
    answers: { 200: adminUserListSchema },
    handle: (context) => listUsers(context),
  }),
  endpoint({
    method: 'put',
    path: '/admin/users/:userId/state',
    summary: 'Switch an account off or on; switching off ends its sessions',
    tag: 'Administration',
    access: 'admin',
    params: z.strictObject({ userId: idSchema }),
    body: setUserStateSchema,
    answers: { 200: adminUserSchema },
    handle: (context, { params, body }) => setUserState(context, params.userId, body.disabled),
  }),
  endpoint({
    method: 'get',
    path: '/admin/surveys',
    summary: 'All surveys, by name only until one joins',
    tag: 'Administration',
    access: 'admin',
    answers: { 200: adminSurveyListSchema },
    handle: (context) => listSurveys(context),
  }),
  endpoint({
    method: 'put',
    path: '/admin/surveys/:surveyId/membership',
    summary: 'Join a survey in a role; the audit trail keeps it',
    tag: 'Administration',
    access: 'admin',
    params: z.strictObject({ surveyId: idSchema }),
    body: joinSurveySchema,
    answers: { 200: adminSurveySchema },
    handle: (context, { params, body }) => joinSurvey(context, params.surveyId, body.role),
  }),
  endpoint({
    method: 'get',
    path: '/admin/mail',
    summary: 'Mail that the local sink took, the newest first',
    tag: 'Administration',
    access: 'admin',
    query: pageQuerySchema,
    answers: { 200: receivedMailPageSchema },
    handle: (context, { query }) => listMail(context, query),
  }),
  endpoint({
    method: 'get',
    path: '/admin/audit-events',
    summary: 'The audit trail, the newest first',
    tag: 'Administration',
    access: 'admin',
    query: pageQuerySchema,
    answers: { 200: auditEventPageSchema },
    handle: (context, { query }) => listAuditEvents(context, query),
  }),
];
