import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE COLLATION natural_order (provider = icu, locale = 'und-u-kn-true');
    COMMENT ON COLLATION natural_order IS 'numbers in names by their value: V2 before V10';
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`DROP COLLATION natural_order;`);
}
