import { createHash } from 'node:crypto';
import { chmodSync, chownSync, existsSync, mkdirSync, realpathSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { runCommand } from '../lib/command';
import { errorCode, PlainError } from '../lib/plain-error';
import type { Account } from './account';

export const checkoutKey = (path: string) =>
  createHash('sha256').update(realpathSync(path)).digest('hex').slice(0, 12);

const isOurs = (account: Account) => account.uid === undefined || account.uid === process.getuid?.();

export function makeFolder(path: string, account: Account): void {
  try {
    mkdirSync(path, { recursive: true, mode: 0o700 });
    if (account.uid !== undefined && account.gid !== undefined) chownSync(path, account.uid, account.gid);
    chmodSync(path, 0o700);
  } catch (error) {
    const reason = errorCode(error);
    if (reason === 'ENOSPC') throw new PlainError(`There is no space left for the database in ${path}.`);
    if (reason === 'EACCES' || reason === 'EPERM' || reason === 'EROFS') {
      throw new PlainError(
        `The database folder ${path} belongs to another account or cannot be written. Start as the account that made it.`,
      );
    }
    throw error;
  }
}

const canEnter = async (path: string, account: Account) =>
  (await runCommand('/bin/sh', ['-c', 'cd "$1"', 'sh', path], { ...account, cwd: '/' })).code === 0;

/** The checkout's own folder, or one outside it when the account cannot pass the folders above (a closed home). */
export async function chooseFolder(
  checkout: string,
  account: Account,
  say: (line: string) => void,
  sharedRoot = '/var/lib/layerwell',
): Promise<string> {
  const own = join(checkout, '.layerwell', 'postgres');
  const outside = join(sharedRoot, checkoutKey(checkout));
  if (isOurs(account)) return own;
  if (existsSync(join(outside, 'data')) && !existsSync(join(own, 'data'))) return outside;
  mkdirSync(dirname(own), { recursive: true });
  if (await canEnter(dirname(own), account)) return own;
  mkdirSync(sharedRoot, { recursive: true, mode: 0o755 });
  say(`the postgres account cannot reach ${checkout}, so the database lives in ${outside}`);
  return outside;
}

/** Unix socket addresses hold 107 bytes; a longer folder goes without a socket and is reached over loopback alone. */
export const socketFolder = (folder: string) =>
  Buffer.byteLength(join(folder, 'sock', '.s.PGSQL.65535.lock')) <= 107 ? join(folder, 'sock') : null;
