import type { Knex } from 'knex';

export interface UserRow {
  id: string;
  email: string;
  name: string;
  password_hash: string;
  is_admin: boolean;
  disabled_at: Date | null;
  created_at: Date;
}

export const findUserByEmail = async (db: Knex, email: string): Promise<UserRow | null> =>
  (await db('app_user').where({ email }).first<UserRow | undefined>()) ?? null;

export const findUser = async (db: Knex, id: string): Promise<UserRow | null> =>
  (await db('app_user').where({ id }).first<UserRow | undefined>()) ?? null;

export async function insertUser(
  trx: Knex,
  user: { email: string; name: string; passwordHash: string },
): Promise<UserRow> {
  const [row] = await trx('app_user')
    .insert({ email: user.email, name: user.name, password_hash: user.passwordHash })
    .returning<UserRow[]>('*');
  if (!row) throw new Error('the new account was not returned');
  return row;
}

/** Sets the password; links sent earlier must not open the account after that. */
export async function setPasswordHash(trx: Knex, userId: string, passwordHash: string): Promise<void> {
  await trx('app_user').where({ id: userId }).update({ password_hash: passwordHash });
  await trx('password_reset')
    .where({ user_id: userId })
    .whereNull('used_at')
    .update({ used_at: trx.fn.now() });
}
