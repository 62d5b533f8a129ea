import { spawn } from 'node:child_process';
import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { isAlive, waitUntil } from '../../../scripts/lib/alive';
import { findAccount } from '../../../scripts/postgres/account';
import { Cluster } from '../../../scripts/postgres/cluster';
import { ensurePostgres } from '../../../scripts/postgres/install';
import { runSql } from '../../setup/run-sql';

const bin = await ensurePostgres(console.log);
const account = await findAccount();
const root = mkdtempSync(join(tmpdir(), 'layerwell-cluster-'));
chmodSync(root, 0o755);
const folder = join(root, 'postgres');

const pidFile = () => join(folder, 'data', 'postmaster.pid');
const notedPid = (path = pidFile()) => Number(readFileSync(path, 'utf8').split('\n')[0]);

async function notes(url: string): Promise<string[]> {
  const client = new pg.Client(url);
  await client.connect();
  const { rows } = await client.query<{ text: string }>('SELECT text FROM note');
  await client.end();
  return rows.map(({ text }) => text);
}

let cluster: Cluster;

beforeAll(async () => {
  const first = new Cluster({ bin, folder, account });
  await runSql(await first.start(), `CREATE TABLE note (text text); INSERT INTO note VALUES ('kept')`);
  await first.stop();
});
beforeEach(() => {
  cluster = new Cluster({ bin, folder, account });
});
afterEach(() => cluster.stop());
afterAll(() => rmSync(root, { recursive: true, force: true }));

describe('a private cluster', () => {
  it('keeps its data, its password and its port from one start to the next', async () => {
    const url = await cluster.start();
    await cluster.stop();
    expect(existsSync(pidFile())).toBe(false);
    cluster = new Cluster({ bin, folder, account });
    expect(await cluster.start()).toBe(url);
    expect(await notes(url)).toEqual(['kept']);
  });

  it('is for its owner alone: loopback, a password, closed files, no superuser', async () => {
    const url = await cluster.start();
    expect(new URL(url).hostname).toBe('127.0.0.1');
    await expect(notes(url.replace(/:[^:@]+@/, ':wrong@'))).rejects.toThrow(/password authentication failed/);
    await expect(runSql(url, `COPY (SELECT 1) TO PROGRAM 'true'`)).rejects.toThrow(/must be superuser/);
    expect(statSync(folder).mode & 0o777).toBe(0o700);
    expect(statSync(join(folder, 'layerwell.pw')).mode & 0o777).toBe(0o600);
    expect(statSync(join(folder, 'superuser.pw')).mode & 0o777).toBe(0o600);
  });

  it('recovers all data after kill -9 of the postmaster', async () => {
    const url = await cluster.start();
    await runSql(url, `UPDATE note SET text = 'kept'`);
    process.kill(notedPid(), 'SIGKILL');
    expect(await cluster.start()).toBe(url);
    expect(await notes(url)).toEqual(['kept']);
  });

  it('is not kept from starting by a lock file whose number another program has now', async () => {
    writeFileSync(pidFile(), `${process.pid}\n${join(folder, 'data')}\n1\n5432\n`);
    await cluster.start();
    expect(notedPid()).not.toBe(process.pid);
    expect(cluster.pid).toBe(notedPid());
  });

  it('takes another port when something else has taken its own', async () => {
    const port = Number(readFileSync(join(folder, 'port'), 'utf8'));
    const squatter = createServer();
    await new Promise<void>((resolve) => squatter.listen(port, '127.0.0.1', resolve));
    const url = await cluster.start();
    await new Promise((resolve) => squatter.close(resolve));
    expect(Number(new URL(url).port)).not.toBe(port);
    expect(await notes(url)).toEqual(['kept']);
  });

  it('starts where it was moved to, even when the path is too long for a socket', async () => {
    const deep = join(root, 'a'.repeat(60), 'b'.repeat(60));
    mkdirSync(join(root, 'a'.repeat(60)));
    renameSync(folder, deep);
    const moved = new Cluster({ bin, folder: deep, account });
    try {
      expect(await notes(await moved.start())).toEqual(['kept']);
    } finally {
      await moved.stop();
      renameSync(deep, folder);
    }
  });

  it('says what to do when its folder holds something else', async () => {
    const foreign = join(root, 'foreign');
    mkdirSync(join(foreign, 'data'), { recursive: true });
    const start = new Cluster({ bin, folder: foreign, account }).start();
    await expect(start).rejects.toThrow(/foreign\/data is there but is no database\. Move it away/);
  });
});

describe('a cluster whose command is killed with -9', () => {
  async function startAndKill(path: string, throwAway: boolean): Promise<number> {
    const source = `
      import { Cluster } from ${JSON.stringify(join(process.cwd(), 'scripts/postgres/cluster.ts'))};
      await new Cluster(${JSON.stringify({ bin, folder: path, account, throwAway })}).start();
      console.log('up');
      setInterval(() => undefined, 1000);`;
    const args = ['--import', 'tsx', '--input-type=module', '-e', source];
    const child = spawn(process.execPath, args, { stdio: ['ignore', 'pipe', 'inherit'] });
    await new Promise((resolve) => child.stdout.once('data', resolve));
    const postmaster = notedPid(join(path, 'data', 'postmaster.pid'));
    expect(isAlive(postmaster)).toBe(true);
    child.kill('SIGKILL');
    return postmaster;
  }

  it('shuts down by itself and leaves its data', async () => {
    const postmaster = await startAndKill(folder, false);
    expect(await waitUntil(() => !isAlive(postmaster), 10_000)).toBe(true);
    expect(await notes(await cluster.start())).toEqual(['kept']);
  });

  it('takes a throw-away folder with it', async () => {
    const passing = join(root, 'passing');
    const postmaster = await startAndKill(passing, true);
    expect(await waitUntil(() => !isAlive(postmaster), 10_000)).toBe(true);
    expect(await waitUntil(() => !existsSync(passing), 5_000)).toBe(true);
  });
});
