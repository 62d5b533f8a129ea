import { spawn, type ChildProcess } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync, renameSync, statSync } from 'node:fs';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { delay } from './alive';

const followParent = fileURLToPath(new URL('follow-parent.mjs', import.meta.url));
const logLimit = 20 * 1024 * 1024;
const healthyAfter = 20_000;

export interface ChildOptions {
  name: string;
  /** What Node is given: flags, the file, its arguments. */
  args: string[];
  cwd: string;
  env: NodeJS.ProcessEnv;
  /** Output goes to this file, or to the terminal when it is absent. */
  log?: string;
  say: (line: string) => void;
}

function openLog(path: string): number {
  mkdirSync(dirname(path), { recursive: true });
  const size = statSync(path, { throwIfNoEntry: false })?.size ?? 0;
  if (size > logLimit) renameSync(path, `${path}.1`);
  return openSync(path, 'a');
}

export const tailOf = (path: string, lines: number) => {
  try {
    return readFileSync(path, 'utf8').trimEnd().split('\n').slice(-lines).join('\n  ');
  } catch {
    return '';
  }
};

/** A Node process that is started again, ever more slowly, until it is asked to stop. */
export class Child {
  readonly #options: ChildOptions;
  #process: ChildProcess | null = null;
  #stopping = false;
  #pause = 250;
  #failures = 0;

  constructor(options: ChildOptions) {
    this.#options = options;
  }

  get pid(): number | undefined {
    return this.#process?.pid;
  }

  /** Ends in a row without a healthy time between them. */
  get failures(): number {
    return this.#failures;
  }

  start(): void {
    const { args, cwd, env, log } = this.#options;
    const output = log === undefined ? 'inherit' : openLog(log);
    const child = spawn(process.execPath, ['--import', followParent, ...args], {
      cwd,
      env,
      stdio: ['ignore', output, output, 'ipc'],
      // A Ctrl-C in the terminal is for the supervisor alone, which stops its parts in order.
      detached: true,
    });
    if (typeof output === 'number') closeSync(output);
    const startedAt = Date.now();
    this.#process = child;
    child.once('error', (error) =>
      this.#options.say(`${this.#options.name} could not be started: ${error.message}`),
    );
    child.once('exit', (code, signal) => {
      this.#process = null;
      if (!this.#stopping) void this.#again(code, signal, Date.now() - startedAt);
    });
  }

  /** Asked by SIGTERM; made to after `patience` milliseconds. */
  async stop(patience = 12_000): Promise<void> {
    this.#stopping = true;
    const child = this.#process;
    if (child === null) return;
    const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
    child.kill('SIGTERM');
    const timer = setTimeout(() => child.kill('SIGKILL'), patience);
    await ended;
    clearTimeout(timer);
  }

  kill(): void {
    this.#stopping = true;
    this.#process?.kill('SIGKILL');
  }

  async #again(code: number | null, signal: NodeJS.Signals | null, lived: number): Promise<void> {
    const { name, log, say } = this.#options;
    if (lived > healthyAfter) [this.#pause, this.#failures] = [250, 0];
    this.#failures += 1;
    const how = signal === null ? `ended with code ${code}` : `was ended by ${signal}`;
    const tail = log === undefined || signal !== null ? '' : tailOf(log, 8);
    say(
      `${name} ${how}; starting it again in ${this.#pause / 1000} s${tail === '' ? '' : `. ${log} ends with:\n  ${tail}`}`,
    );
    await delay(this.#pause);
    this.#pause = Math.min(this.#pause * 2, 15_000);
    if (!this.#stopping) this.start();
  }
}
