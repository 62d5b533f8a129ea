import { spawn, type ChildProcess } from 'node:child_process';
import { chmodSync, cpSync, mkdtempSync, readFileSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { waitUntil } from '../../scripts/lib/alive';
import { clusterProcesses } from '../../scripts/postgres/postmaster';

const copied = [
  'scripts',
  'server',
  'src',
  'inversion',
  'migrations',
  'public',
  'index.html',
  'package.json',
  'package-lock.json',
  'vite.config.ts',
  'vite.server.config.ts',
  'tsconfig.base.json',
];

/** A copy of the project in a folder of its own, with the packages of this one and its own private cluster. */
export class ScratchCheckout {
  readonly root: string;

  constructor() {
    this.root = mkdtempSync(join(tmpdir(), 'layerwell-checkout-'));
    // Another account runs PostgreSQL and must be able to pass.
    chmodSync(this.root, 0o755);
    for (const name of copied) cpSync(name, join(this.root, name), { recursive: true });
    symlinkSync(join(process.cwd(), 'node_modules'), join(this.root, 'node_modules'));
  }

  get data(): string {
    return join(this.root, '.layerwell', 'postgres', 'data');
  }

  /** The supervising process, as the lock names it. */
  get supervisor(): number {
    const lock = readFileSync(join(this.root, '.layerwell', 'run.lock'), 'utf8');
    return (JSON.parse(lock) as { pid: number }).pid;
  }

  npm(command: string, port: number): Command {
    return new Command(this.root, command, port);
  }

  async remove(): Promise<void> {
    await waitUntil(() => clusterProcesses(this.data).length === 0, 15_000);
    rmSync(this.root, { recursive: true, force: true });
  }
}

/** `npm start` or another command in a scratch checkout, as a person would type it. */
export class Command {
  readonly baseUrl: string;
  readonly #process: ChildProcess;
  readonly #ended: Promise<number | null>;
  #output = '';
  readonly #startedAt = Date.now();

  constructor(cwd: string, command: string, port: number) {
    this.baseUrl = `http://127.0.0.1:${port}`;
    const settings = ['DATABASE_URL', 'PUBLIC_URL', 'NODE_ENV', 'VITEST', 'TEST_DATABASE_URL'];
    const kept = Object.entries(process.env).filter(
      ([name]) => !settings.includes(name) && !name.startsWith('npm_'),
    );
    const env = { ...Object.fromEntries(kept), HOST: '127.0.0.1', PORT: String(port) };
    this.#process = spawn('npm', ['run', command], { cwd, env, stdio: ['ignore', 'pipe', 'pipe'] });
    this.#process.stdout?.on('data', (chunk: Buffer) => (this.#output += chunk.toString()));
    this.#process.stderr?.on('data', (chunk: Buffer) => (this.#output += chunk.toString()));
    this.#ended = new Promise((resolve) => this.#process.once('exit', resolve));
  }

  get output(): string {
    return this.#output;
  }

  /** Seconds until it says that it is up. */
  async ready(): Promise<number> {
    const isUp = () => this.#output.includes('Ctrl-C stops');
    const isOver = () => this.#process.exitCode !== null || this.#process.signalCode !== null;
    await waitUntil(() => isUp() || isOver(), 100_000);
    if (!isUp()) throw new Error(`it did not come up:\n${this.#output}`);
    return (Date.now() - this.#startedAt) / 1000;
  }

  /** The exit code of npm, which waits for the command. */
  async stop(signal: NodeJS.Signals = 'SIGTERM'): Promise<number | null> {
    this.#process.kill(signal);
    return this.#ended;
  }

  ended(): Promise<number | null> {
    return this.#ended;
  }
}
