import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { afterAll } from 'vitest';

const ROOT = join(import.meta.dirname, '../..');

export interface WorkerProcess {
  signal(name: NodeJS.Signals): void;
  /** resolves to the exit code when the process has ended */
  end(name: 'SIGTERM' | 'SIGKILL'): Promise<number | null>;
}

/**
 * The way to start worker processes, each as on another machine. Call it at the top of a test file, after the server was
 * made: whatever still runs when the file ends is killed before the database goes.
 */
export function workerProcesses(databaseUrl: string): () => WorkerProcess {
  const children: ChildProcess[] = [];
  afterAll(async () => {
    const running = children.filter((child) => child.exitCode === null && child.signalCode === null);
    await Promise.all(
      running.map((child) => {
        const ended = once(child, 'exit');
        child.kill('SIGKILL');
        return ended;
      }),
    );
  });
  return () => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/worker.ts'], {
      cwd: ROOT,
      env: { ...process.env, DATABASE_URL: databaseUrl, LOG_LEVEL: 'silent' },
      stdio: 'ignore',
    });
    children.push(child);
    const ended = once(child, 'exit').then(() => child.exitCode);
    return {
      signal: (name) => void child.kill(name),
      end(name) {
        child.kill(name);
        return ended;
      },
    };
  };
}
