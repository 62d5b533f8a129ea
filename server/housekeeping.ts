import { deleteOldAttempts } from './access/attempts';
import type { Services } from './http/context';

const EVERY_MS = 3_600_000;

/** Removes what has expired: sessions and counted attempts. Safe to run in any number of web processes. */
export function startHousekeeping({ sessions, db, background }: Services): { stop(): void } {
  const tidy = (): void =>
    background.run('housekeeping', async () => {
      await sessions.deleteExpired();
      await deleteOldAttempts(db);
    });
  tidy();
  const timer = setInterval(tidy, EVERY_MS);
  timer.unref();
  return { stop: () => clearInterval(timer) };
}
