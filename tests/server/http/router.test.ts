import { once } from 'node:events';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import request from 'supertest';
import { expect, test } from 'vitest';
import { problemSchema } from '../../../server/contract/common';
import { createDatabase } from '../../../server/db/knex';
import { createPool } from '../../../server/db/pool';
import { createTestServer, serverOn } from '../../setup/server';

const server = await createTestServer();
const client = await server.signInOutsider();

test('a body that is no JSON is a problem detail', async () => {
  const answer = await client.patch('/me').set('Content-Type', 'application/json').send('{"name": ');
  expect(answer.status).toBe(400);
  expect(problemSchema.parse(answer.body)).toMatchObject({ code: 'bad-request', instance: '/api/v1/me' });
});

test('another kind of body is refused, not taken for an empty one', async () => {
  const answer = await client.patch('/me').set('Content-Type', 'text/plain').send('name=Someone');
  expect(answer.body).toMatchObject({ status: 415, code: 'unsupported-media' });
});

test('a body past the limit is refused', async () => {
  const answer = await client.patch('/me', { name: 'x'.repeat(9_000_000) });
  expect(answer.body).toMatchObject({ status: 413, code: 'too-large' });
});

test('an unknown member of a body is named', async () => {
  const answer = await client.patch('/me', { name: 'Someone', isAdmin: true });
  expect(answer.status).toBe(422);
  expect(answer.body).toMatchObject({
    faults: [{ path: ['body', 'isAdmin'], message: 'is no known field' }],
  });
});

test('a value that is not allowed is told with what was found and what is allowed', async () => {
  const answer = await client.post('/surveys', { name: ' ', epsgCode: 12, errorFloor: '3 %' });
  expect(answer.body).toMatchObject({
    status: 422,
    faults: [
      { path: ['body', 'name'], message: 'is empty', allowed: 'at least 1 character' },
      { path: ['body', 'epsgCode'], message: 'is too small', found: '12', allowed: 'at least 1024' },
      { path: ['body', 'errorFloor'], message: 'is not a number', found: '3 %', allowed: 'a number' },
    ],
  });
});

test('a password that is refused is not repeated', async () => {
  const answer = await client.put('/me/password', { currentPassword: 'the old one', newPassword: 'secret' });
  expect(answer.body).toMatchObject({
    status: 422,
    faults: [{ message: 'must have at least 12 characters', found: '6 characters' }],
  });
  expect(JSON.stringify(answer.body)).not.toContain('secret');
});

test('a NUL character is a fault of the sender, told plainly', async () => {
  const answer = await client.patch('/me', { name: 'some\u0000one' });
  expect(answer.body).toMatchObject({
    status: 422,
    code: 'invalid',
    detail: expect.stringContaining('NUL') as string,
  });
});

test('answers are kept by no one on the way', async () => {
  expect((await client.get('/me')).headers['cache-control']).toBe('no-store');
});

test('every answer to a failure names its request', async () => {
  const [first, second] = [await server.nobody.get('/me'), await server.nobody.get('/me')];
  const ids = [first, second].map((answer) => problemSchema.parse(answer.body).requestId);
  expect(ids[0]).toMatch(/^[0-9a-f-]{36}$/);
  expect(ids[0]).not.toBe(ids[1]);
});

test('goes on after the database dropped every connection', async () => {
  await server.db.raw(
    `SELECT pg_terminate_backend(pid) FROM pg_stat_activity
     WHERE datname = current_database() AND pid <> pg_backend_pid()`,
  );
  const statuses = new Set<number>();
  await expect
    .poll(async () => {
      const { status } = await client.get('/me');
      statuses.add(status);
      return status;
    })
    .toBe(200);
  expect([...statuses].filter((status) => status !== 200 && status !== 503)).toEqual([]);
});

test('says that it is unavailable while the database cannot be reached, and that nothing was lost', async () => {
  const silent = createServer().listen(0, '127.0.0.1');
  await once(silent, 'listening');
  const { port } = silent.address() as AddressInfo;
  silent.close();
  await once(silent, 'close');
  const url = `postgres://nobody@127.0.0.1:${port}/nothing`;
  const config = { databaseUrl: url, databasePool: 2 };
  const [knex, pool] = [createDatabase(config), createPool(config)];
  const lost = await serverOn({ url, knex, pool });
  const answer = await request(lost.app).get('/api/v1/me').set('Cookie', 'layerwell_session=anything');
  expect(answer.body).toMatchObject({ status: 503, code: 'unavailable' });
  expect((await request(lost.app).get('/readyz')).status).toBe(503);
  expect((await request(lost.app).get('/healthz')).status).toBe(200);
  await knex.destroy();
  await pool.end();
});
