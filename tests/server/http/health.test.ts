import request from 'supertest';
import { expect, test } from 'vitest';
import { createTestServer } from '../../setup/server';

const server = await createTestServer();

test('the process answers at /healthz', async () => {
  const answer = await request(server.app).get('/healthz');
  expect(answer.body).toEqual({ ok: true });
});

test('ready with a database and a queue, with or without workers', async () => {
  const readiness = async () => (await request(server.app).get('/readyz').expect(200)).body as unknown;
  expect(await readiness()).toEqual({ database: true, queue: true, workers: 0 });
  await server.db('worker_heartbeat').insert({ worker_id: 'live', host: 'here' });
  await server.db('worker_heartbeat').insert({
    worker_id: 'silent',
    host: 'here',
    seen_at: server.db.raw("now() - interval '1 minute'"),
  });
  expect(await readiness()).toEqual({ database: true, queue: true, workers: 1 });
});

test('not ready when the queue is missing', async () => {
  await server.db.raw('ALTER SCHEMA graphile_worker RENAME TO elsewhere');
  const answer = await request(server.app).get('/readyz');
  await server.db.raw('ALTER SCHEMA elsewhere RENAME TO graphile_worker');
  expect(answer.status).toBe(503);
  expect(answer.body).toMatchObject({ database: true, queue: false });
});

test('an unknown address below /api is a problem detail', async () => {
  const answer = await request(server.app).get('/api/v1/nothing').expect(404);
  expect(answer.headers['content-type']).toContain('application/problem+json');
  expect(answer.body).toMatchObject({ code: 'not-found', status: 404, instance: '/api/v1/nothing' });
});
