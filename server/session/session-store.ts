import type { Knex } from 'knex';

export async function updateUserName(db: Knex, userId: string, name: string): Promise<void> {
  await db('app_user').where({ id: userId }).update({ name });
}
