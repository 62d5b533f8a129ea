import { createToken } from '../../../server/access/secret-token';
import { TEST_PASSWORD } from '../../setup/factories';
import { everyoneGets, signedInGet, type AccessRow } from './access-row';

export const accountRows: AccessRow[] = [
  {
    endpoint: 'POST /session',
    expected: everyoneGets(200),
    arrange: ({ author, asker }) => ({
      path: '/session',
      body: { email: (asker.user ?? author.user)?.email, password: TEST_PASSWORD },
    }),
  },
  { endpoint: 'DELETE /session', expected: signedInGet(204), arrange: () => ({ path: '/session' }) },
  { endpoint: 'GET /sessions', expected: signedInGet(200), arrange: () => ({ path: '/sessions' }) },
  {
    endpoint: 'DELETE /sessions',
    expected: signedInGet(204),
    arrange: () => ({ path: '/sessions' }),
  },
  { endpoint: 'GET /me', expected: signedInGet(200), arrange: () => ({ path: '/me' }) },
  {
    endpoint: 'PATCH /me',
    expected: signedInGet(200),
    arrange: () => ({ path: '/me', body: { name: 'Renamed' } }),
  },
  {
    endpoint: 'PUT /me/password',
    expected: signedInGet(204),
    arrange: () => ({
      path: '/me/password',
      body: { currentPassword: TEST_PASSWORD, newPassword: 'another good password' },
    }),
  },
  {
    endpoint: 'POST /password-resets',
    expected: everyoneGets(202),
    arrange: ({ author }) => ({ path: '/password-resets', body: { email: author.user?.email } }),
  },
  {
    endpoint: 'PUT /password-resets/:token',
    expected: everyoneGets(204),
    arrange: async ({ server }) => {
      const { token, hash } = createToken();
      const user = await server.createUser();
      const expires_at = server.db.raw("now() + interval '1 hour'");
      await server.db('password_reset').insert({ user_id: user.id, token_hash: hash, expires_at });
      return { path: `/password-resets/${token}`, body: { newPassword: 'another good password' } };
    },
  },
  {
    endpoint: 'GET /invitations/:token',
    expected: everyoneGets(200),
    arrange: async ({ server, surveyId, author }) => {
      const { token } = await server.createInvitation(surveyId, author.user?.id ?? '');
      return { path: `/invitations/${token}` };
    },
  },
  {
    endpoint: 'POST /invitations/:token/acceptance',
    expected: everyoneGets(200),
    arrange: async ({ server, surveyId, author }) => {
      const { token } = await server.createInvitation(surveyId, author.user?.id ?? '');
      return {
        path: `/invitations/${token}/acceptance`,
        body: { name: 'Newcomer', password: TEST_PASSWORD },
      };
    },
  },
];
