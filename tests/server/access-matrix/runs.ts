import { createRun } from '../../setup/run-factory';
import { membersGet, rolesGet, type AccessRow } from './access-row';

type Given = Parameters<AccessRow['arrange']>[0];

const measured = async ({ server, surveyId, author }: Given): Promise<string> => {
  const sounding = await server.createSounding(surveyId);
  await server.createRevision(sounding.id, author.user?.id ?? '');
  return sounding.id;
};

const runOf = async (given: Given, finished = true): Promise<string> => {
  const requestedBy = given.author.user?.id ?? '';
  return (await createRun(given.server.db, await measured(given), { requestedBy, finished })).id;
};

export const runRows: AccessRow[] = [
  {
    endpoint: 'GET /soundings/:soundingId/runs',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/soundings/${await measured(given)}/runs` }),
  },
  {
    endpoint: 'POST /soundings/:soundingId/runs',
    expected: rolesGet(201, 'lead', 'geophysicist'),
    arrange: async (given) => ({
      path: `/soundings/${await measured(given)}/runs`,
      body: { settings: { kind: 'layered', layers: 3 } },
    }),
  },
  {
    endpoint: 'GET /soundings/:soundingId/run-events',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/soundings/${await measured(given)}/run-events` }),
  },
  {
    endpoint: 'GET /runs/:runId',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/runs/${await runOf(given)}` }),
  },
  {
    endpoint: 'POST /runs/:runId/recomputation',
    expected: rolesGet(201, 'lead', 'geophysicist', 'analyst'),
    arrange: async (given) => ({ path: `/runs/${await runOf(given)}/recomputation` }),
  },
  {
    endpoint: 'PUT /runs/:runId/cancellation',
    expected: rolesGet(200, 'lead', 'geophysicist'),
    arrange: async (given) => ({ path: `/runs/${await runOf(given, false)}/cancellation` }),
  },
  {
    endpoint: 'PATCH /runs/:runId/note',
    expected: rolesGet(200, 'lead', 'geophysicist', 'analyst'),
    arrange: async (given) => ({
      path: `/runs/${await runOf(given)}/note`,
      body: { label: 'wet top' },
      version: 1,
    }),
  },
];
