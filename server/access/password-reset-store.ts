import type { Knex } from 'knex';

export async function insertReset(
  db: Knex,
  reset: { userId: string; tokenHash: string; lifeS: number },
): Promise<void> {
  await db('password_reset').insert({
    user_id: reset.userId,
    token_hash: reset.tokenHash,
    expires_at: db.raw('now() + make_interval(secs => ?)', [reset.lifeS]),
  });
}

const openReset = (db: Knex, tokenHash: string): Knex.QueryBuilder =>
  db('password_reset')
    .where({ token_hash: tokenHash })
    .whereNull('used_at')
    .where('expires_at', '>', db.fn.now())
    .whereIn('user_id', db('app_user').whereNull('disabled_at').select('id'));

export const findOpenReset = async (db: Knex, tokenHash: string): Promise<{ user_id: string } | null> =>
  (await openReset(db, tokenHash).first<{ user_id: string } | undefined>('user_id')) ?? null;

/** Spends the link and tells whose it was; null when someone was faster. */
export async function useReset(trx: Knex, tokenHash: string): Promise<{ id: string; email: string } | null> {
  const [used] = await openReset(trx, tokenHash)
    .update({ used_at: trx.fn.now() })
    .returning<{ user_id: string }[]>('user_id');
  if (!used) return null;
  const user = await trx('app_user')
    .where({ id: used.user_id })
    .first<{ id: string; email: string } | undefined>('id', 'email');
  return user ?? null;
}
