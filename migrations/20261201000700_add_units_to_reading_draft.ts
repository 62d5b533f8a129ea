import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE reading_draft ADD COLUMN units jsonb NOT NULL DEFAULT
      '{"length":"m","voltage":"mV","current":"mA","resistivity":"ohm-m","standardError":"percent"}';
    ALTER TABLE reading_draft ALTER COLUMN units DROP DEFAULT;
    COMMENT ON COLUMN reading_draft.units IS 'units that the cells are written in';
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`ALTER TABLE reading_draft DROP COLUMN units;`);
}
