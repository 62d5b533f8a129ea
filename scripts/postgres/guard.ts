import { spawn } from 'node:child_process';

export interface Guard {
  /** The cluster is being stopped in order: the guard has nothing left to do. */
  release(): void;
}

const wait = 'read -r word; [ "$word" = done ] && exit 0; kill -INT "$1" 2>/dev/null';
const remove = 'while kill -0 "$1" 2>/dev/null; do sleep 0.1; done; rm -rf -- "$2"';

/**
 * A shell that waits on a pipe from this process. However this process ends, even by SIGKILL, the pipe closes, and the
 * shell asks that one postmaster for a fast shutdown and removes a throw-away folder.
 */
export function guard(postmaster: number, throwAwayFolder: string | null): Guard {
  const script = throwAwayFolder === null ? wait : `${wait}; ${remove}`;
  const shell = spawn('/bin/sh', ['-c', script, 'sh', String(postmaster), throwAwayFolder ?? ''], {
    cwd: '/',
    detached: true,
    stdio: ['pipe', 'ignore', 'ignore'],
  });
  shell.stdin.on('error', () => undefined);
  shell.unref();
  // The pipe must not keep a finished process from ending.
  if ('unref' in shell.stdin && typeof shell.stdin.unref === 'function') shell.stdin.unref();
  return { release: () => shell.stdin.end('done\n') };
}
