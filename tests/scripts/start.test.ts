import { readdirSync, readFileSync, readlinkSync } from 'node:fs';
import pg from 'pg';
import { afterAll, afterEach, describe, expect, it } from 'vitest';
import { isAlive, waitUntil } from '../../scripts/lib/alive';
import { anyFreePort } from '../../scripts/lib/port';
import { clusterProcesses, livePostmaster } from '../../scripts/postgres/postmaster';
import { ScratchCheckout, type Command } from '../setup/scratch-checkout';

const checkout = new ScratchCheckout();
const port = await anyFreePort();
let running: Command | null = null;

async function start(): Promise<Command> {
  running = checkout.npm('start', port);
  await running.ready();
  return running;
}

/** The web and worker processes of the checkout by the file they run. */
const parts = (file: string): number[] =>
  readdirSync('/proc')
    .map(Number)
    .filter((pid) => {
      try {
        const runs = readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes(`dist/server/${file}.js`);
        return runs && readlinkSync(`/proc/${pid}/cwd`) === checkout.root;
      } catch {
        return false;
      }
    });

const answers = async () => {
  try {
    return (await fetch(`http://127.0.0.1:${port}/readyz`)).ok;
  } catch {
    return false;
  }
};

async function onDatabase<T extends pg.QueryResultRow>(sql: string): Promise<T[]> {
  const password = readFileSync(`${checkout.root}/.layerwell/postgres/layerwell.pw`, 'utf8');
  const port = livePostmaster(checkout.data)?.port;
  const client = new pg.Client({
    host: '127.0.0.1',
    port,
    user: 'layerwell',
    password,
    database: 'layerwell',
  });
  await client.connect();
  try {
    return (await client.query<T>(sql)).rows;
  } finally {
    await client.end();
  }
}

const isNothingLeft = () =>
  clusterProcesses(checkout.data).length === 0 && parts('main').length === 0 && parts('worker').length === 0;

afterEach(async () => {
  await running?.stop();
  running = null;
});
afterAll(() => checkout.remove());

describe('npm start', () => {
  it('starts from nothing, says each step, keeps to loopback and stops everything in order', async () => {
    const command = await start();
    expect(command.output).toMatch(/✓ PostgreSQL.*✓ Build.*✓ Database.*✓ Worker.*✓ Web server/s);
    expect(command.output).toContain(`Layerwell is at http://127.0.0.1:${port}`);
    expect(command.output).toMatch(/Demo accounts\n +\S+@\S+/);
    expect(await answers()).toBe(true);
    await onDatabase(`CREATE TABLE kept (n integer); INSERT INTO kept VALUES (1)`);
    expect(await command.stop('SIGINT')).toBe(0);
    expect(command.output).toMatch(
      /stopping the web process.*stopping the worker process.*stopping PostgreSQL/s,
    );
    expect(isNothingLeft()).toBe(true);
  });

  it('starts a second time without building, and refuses a third beside it', async () => {
    const command = await start();
    expect(command.output).toContain('✓ Build: up to date');
    expect(command.output).toContain('✓ Database: up to date');
    const other = checkout.npm('start', await anyFreePort());
    expect(await other.ended()).not.toBe(0);
    expect(other.output).toContain(
      `already runs in this folder at http://127.0.0.1:${port} (process ${checkout.supervisor})`,
    );
    expect(await answers()).toBe(true);
  });

  it('brings back PostgreSQL, the web process and the worker when one is killed', async () => {
    await start();
    for (const file of ['main', 'worker']) {
      const [before] = parts(file);
      expect(before).toBeDefined();
      process.kill(before ?? 0, 'SIGKILL');
      expect(await waitUntil(() => parts(file).some((pid) => pid !== before), 20_000)).toBe(true);
    }
    const postmaster = livePostmaster(checkout.data);
    process.kill(postmaster?.pid ?? 0, 'SIGKILL');
    const isBack = () => (livePostmaster(checkout.data)?.pid ?? postmaster?.pid) !== postmaster?.pid;
    expect(await waitUntil(isBack, 30_000)).toBe(true);
    expect(await waitUntil(answers, 30_000)).toBe(true);
    expect(await onDatabase('SELECT n FROM kept')).toEqual([{ n: 1 }]);
  });

  it('leaves nothing behind when it is killed itself, and starts again with all data', async () => {
    await start();
    const pid = checkout.supervisor;
    process.kill(pid, 'SIGKILL');
    expect(await waitUntil(() => !isAlive(pid) && isNothingLeft(), 30_000)).toBe(true);
    await start();
    expect(await onDatabase('SELECT n FROM kept')).toEqual([{ n: 1 }]);
  });

  it('can be started again at once after such a kill', async () => {
    await start();
    process.kill(checkout.supervisor, 'SIGKILL');
    await start();
    expect(await waitUntil(answers, 30_000)).toBe(true);
    expect(await onDatabase('SELECT n FROM kept')).toEqual([{ n: 1 }]);
  });
});
