import { linkSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { isAlive, startTicks } from './alive';
import { errorCode } from './plain-error';

export interface LockHolder {
  pid: number;
  ticks: string | null;
  command: string;
  /** Where it answers, once it does. */
  address?: string;
}

function readHolder(path: string): LockHolder | null {
  try {
    return JSON.parse(readFileSync(path, 'utf8')) as LockHolder;
  } catch {
    return null;
  }
}

const isHeld = (holder: LockHolder) =>
  isAlive(holder.pid) && (holder.ticks === null || holder.ticks === startTicks(holder.pid));

export interface Lock {
  note(address: string): void;
  release(): void;
}

/** One command a checkout at a time. A lock whose process is gone does not count. */
export function takeLock(path: string, command: string): Lock | LockHolder {
  const own: LockHolder = { pid: process.pid, ticks: startTicks(process.pid), command };
  mkdirSync(dirname(path), { recursive: true });
  const fresh = `${path}.${process.pid}`;
  writeFileSync(fresh, JSON.stringify(own));
  try {
    for (;;) {
      try {
        // A link appears whole or not at all.
        linkSync(fresh, path);
        break;
      } catch (error) {
        if (errorCode(error) !== 'EEXIST') throw error;
        const holder = readHolder(path);
        if (holder !== null && isHeld(holder)) return holder;
        rmSync(path, { force: true });
      }
    }
  } finally {
    rmSync(fresh, { force: true });
  }
  return {
    note: (address) => writeFileSync(path, JSON.stringify({ ...own, address })),
    release: () => {
      if (readHolder(path)?.pid === process.pid) rmSync(path, { force: true });
    },
  };
}

export const isLock = (outcome: Lock | LockHolder): outcome is Lock => 'release' in outcome;
