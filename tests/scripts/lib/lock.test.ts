import { mkdtempSync, readFileSync, rmSync, writeFileSync, existsSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeEach, expect, it } from 'vitest';
import { startTicks } from '../../../scripts/lib/alive';
import { isLock, takeLock, type Lock } from '../../../scripts/lib/lock';

const folder = mkdtempSync(join(tmpdir(), 'layerwell-lock-'));
const path = join(folder, 'run.lock');

beforeEach(() => rmSync(path, { force: true }));
afterAll(() => rmSync(folder, { recursive: true }));

const holder = () => (JSON.parse(readFileSync(path, 'utf8')) as { pid: number }).pid;

function take(): Lock {
  const outcome = takeLock(path, 'start');
  if (!isLock(outcome)) throw new Error('held by another');
  return outcome;
}

const held = (pid: number, ticks: string | null) =>
  writeFileSync(path, JSON.stringify({ pid, ticks, command: 'dev' }));

it('is refused while its holder lives, and says who and where that is', () => {
  take().note('http://127.0.0.1:4310');
  expect(takeLock(path, 'dev')).toMatchObject({
    pid: process.pid,
    command: 'start',
    address: 'http://127.0.0.1:4310',
  });
});

it('can be taken again once released', () => {
  take().release();
  expect(existsSync(path)).toBe(false);
  take();
  expect(holder()).toBe(process.pid);
});

it('does not outlive a process that is gone', () => {
  held(2 ** 22 - 1, '1');
  take();
  expect(holder()).toBe(process.pid);
});

it('is not held by another program that has got the same number since', () => {
  held(process.ppid, `${startTicks(process.ppid)}0`);
  take();
  expect(holder()).toBe(process.pid);
});

it('does not remove the lock of a successor', () => {
  const lock = take();
  held(process.ppid, startTicks(process.ppid));
  lock.release();
  expect(existsSync(path)).toBe(true);
});

it('takes a lock file that was cut short for none', () => {
  writeFileSync(path, '{"pid":');
  take();
  expect(holder()).toBe(process.pid);
});
