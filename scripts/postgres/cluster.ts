import { existsSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { delay, isAlive, waitUntil } from '../lib/alive';
import { runCommand } from '../lib/command';
import { PlainError } from '../lib/plain-error';
import { anyFreePort, isPortFree } from '../lib/port';
import type { Account } from './account';
import { appRole, databaseUrl, ensureDatabase } from './database';
import { makeFolder, socketFolder } from './folder';
import { guard, type Guard } from './guard';
import { clearStaleLocks, clusterProcesses, livePostmaster } from './postmaster';
import { keepSecret } from './secret';

export interface ClusterOptions {
  /** Folder of PostgreSQL's programs. */
  bin: string;
  /** Holds data, socket, passwords and log; nothing outside it is touched. */
  folder: string;
  account: Account;
  /** For tests: nothing is flushed to the disk and the folder goes when the cluster stops. */
  throwAway?: boolean;
}

const lastLines = (text: string, count = 6) => text.trim().split('\n').slice(-count).join('\n  ');

const readText = (path: string) => (existsSync(path) ? readFileSync(path, 'utf8') : '');

/** One private PostgreSQL, reached on 127.0.0.1 only. */
export class Cluster {
  readonly #options: ClusterOptions;
  readonly #data: string;
  readonly #log: string;
  #port = 0;
  #guard: Guard | null = null;

  constructor(options: ClusterOptions) {
    this.#options = options;
    this.#data = join(options.folder, 'data');
    this.#log = join(options.folder, 'postgres.log');
  }

  get port(): number {
    return this.#port;
  }

  get pid(): number | null {
    return livePostmaster(this.#data)?.pid ?? null;
  }

  /** Makes the cluster when there is none, starts it and sees to the database. */
  async start(databaseName = 'layerwell'): Promise<string> {
    const { folder, account, throwAway = false } = this.#options;
    makeFolder(folder, account);
    const socket = socketFolder(folder);
    if (socket !== null) makeFolder(socket, account);
    const superPassword = keepSecret(join(folder, 'superuser.pw'), account);
    const password = keepSecret(join(folder, 'layerwell.pw'), account);
    if (!existsSync(join(this.#data, 'PG_VERSION'))) await this.#create();
    await this.#stopRunning();
    await this.#launch(socket);
    const superUrl = databaseUrl('postgres', superPassword, this.#port, 'postgres');
    await ensureDatabase(superUrl, { name: databaseName, password, mayCreateDatabases: throwAway });
    return databaseUrl(appRole, password, this.#port, databaseName);
  }

  /** Every session is ended and the cluster is shut down in order. */
  async stop(): Promise<void> {
    this.#guard?.release();
    this.#guard = null;
    await this.#stopRunning();
    if (this.#options.throwAway === true) rmSync(this.#options.folder, { recursive: true, force: true });
  }

  /** Built beside its final place, so that an interrupted start leaves nothing half-made. */
  async #create(): Promise<void> {
    const { folder, throwAway = false } = this.#options;
    if (existsSync(this.#data)) {
      throw new PlainError(`${this.#data} is there but is no database. Move it away, then start again.`);
    }
    const fresh = `${this.#data}.new`;
    rmSync(fresh, { recursive: true, force: true });
    const password = ['-U', 'postgres', '-A', 'scram-sha-256', '--pwfile', join(folder, 'superuser.pw')];
    const form = ['-E', 'UTF8', '--locale=C.UTF-8', '--no-instructions', ...(throwAway ? ['-N'] : [])];
    const { code, output } = await this.#run('initdb', ['-D', fresh, ...password, ...form]);
    if (code !== 0)
      throw new PlainError(`The database could not be made in ${folder}:\n  ${lastLines(output)}`);
    renameSync(fresh, this.#data);
  }

  async #launch(socket: string | null): Promise<void> {
    const { folder, throwAway = false } = this.#options;
    clearStaleLocks(this.#data, socket);
    this.#port = await this.#choosePort(join(folder, 'port'));
    const settings = {
      listen_addresses: '127.0.0.1',
      unix_socket_directories: socket ?? '',
      // After a kill -9 one call flushes the whole file system instead of one for each of a thousand files.
      recovery_init_sync_method: 'syncfs',
      ...(throwAway
        ? {
            fsync: 'off',
            synchronous_commit: 'off',
            full_page_writes: 'off',
            max_connections: '200',
            // its worker would stand in the way of dropping a database
            autovacuum: 'off',
          }
        : {}),
    };
    const flags = Object.entries(settings).map(
      ([name, value]) => `-c ${name}='${value.replaceAll("'", String.raw`'\''`)}'`,
    );
    const logBefore = readText(this.#log).length;
    const start = [
      '-D',
      this.#data,
      '-l',
      this.#log,
      '-w',
      '-t',
      '60',
      '-o',
      `-p ${this.#port} ${flags.join(' ')}`,
      'start',
    ];
    const { code, output } = await this.#run('pg_ctl', start);
    const running = livePostmaster(this.#data);
    if (code !== 0 || running === null) {
      const reason = readText(this.#log).slice(logBefore) || output;
      throw new PlainError(
        `PostgreSQL did not start. Its log, ${this.#log}, ends with:\n  ${lastLines(reason)}`,
      );
    }
    this.#guard?.release();
    this.#guard = guard(running.pid, throwAway ? folder : null);
  }

  /** The same port as last time, unless something else has taken it. Once it has run, its clients know the port. */
  async #choosePort(file: string): Promise<number> {
    if (this.#port !== 0) return this.#port;
    const kept = Number(readText(file));
    const port =
      Number.isInteger(kept) && kept > 0 && (await isPortFree('127.0.0.1', kept))
        ? kept
        : await anyFreePort();
    writeFileSync(file, String(port));
    return port;
  }

  /** Also ends what an earlier run that was killed left in this folder. */
  async #stopRunning(): Promise<void> {
    const running = livePostmaster(this.#data);
    if (running !== null) {
      await this.#run('pg_ctl', ['-D', this.#data, '-m', 'fast', '-w', '-t', '30', 'stop']);
      if (isAlive(running.pid))
        await this.#run('pg_ctl', ['-D', this.#data, '-m', 'immediate', '-w', 'stop']);
    }
    const isQuiet = () => clusterProcesses(this.#data).length === 0;
    if (isQuiet() || (await waitUntil(isQuiet, 3_000))) return;
    for (const pid of clusterProcesses(this.#data)) {
      if (isAlive(pid)) process.kill(pid, 'SIGKILL');
    }
    await delay(100);
  }

  #run(program: string, args: string[]) {
    const { bin, account } = this.#options;
    const env = { PATH: process.env.PATH ?? '/usr/bin:/bin', LC_ALL: 'C.UTF-8', TZ: 'UTC' };
    return runCommand(join(bin, program), args, { ...account, cwd: '/', env });
  }
}
