import {
  changePasswordSchema,
  meSchema,
  sessionListSchema,
  signInSchema,
  updateMeSchema,
} from '../contract/session';
import { endpoint, type Endpoint } from '../http/endpoint';
import {
  changePassword,
  getMe,
  listSessions,
  renameMe,
  signIn,
  signOut,
  signOutEverywhere,
} from './session-service';

export const sessionEndpoints: Endpoint[] = [
  endpoint({
    method: 'post',
    path: '/session',
    summary: 'Sign in',
    tag: 'Account',
    access: 'public',
    body: signInSchema,
    answers: { 200: meSchema },
    handle: async (context, { body }, { request, response }) => {
      const { me, cookie } = await signIn(
        context,
        body,
        request.headers.cookie,
        request.get('User-Agent') ?? '',
      );
      response.append('Set-Cookie', cookie);
      return me;
    },
  }),
  endpoint({
    method: 'delete',
    path: '/session',
    summary: 'Sign out here',
    tag: 'Account',
    access: 'signed-in',
    answers: { 204: null },
    handle: async (context, _input, { response }) => {
      await signOut(context);
      response.append('Set-Cookie', context.sessions.blankCookie);
    },
  }),
  endpoint({
    method: 'get',
    path: '/sessions',
    summary: 'Where one is signed in',
    tag: 'Account',
    access: 'signed-in',
    answers: { 200: sessionListSchema },
    handle: listSessions,
  }),
  endpoint({
    method: 'delete',
    path: '/sessions',
    summary: 'Sign out everywhere',
    tag: 'Account',
    access: 'signed-in',
    answers: { 204: null },
    handle: async (context, _input, { response }) => {
      await signOutEverywhere(context);
      response.append('Set-Cookie', context.sessions.blankCookie);
    },
  }),
  endpoint({
    method: 'get',
    path: '/me',
    summary: 'The signed-in person',
    tag: 'Account',
    access: 'signed-in',
    answers: { 200: meSchema },
    handle: getMe,
  }),
  endpoint({
    method: 'patch',
    path: '/me',
    summary: 'Change one’s name',
    tag: 'Account',
    access: 'signed-in',
    body: updateMeSchema,
    answers: { 200: meSchema },
    handle: (context, { body }) => renameMe(context, body),
  }),
  endpoint({
    method: 'put',
    path: '/me/password',
    summary: 'Change the password; every other session ends',
    tag: 'Account',
    access: 'signed-in',
    body: changePasswordSchema,
    answers: { 204: null },
    handle: (context, { body }) => changePassword(context, body),
  }),
];
