import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { afterAll } from 'vitest';

const ROOT = join(import.meta.dirname, '../..');

export interface WorkerProcess {
  readonly pid: number;
  /** resolves when the process has ended */
  signal(name: NodeJS.Signals): void;
  end(name: 'SIGTERM' | 'SIGKILL'): Promise<number | null>;
}

/** A worker process of its own, as on another machine; killed after the file if it still runs. */
export function startWorkerProcess(databaseUrl: string): WorkerProcess {
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/worker.ts'], {
    cwd: ROOT,
    env: { ...process.env, DATABASE_URL: databaseUrl, LOG_LEVEL: process.env.TEST_WORKER_LOG ?? 'silent' },
    stdio: ['ignore', process.env.TEST_WORKER_LOG ? 'inherit' : 'ignore', 'inherit'],
  });
  const ended = once(child, 'exit').then(() => child.exitCode);
  afterAll(async () => {
    if (isRunning(child)) child.kill('SIGKILL');
    await ended;
  });
  return {
    pid: child.pid ?? 0,
    signal: (name) => void child.kill(name),
    end(name) {
      child.kill(name);
      return ended;
    },
  };
}

const isRunning = (child: ChildProcess): boolean => child.exitCode === null && child.signalCode === null;
