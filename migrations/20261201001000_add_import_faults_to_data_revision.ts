import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE data_revision ADD COLUMN import_faults jsonb NOT NULL DEFAULT '[]'
      CONSTRAINT data_revision_import_faults_list CHECK (jsonb_typeof(import_faults) = 'array');
    COMMENT ON COLUMN data_revision.import_faults IS
      'faults of the lines of the source file that were left out, by line';
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`ALTER TABLE data_revision DROP COLUMN import_faults;`);
}
