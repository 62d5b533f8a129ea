import { join } from 'node:path';
import { isLock, takeLock, type Lock } from './lock';
import { PlainError } from './plain-error';
import type { Shutdown } from './shutdown';

export const lockPath = (root: string) => join(root, '.layerwell', 'run.lock');

/** The private cluster and the ports belong to one command at a time. */
export function claimCheckout(root: string, command: string, shutdown: Shutdown): Lock {
  const outcome = takeLock(lockPath(root), command);
  if (!isLock(outcome)) {
    const where = outcome.address === undefined ? 'and is still starting' : `at ${outcome.address}`;
    throw new PlainError(
      `"npm run ${outcome.command}" already runs in this folder ${where} (process ${outcome.pid}).\n` +
        `Use that one, or stop it first: kill ${outcome.pid}`,
    );
  }
  shutdown.add('', () => {
    outcome.release();
    return Promise.resolve();
  });
  return outcome;
}
