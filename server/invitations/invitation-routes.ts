import { z } from 'zod';
import { idSchema } from '../contract/common';
import { acceptInvitationSchema, invitationOfferSchema, meSchema } from '../contract/session';
import { createInvitationSchema, invitationListSchema, invitationSchema } from '../contract/surveys';
import { endpoint, type Endpoint } from '../http/endpoint';
import { acceptInvitation, showOffer } from './invitation-acceptance';
import { invite, listInvitations, revokeInvitation } from './invitation-service';

const surveyParams = z.strictObject({ surveyId: idSchema });
const tokenParams = z.strictObject({ token: z.string().min(20).max(100) });

export const invitationEndpoints: Endpoint[] = [
  endpoint({
    method: 'get',
    path: '/surveys/:surveyId/invitations',
    summary: 'Invitations to a survey, the newest first',
    tag: 'Members',
    access: 'signed-in',
    params: surveyParams,
    answers: { 200: invitationListSchema },
    handle: (context, { params }) => listInvitations(context, params.surveyId),
  }),
  endpoint({
    method: 'post',
    path: '/surveys/:surveyId/invitations',
    summary: 'Invite a person by e-mail; an open invitation to the same address is replaced',
    tag: 'Members',
    access: 'signed-in',
    params: surveyParams,
    body: createInvitationSchema,
    answers: { 201: invitationSchema },
    handle: (context, { params, body }) => invite(context, params.surveyId, body),
  }),
  endpoint({
    method: 'delete',
    path: '/surveys/:surveyId/invitations/:invitationId',
    summary: 'Revoke an invitation',
    tag: 'Members',
    access: 'signed-in',
    params: surveyParams.extend({ invitationId: idSchema }),
    answers: { 204: null },
    handle: (context, { params }) => revokeInvitation(context, params),
  }),
  endpoint({
    method: 'get',
    path: '/invitations/:token',
    summary: 'What the link of an invitation offers',
    tag: 'Account',
    access: 'public',
    params: tokenParams,
    answers: { 200: invitationOfferSchema },
    handle: (context, { params }) => showOffer(context, params.token),
  }),
  endpoint({
    method: 'post',
    path: '/invitations/:token/acceptance',
    summary: 'Accept an invitation: makes the account where there is none, joins the survey and signs in',
    tag: 'Account',
    access: 'public',
    params: tokenParams,
    body: acceptInvitationSchema,
    answers: { 200: meSchema },
    handle: async (context, { params, body }, { request, response }) => {
      const { me, cookie } = await acceptInvitation(
        context,
        params.token,
        body,
        request.get('User-Agent') ?? '',
      );
      response.append('Set-Cookie', cookie);
      return me;
    },
  }),
];
