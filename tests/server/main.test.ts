import { fork, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import { afterEach, expect, test, vi } from 'vitest';
import { createSessions } from '../../server/access/sessions';
import { createFactories } from '../setup/factories';
import { createTestDatabase } from '../setup/test-database';

const database = await createTestDatabase();
const children: ChildProcess[] = [];
// starting a process takes seconds where other tests use the cores
vi.setConfig({ testTimeout: 60_000 });

afterEach(() => {
  for (const child of children.splice(0)) child.kill('SIGKILL');
});

interface WebProcess {
  child: ChildProcess;
  url: string;
  output: () => string;
}

function startOn(port: number): WebProcess {
  const child = fork('server/main.ts', {
    execArgv: ['--import', 'tsx'],
    env: { ...process.env, DATABASE_URL: database.url, PORT: String(port), LOG_LEVEL: 'info' },
    silent: true,
  });
  children.push(child);
  let output = '';
  for (const stream of [child.stdout, child.stderr])
    stream?.on('data', (chunk: Buffer) => (output += chunk.toString()));
  return { child, url: `http://127.0.0.1:${port}`, output: () => output };
}

async function start(): Promise<WebProcess> {
  const web = startOn(await freePort());
  await expect.poll(() => isUp(web.url), { timeout: 40_000, interval: 50 }).toBe(true);
  return web;
}

const isUp = (url: string): Promise<boolean> =>
  fetch(`${url}/healthz`).then(
    (answer) => answer.ok,
    () => false,
  );

const exitOf = async (child: ChildProcess): Promise<unknown> =>
  child.exitCode ?? ((await once(child, 'exit')) as [number | null])[0];

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return port;
}

test('starts, logs requests without secrets and stops cleanly at SIGTERM, open connections or not', async () => {
  const { child, url, output } = await start();
  const token = 'a'.repeat(43);
  expect((await fetch(`${url}/api/v1/invitations/${token}`)).status).toBe(404);
  await fetch(`${url}/api/v1/me`, { headers: { cookie: 'layerwell_session=a-secret' } });
  child.kill('SIGTERM');
  expect(await exitOf(child)).toBe(0);
  expect(output()).toContain('/api/v1/invitations/…');
  expect(output()).not.toContain(token);
  expect(output()).toContain('/api/v1/me');
  expect(output()).not.toContain('a-secret');
});

test('stops when the process that started it is gone', async () => {
  const { child } = await start();
  child.disconnect();
  expect(await exitOf(child)).toBe(0);
});

test('says plainly that its port is taken', async () => {
  const other = createServer().listen(0, '127.0.0.1');
  await once(other, 'listening');
  const { port } = other.address() as AddressInfo;
  const { child, output } = startOn(port);
  expect(await exitOf(child)).toBe(1);
  expect(output()).toContain(`Port ${port} on 127.0.0.1 is taken by another program`);
  other.close();
});

test('lists every unusable setting at once', async () => {
  const child = fork('server/main.ts', {
    execArgv: ['--import', 'tsx'],
    env: { ...process.env, DATABASE_URL: 'nothing', PORT: '0' },
    silent: true,
  });
  children.push(child);
  let output = '';
  child.stderr?.on('data', (chunk: Buffer) => (output += chunk.toString()));
  expect(await exitOf(child)).toBe(1);
  expect(output).toMatch(/^The settings are not usable:\n {2}DATABASE_URL: .+\n {2}PORT: .+\n$/);
});

test('a stream that is being read does not hold the stop up', async () => {
  const factories = createFactories(database.knex);
  const survey = await factories.createSurvey();
  const user = await factories.createUser();
  await factories.addMember(survey.id, user.id, 'guest');
  const sounding = await factories.createSounding(survey.id);
  const cookie = await createSessions(database.pool, database.config).create(user.id, '');
  const { child, url } = await start();
  const stream = await fetch(`${url}/api/v1/soundings/${sounding.id}/run-events`, { headers: { cookie } });
  expect(stream.headers.get('content-type')).toContain('text/event-stream');
  const asked = performance.now();
  child.kill('SIGTERM');
  await stream.text();
  expect(await exitOf(child)).toBe(0);
  // connections that do not end by themselves are cut after five seconds
  expect(performance.now() - asked).toBeLessThan(4000);
});
