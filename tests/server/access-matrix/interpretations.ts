import { createRun } from '../../setup/run-factory';
import { membersGet, rolesGet, type AccessRow } from './access-row';

type Given = Parameters<AccessRow['arrange']>[0];

async function fitted({ server, surveyId, author }: Given) {
  const sounding = await server.createSounding(surveyId);
  const requestedBy = author.user?.id ?? '';
  await server.createRevision(sounding.id, requestedBy);
  return { soundingId: sounding.id, runId: (await createRun(server.db, sounding.id, { requestedBy })).id };
}

async function draftOf(given: Given): Promise<string> {
  const { soundingId, runId } = await fitted(given);
  const made = await given.author.post(`/soundings/${soundingId}/interpretations`, { runId, title: 'Plain' });
  return (made.body as { id: string }).id;
}

export const interpretationRows: AccessRow[] = [
  {
    endpoint: 'GET /soundings/:soundingId/interpretations',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/soundings/${(await fitted(given)).soundingId}/interpretations` }),
  },
  {
    endpoint: 'POST /soundings/:soundingId/interpretations',
    expected: rolesGet(201, 'lead', 'geophysicist', 'analyst'),
    arrange: async (given) => {
      const { soundingId, runId } = await fitted(given);
      return { path: `/soundings/${soundingId}/interpretations`, body: { runId, title: 'Plain' } };
    },
  },
  {
    endpoint: 'GET /interpretations/:interpretationId',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/interpretations/${await draftOf(given)}` }),
  },
  {
    endpoint: 'PATCH /interpretations/:interpretationId',
    // the draft is another person’s, so that an analyst may not
    expected: rolesGet(200, 'lead', 'geophysicist'),
    arrange: async (given) => ({
      path: `/interpretations/${await draftOf(given)}`,
      body: { narrative: 'A wet sand.' },
      version: 1,
    }),
  },
  {
    endpoint: 'DELETE /interpretations/:interpretationId',
    // the draft is another person’s
    expected: rolesGet(204, 'lead'),
    arrange: async (given) => ({ path: `/interpretations/${await draftOf(given)}` }),
  },
  {
    endpoint: 'POST /interpretations/:interpretationId/review-events',
    expected: rolesGet(201, 'lead', 'geophysicist'),
    arrange: async (given) => ({
      path: `/interpretations/${await draftOf(given)}/review-events`,
      body: { kind: 'submitted' },
    }),
  },
];
