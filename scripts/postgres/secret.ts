import { randomBytes } from 'node:crypto';
import { chmodSync, chownSync, existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import type { Account } from './account';

/** A password made once and kept where only the account (and root) can read it. */
export function keepSecret(path: string, account: Account): string {
  if (!existsSync(path)) {
    const fresh = `${path}.${process.pid}`;
    writeFileSync(fresh, randomBytes(24).toString('base64url'), { mode: 0o600 });
    chmodSync(fresh, 0o600);
    if (account.uid !== undefined && account.gid !== undefined) chownSync(fresh, account.uid, account.gid);
    renameSync(fresh, path);
  }
  return readFileSync(path, 'utf8').trim();
}
