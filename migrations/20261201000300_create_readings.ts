import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE reading_draft (
      sounding_id uuid NOT NULL CONSTRAINT reading_draft_sounding_fk REFERENCES sounding,
      user_id uuid NOT NULL CONSTRAINT reading_draft_user_fk REFERENCES app_user,
      base_revision_id uuid,
      rows jsonb NOT NULL,
      updated_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (sounding_id, user_id)
    );
    COMMENT ON TABLE reading_draft IS 'keystrokes of one person in one Field sheet, until Save';
    CREATE INDEX reading_draft_user_idx ON reading_draft (user_id);

    CREATE TABLE source_file (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      sounding_id uuid NOT NULL CONSTRAINT source_file_sounding_fk REFERENCES sounding,
      name text NOT NULL,
      sha256 text NOT NULL,
      bytes bytea NOT NULL,
      uploaded_by uuid NOT NULL CONSTRAINT source_file_user_fk REFERENCES app_user,
      uploaded_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX source_file_sounding_idx ON source_file (sounding_id);
    CREATE INDEX source_file_user_idx ON source_file (uploaded_by);

    CREATE TABLE data_revision (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      sounding_id uuid NOT NULL CONSTRAINT data_revision_sounding_fk REFERENCES sounding,
      number integer NOT NULL,
      content_hash text NOT NULL,
      readings jsonb NOT NULL,
      source_file_id uuid CONSTRAINT data_revision_source_file_fk REFERENCES source_file,
      author_id uuid NOT NULL CONSTRAINT data_revision_author_fk REFERENCES app_user,
      created_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT data_revision_number_unique UNIQUE (sounding_id, number),
      CONSTRAINT data_revision_content_unique UNIQUE (sounding_id, content_hash),
      CONSTRAINT data_revision_sounding_id_unique UNIQUE (sounding_id, id)
    );
    COMMENT ON COLUMN data_revision.content_hash IS 'SHA-256 of the canonical JSON of the readings';
    CREATE INDEX data_revision_source_file_idx ON data_revision (source_file_id);
    CREATE INDEX data_revision_author_idx ON data_revision (author_id);
    CREATE TRIGGER data_revision_immutable BEFORE UPDATE OR DELETE ON data_revision
      FOR EACH ROW EXECUTE FUNCTION refuse_change();
    CREATE TRIGGER source_file_immutable BEFORE UPDATE OR DELETE ON source_file
      FOR EACH ROW EXECUTE FUNCTION refuse_change();

    ALTER TABLE reading_draft ADD CONSTRAINT reading_draft_base_fk
      FOREIGN KEY (sounding_id, base_revision_id) REFERENCES data_revision (sounding_id, id);
    CREATE INDEX reading_draft_base_idx ON reading_draft (sounding_id, base_revision_id);

    ALTER TABLE sounding ADD COLUMN current_revision_id uuid,
      ADD CONSTRAINT sounding_current_revision_fk
        FOREIGN KEY (id, current_revision_id) REFERENCES data_revision (sounding_id, id);
    COMMENT ON COLUMN sounding.current_revision_id IS 'saving the content of an older revision makes that one current again';
    CREATE INDEX sounding_current_revision_idx ON sounding (current_revision_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE sounding DROP COLUMN current_revision_id;
    DROP TABLE reading_draft, data_revision, source_file;
  `);
}
