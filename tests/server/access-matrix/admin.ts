import { adminGets, type AccessRow } from './access-row';

export const adminRows: AccessRow[] = [
  { endpoint: 'GET /admin/users', expected: adminGets(200), arrange: () => ({ path: '/admin/users' }) },
  {
    endpoint: 'PUT /admin/users/:userId/state',
    expected: adminGets(200),
    arrange: async ({ server }) => ({
      path: `/admin/users/${(await server.createUser()).id}/state`,
      body: { disabled: true },
    }),
  },
  { endpoint: 'GET /admin/surveys', expected: adminGets(200), arrange: () => ({ path: '/admin/surveys' }) },
  {
    endpoint: 'PUT /admin/surveys/:surveyId/membership',
    expected: adminGets(200),
    arrange: async ({ server }) => ({
      path: `/admin/surveys/${(await server.createSurvey()).id}/membership`,
      body: { role: 'guest' },
    }),
  },
  { endpoint: 'GET /admin/mail', expected: adminGets(200), arrange: () => ({ path: '/admin/mail' }) },
  {
    endpoint: 'GET /admin/audit-events',
    expected: adminGets(200),
    arrange: () => ({ path: '/admin/audit-events' }),
  },
];
