import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE review_event DROP CONSTRAINT review_event_kind_known;
    ALTER TABLE review_event ADD CONSTRAINT review_event_kind_known
      CHECK (kind IN ('submitted', 'withdrawn', 'changes-asked', 'accepted', 'superseded', 'commented', 'edited'));
  `);
}

// history is never deleted: edits that are there already stay, and only new ones are refused
export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE review_event DROP CONSTRAINT review_event_kind_known;
    ALTER TABLE review_event ADD CONSTRAINT review_event_kind_known
      CHECK (kind IN ('submitted', 'withdrawn', 'changes-asked', 'accepted', 'superseded', 'commented')) NOT VALID;
  `);
}
