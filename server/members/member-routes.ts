import { z } from 'zod';
import { idSchema } from '../contract/common';
import { memberListSchema, memberSchema, setMemberRoleSchema } from '../contract/surveys';
import { endpoint, type Endpoint } from '../http/endpoint';
import { listMembers, removeMember, setMemberRole } from './member-service';

const surveyParams = z.strictObject({ surveyId: idSchema });
const memberParams = surveyParams.extend({ userId: idSchema });

export const memberEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/surveys/:surveyId/members',
    summary: 'Members of a survey',
    tag: 'Members',
    access: 'signed-in',
    params: surveyParams,
    answers: { 200: memberListSchema },
    handle: (context, { params }) => listMembers(context, params.surveyId),
  }),
  endpoint({
    method: 'put',
    path: '/surveys/:surveyId/members/:userId',
    summary: 'Give a member a role',
    tag: 'Members',
    access: 'signed-in',
    params: memberParams,
    body: setMemberRoleSchema,
    answers: { 200: memberSchema },
    handle: (context, { params, body }) => setMemberRole(context, params, body.role),
  }),
  endpoint({
    method: 'delete',
    path: '/surveys/:surveyId/members/:userId',
    summary: 'Remove a member',
    tag: 'Members',
    access: 'signed-in',
    params: memberParams,
    answers: { 204: null },
    handle: (context, { params }) => removeMember(context, params),
  }),
];
