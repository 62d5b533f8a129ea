import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE interpretation (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      sounding_id uuid NOT NULL,
      run_id uuid NOT NULL,
      author_id uuid NOT NULL CONSTRAINT interpretation_author_fk REFERENCES app_user,
      title text NOT NULL,
      narrative text NOT NULL DEFAULT '',
      water_level_depth_m double precision,
      state text NOT NULL DEFAULT 'draft' CONSTRAINT interpretation_state_known
        CHECK (state IN ('draft', 'in-review', 'changes-asked', 'accepted', 'superseded')),
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT interpretation_run_fk FOREIGN KEY (sounding_id, run_id) REFERENCES run (sounding_id, id),
      CONSTRAINT interpretation_sounding_fk FOREIGN KEY (sounding_id) REFERENCES sounding
    );
    CREATE INDEX interpretation_run_idx ON interpretation (sounding_id, run_id);
    CREATE INDEX interpretation_author_idx ON interpretation (author_id);
    CREATE UNIQUE INDEX interpretation_one_accepted ON interpretation (sounding_id) WHERE state = 'accepted';

    CREATE TABLE interpretation_bed (
      interpretation_id uuid NOT NULL
        CONSTRAINT interpretation_bed_interpretation_fk REFERENCES interpretation ON DELETE CASCADE,
      layer_index integer NOT NULL CONSTRAINT interpretation_bed_index_range CHECK (layer_index BETWEEN 0 AND 7),
      ground text NOT NULL DEFAULT '',
      role text NOT NULL DEFAULT 'unknown' CONSTRAINT interpretation_bed_role_known
        CHECK (role IN ('cover', 'aquifer', 'aquitard', 'saline', 'basement', 'unknown')),
      confidence text NOT NULL DEFAULT 'unstated' CONSTRAINT interpretation_bed_confidence_known
        CHECK (confidence IN ('well-supported', 'likely', 'possible', 'unstated')),
      other_candidates text NOT NULL DEFAULT '',
      PRIMARY KEY (interpretation_id, layer_index)
    );

    CREATE TABLE review_event (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      interpretation_id uuid NOT NULL CONSTRAINT review_event_interpretation_fk REFERENCES interpretation,
      kind text NOT NULL CONSTRAINT review_event_kind_known
        CHECK (kind IN ('submitted', 'withdrawn', 'changes-asked', 'accepted', 'superseded', 'commented')),
      actor_id uuid NOT NULL CONSTRAINT review_event_actor_fk REFERENCES app_user,
      at timestamptz NOT NULL DEFAULT now(),
      comment text NOT NULL DEFAULT '',
      snapshot jsonb
    );
    COMMENT ON COLUMN review_event.snapshot IS 'the whole statement as submitted; null for other kinds';
    CREATE INDEX review_event_interpretation_idx ON review_event (interpretation_id, id);
    CREATE INDEX review_event_actor_idx ON review_event (actor_id);
    CREATE TRIGGER review_event_immutable BEFORE UPDATE OR DELETE ON review_event
      FOR EACH ROW EXECUTE FUNCTION refuse_change();
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`DROP TABLE review_event, interpretation_bed, interpretation;`);
}
