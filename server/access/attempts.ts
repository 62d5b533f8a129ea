import { ipKeyGenerator } from 'express-rate-limit';
import type { Knex } from 'knex';
import { AppError } from '../errors';

/** How often a thing may be tried in one window; kept in PostgreSQL, so that it holds over any number of servers. */
export interface AttemptLimit {
  readonly key: string;
  readonly limit: number;
  readonly windowS: number;
}

interface AttemptRow {
  failures: number;
  wait_s: number;
}

/** An IPv6 network counts as one address, because one household owns all of it. */
export const addressKey = (address: string): string =>
  address === '' ? 'unknown' : ipKeyGenerator(address, 64);

/**
 * Counts one attempt under every key before its outcome is known, so that many at once cannot slip through, and refuses
 * when a key is used up. The window runs from its first attempt and never grows: trying on does not prolong a lock.
 */
export async function countAttempt(db: Knex, limits: readonly AttemptLimit[]): Promise<void> {
  let wait = 0;
  for (const { key, limit, windowS } of limits) {
    const row = await addAttempt(db, key, windowS);
    if (row.failures > limit) wait = Math.max(wait, row.wait_s);
  }
  if (wait > 0)
    throw new AppError('rate-limited', `Too many attempts. Try again in ${inWords(wait)}.`, {
      retryAfterS: wait,
    });
}

/** Takes a counted attempt back: it turned out to be a good one. */
export async function forgiveAttempt(db: Knex, limits: readonly AttemptLimit[]): Promise<void> {
  await db('sign_in_attempt')
    .whereIn(
      'key',
      limits.map(({ key }) => key),
    )
    .where('failures', '>', 0)
    .decrement('failures', 1);
}

export async function deleteOldAttempts(db: Knex): Promise<void> {
  await db('sign_in_attempt').where('window_ends_at', '<', db.fn.now()).delete();
}

async function addAttempt(db: Knex, key: string, windowS: number): Promise<AttemptRow> {
  const { rows } = await db.raw<{ rows: AttemptRow[] }>(
    `INSERT INTO sign_in_attempt AS attempt (key, failures, window_ends_at)
     VALUES (:key, 1, now() + make_interval(secs => :windowS))
     ON CONFLICT (key) DO UPDATE SET
       failures = CASE WHEN attempt.window_ends_at < now() THEN 1 ELSE attempt.failures + 1 END,
       window_ends_at = CASE WHEN attempt.window_ends_at < now() THEN excluded.window_ends_at
         ELSE attempt.window_ends_at END
     RETURNING failures, ceil(extract(epoch FROM window_ends_at - now()))::int AS wait_s`,
    { key, windowS },
  );
  return rows[0] ?? { failures: 0, wait_s: 0 };
}

const inWords = (seconds: number): string =>
  seconds < 90 ? `${seconds} seconds` : `${Math.ceil(seconds / 60)} minutes`;
