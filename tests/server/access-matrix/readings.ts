import type { Factories } from '../../setup/factories';
import { membersGet, rolesGet, type AccessRow } from './access-row';

type Given = Parameters<AccessRow['arrange']>[0];

const newSounding = async ({ server, surveyId }: Given): Promise<string> =>
  (await server.createSounding(surveyId, { spreadType: 'wenner' })).id;

const savedReadings = async ({
  server,
  surveyId,
  author,
}: Given): ReturnType<Factories['createRevision']> => {
  const sounding = await server.createSounding(surveyId);
  return server.createRevision(sounding.id, author.user?.id ?? '');
};

const units = { length: 'm', voltage: 'mV', current: 'mA', resistivity: 'ohm-m', standardError: 'percent' };
const sheet = {
  rows: [{ cells: { spacing: '5', resistance: '2' }, excluded: null }],
  units,
  baseRevisionId: null,
};

export const readingRows: AccessRow[] = [
  {
    endpoint: 'GET /surveys/:surveyId/soundings',
    expected: membersGet(),
    arrange: ({ surveyId }) => ({ path: `/surveys/${surveyId}/soundings` }),
  },
  {
    endpoint: 'POST /surveys/:surveyId/soundings',
    expected: rolesGet(201, 'lead', 'geophysicist'),
    arrange: ({ surveyId, asker }) => ({
      path: `/surveys/${surveyId}/soundings`,
      body: { name: `V of ${asker.user?.name ?? 'nobody'}`, spreadType: 'wenner' },
    }),
  },
  {
    endpoint: 'GET /soundings/:soundingId',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/soundings/${await newSounding(given)}` }),
  },
  {
    endpoint: 'PATCH /soundings/:soundingId',
    expected: rolesGet(200, 'lead', 'geophysicist'),
    arrange: async (given) => ({
      path: `/soundings/${await newSounding(given)}`,
      body: { crew: 'Two at the reels' },
      version: 1,
    }),
  },
  {
    endpoint: 'GET /soundings/:soundingId/readings',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/soundings/${await newSounding(given)}/readings` }),
  },
  {
    endpoint: 'PUT /soundings/:soundingId/reading-draft',
    expected: rolesGet(200, 'lead', 'geophysicist'),
    arrange: async (given) => ({ path: `/soundings/${await newSounding(given)}/reading-draft`, body: sheet }),
  },
  {
    endpoint: 'DELETE /soundings/:soundingId/reading-draft',
    expected: rolesGet(204, 'lead', 'geophysicist'),
    arrange: async (given) => ({ path: `/soundings/${await newSounding(given)}/reading-draft` }),
  },
  {
    endpoint: 'GET /soundings/:soundingId/revisions',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/soundings/${await newSounding(given)}/revisions` }),
  },
  {
    endpoint: 'POST /soundings/:soundingId/revisions',
    expected: rolesGet(201, 'lead', 'geophysicist'),
    arrange: async (given) => ({ path: `/soundings/${await newSounding(given)}/revisions`, body: sheet }),
  },
  {
    endpoint: 'GET /revisions/:revisionId',
    expected: membersGet(),
    arrange: async (given) => ({ path: `/revisions/${(await savedReadings(given)).id}` }),
  },
  {
    endpoint: 'GET /revisions/:revisionId/source-file',
    // no file belongs to it; the download itself is tested with uploads
    expected: membersGet(404),
    arrange: async (given) => ({ path: `/revisions/${(await savedReadings(given)).id}/source-file` }),
  },
  {
    endpoint: 'POST /soundings/:soundingId/import-previews',
    expected: rolesGet(200, 'lead', 'geophysicist'),
    arrange: async (given) => ({
      path: `/soundings/${await newSounding(given)}/import-previews`,
      file: { name: 'sheet.csv', content: 'a (m);R (ohm)\n5;2\n' },
    }),
  },
  {
    endpoint: 'POST /soundings/:soundingId/imports',
    expected: rolesGet(201, 'lead', 'geophysicist'),
    arrange: async (given) => ({
      path: `/soundings/${await newSounding(given)}/imports`,
      file: { name: 'sheet.csv', content: 'a (m);R (ohm)\n5;2\n' },
      body: {
        accept: 'all',
        mapping: JSON.stringify({
          hasHeader: true,
          delimiter: ';',
          decimalMark: '.',
          columns: ['spacing', 'resistance'],
          units,
        }),
      },
    }),
  },
];
