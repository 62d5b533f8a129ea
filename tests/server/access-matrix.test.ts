import request, { type Test } from 'supertest';
import { beforeAll, describe, expect, test } from 'vitest';
import { endpoints } from '../../server/endpoints';
import type { Endpoint } from '../../server/http/endpoint';
import { createTestServer, type Client } from '../setup/server';
import { ROLES, WHO, type AccessRow, type Asked, type Who } from './access-matrix/access-row';
import { accountRows } from './access-matrix/account';
import { adminRows } from './access-matrix/admin';
import { interpretationRows } from './access-matrix/interpretations';
import { readingRows } from './access-matrix/readings';
import { runRows } from './access-matrix/runs';
import { surveyRows } from './access-matrix/surveys';

/** Each feature's table; an endpoint without a row here fails below. */
const rows: AccessRow[] = [
  ...accountRows,
  ...adminRows,
  ...surveyRows,
  ...readingRows,
  ...runRows,
  ...interpretationRows,
];

const server = await createTestServer();
const clients = new Map<Who, Client>();
let surveyId = '';
let author: Client;

beforeAll(async () => {
  surveyId = (await server.createSurvey()).id;
  author = await server.signInAs('lead', surveyId);
  clients.set('nobody', server.nobody);
  clients.set('outsider', await server.signInOutsider());
  clients.set('admin', await server.signInAdmin());
  for (const role of ROLES) clients.set(role, await server.signInAs(role, surveyId));
});

const nameOf = (definition: Endpoint): string => `${definition.method.toUpperCase()} ${definition.path}`;

test('every endpoint has exactly one row, and every row an endpoint', () => {
  expect(rows.map((row) => row.endpoint).toSorted()).toEqual(endpoints.map(nameOf).toSorted());
});

describe.each(endpoints.map((definition) => [nameOf(definition), definition] as const))(
  '%s',
  (name, definition) => {
    const row = rows.find((candidate) => candidate.endpoint === name);

    test.skipIf(!row).each(WHO)('%s', async (who) => {
      if (!row) return;
      const asker = await freshClient(who, name);
      const asked = await row.arrange({ server, surveyId, author, asker });
      const answer = await send(asker, definition, asked);
      expect({ status: answer.status, detail: detailOf(answer.body) }).toMatchObject({
        status: row.expected[who],
      });
      const schema = definition.answers[answer.status];
      const faults = schema && !definition.stream ? schema.safeParse(answer.body).error : undefined;
      expect(faults).toBeUndefined();
    });
  },
);

/** What ends sessions is asked by a person of the same kind who asks nothing else. */
async function freshClient(who: Who, name: string): Promise<Client> {
  if (who === 'nobody' || !/\/sessions?$|password$/.test(name)) return clients.get(who) ?? server.nobody;
  if (who === 'outsider') return server.signInOutsider();
  return who === 'admin' ? server.signInAdmin() : server.signInAs(who, surveyId);
}

function send(asker: Client, definition: Endpoint, asked: Asked): Test {
  const { path, body, version } = asked;
  const test = asker.send(definition.method, path);
  if (version !== undefined) test.set('If-Match', `"${version}"`);
  if (definition.stream) return test.buffer(false).parse(hangUp);
  if (!asked.file) return body ? test.send(body) : test;
  test.attach('file', Buffer.from(asked.file.content), asked.file.name);
  for (const [name, value] of Object.entries(body ?? {})) test.field(name, String(value));
  return test;
}

/** A stream never ends by itself: its head is all that is looked at. */
const hangUp: Parameters<Test['parse']>[0] = (response, done) => {
  response.on('error', () => undefined);
  (response as unknown as { destroy(): void }).destroy();
  done(null, {});
};

const detailOf = (body: unknown): unknown =>
  typeof body === 'object' && body !== null && 'detail' in body ? body : undefined;

test('another site’s page changes nothing, whoever is signed in', async () => {
  for (const definition of endpoints.filter((candidate) => candidate.method !== 'get')) {
    const path = definition.path.replace(/:\w+/g, surveyId);
    const answer = await request(server.app)
      [definition.method](`/api/v1${path}`)
      .set('Origin', 'https://elsewhere.test');
    expect([nameOf(definition), answer.status]).toEqual([nameOf(definition), 403]);
  }
});
