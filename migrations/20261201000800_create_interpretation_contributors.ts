import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE interpretation_contributor (
      interpretation_id uuid NOT NULL
        CONSTRAINT interpretation_contributor_interpretation_fk REFERENCES interpretation ON DELETE CASCADE,
      user_id uuid NOT NULL CONSTRAINT interpretation_contributor_user_fk REFERENCES app_user,
      PRIMARY KEY (interpretation_id, user_id)
    );
    COMMENT ON TABLE interpretation_contributor IS
      'who created, edited or submitted; none of them decides on it, whatever role they get later';
    CREATE INDEX interpretation_contributor_user_idx ON interpretation_contributor (user_id);
    INSERT INTO interpretation_contributor SELECT id, author_id FROM interpretation;
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`DROP TABLE interpretation_contributor;`);
}
