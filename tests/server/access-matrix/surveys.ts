import { membersGet, rolesGet, signedInGet, type AccessRow } from './access-row';

const newMember = async ({ server, surveyId }: Parameters<AccessRow['arrange']>[0]): Promise<string> => {
  const user = await server.createUser();
  await server.addMember(surveyId, user.id, 'guest');
  return user.id;
};

const borehole = (name: string) => ({ name, xM: null, yM: null, elevationM: null, depthM: 80 });

export const surveyRows: AccessRow[] = [
  { endpoint: 'GET /surveys', expected: signedInGet(200), arrange: () => ({ path: '/surveys' }) },
  {
    endpoint: 'POST /surveys',
    expected: signedInGet(201),
    arrange: () => ({ path: '/surveys', body: { name: 'Another valley' } }),
  },
  {
    endpoint: 'GET /surveys/:surveyId',
    expected: membersGet(),
    arrange: ({ surveyId }) => ({ path: `/surveys/${surveyId}` }),
  },
  {
    endpoint: 'PATCH /surveys/:surveyId',
    expected: rolesGet(200, 'lead'),
    arrange: ({ surveyId }) => ({
      path: `/surveys/${surveyId}`,
      body: { description: 'Changed' },
      version: 1,
    }),
  },
  {
    endpoint: 'GET /surveys/:surveyId/members',
    expected: membersGet(),
    arrange: ({ surveyId }) => ({ path: `/surveys/${surveyId}/members` }),
  },
  {
    endpoint: 'PUT /surveys/:surveyId/members/:userId',
    expected: rolesGet(200, 'lead'),
    arrange: async (given) => ({
      path: `/surveys/${given.surveyId}/members/${await newMember(given)}`,
      body: { role: 'analyst' },
    }),
  },
  {
    endpoint: 'DELETE /surveys/:surveyId/members/:userId',
    expected: rolesGet(204, 'lead'),
    arrange: async (given) => ({ path: `/surveys/${given.surveyId}/members/${await newMember(given)}` }),
  },
  {
    endpoint: 'GET /surveys/:surveyId/invitations',
    expected: rolesGet(200, 'lead'),
    arrange: ({ surveyId }) => ({ path: `/surveys/${surveyId}/invitations` }),
  },
  {
    endpoint: 'POST /surveys/:surveyId/invitations',
    expected: rolesGet(201, 'lead'),
    arrange: ({ surveyId }) => ({
      path: `/surveys/${surveyId}/invitations`,
      body: { email: 'newcomer@example.test', role: 'guest' },
    }),
  },
  {
    endpoint: 'DELETE /surveys/:surveyId/invitations/:invitationId',
    expected: rolesGet(204, 'lead'),
    arrange: async ({ server, surveyId, author }) => {
      const { id } = await server.createInvitation(surveyId, author.user?.id ?? '');
      return { path: `/surveys/${surveyId}/invitations/${id}` };
    },
  },
  {
    endpoint: 'GET /surveys/:surveyId/lines',
    expected: membersGet(),
    arrange: ({ surveyId }) => ({ path: `/surveys/${surveyId}/lines` }),
  },
  {
    endpoint: 'POST /surveys/:surveyId/lines',
    expected: rolesGet(201, 'lead', 'geophysicist'),
    arrange: ({ surveyId, asker }) => ({
      path: `/surveys/${surveyId}/lines`,
      body: { name: `Line of ${asker.user?.id}` },
    }),
  },
  {
    endpoint: 'GET /surveys/:surveyId/boreholes',
    expected: membersGet(),
    arrange: ({ surveyId }) => ({ path: `/surveys/${surveyId}/boreholes` }),
  },
  {
    endpoint: 'POST /surveys/:surveyId/boreholes',
    expected: rolesGet(201, 'hydrogeologist'),
    arrange: ({ surveyId }) => ({ path: `/surveys/${surveyId}/boreholes`, body: borehole('B 1') }),
  },
  {
    endpoint: 'GET /boreholes/:boreholeId',
    expected: membersGet(),
    arrange: async ({ server, surveyId }) => ({
      path: `/boreholes/${(await server.createBorehole(surveyId)).id}`,
    }),
  },
  {
    endpoint: 'PUT /boreholes/:boreholeId',
    expected: rolesGet(200, 'hydrogeologist'),
    arrange: async ({ server, surveyId }) => ({
      path: `/boreholes/${(await server.createBorehole(surveyId)).id}`,
      body: borehole('B 2'),
      version: 1,
    }),
  },
];
