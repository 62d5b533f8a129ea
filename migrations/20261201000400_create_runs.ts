import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE computation (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      key text NOT NULL,
      engine_version text NOT NULL,
      input jsonb NOT NULL,
      result jsonb NOT NULL,
      result_hash text NOT NULL,
      duration_ms double precision NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    COMMENT ON COLUMN computation.key IS 'SHA-256 of the canonical engine version, readings, settings and seed';
    CREATE INDEX computation_key_idx ON computation (key, created_at);
    CREATE TRIGGER computation_immutable BEFORE UPDATE OR DELETE ON computation
      FOR EACH ROW EXECUTE FUNCTION refuse_change();

    CREATE TABLE run (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      sounding_id uuid NOT NULL CONSTRAINT run_sounding_fk REFERENCES sounding,
      number integer NOT NULL,
      revision_id uuid NOT NULL,
      input jsonb NOT NULL,
      computation_key text NOT NULL,
      engine_version text NOT NULL,
      recomputes_run_id uuid CONSTRAINT run_recomputes_fk REFERENCES run,
      requested_by uuid NOT NULL CONSTRAINT run_requester_fk REFERENCES app_user,
      requested_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT run_number_unique UNIQUE (sounding_id, number),
      CONSTRAINT run_sounding_id_unique UNIQUE (sounding_id, id),
      CONSTRAINT run_revision_fk FOREIGN KEY (sounding_id, revision_id)
        REFERENCES data_revision (sounding_id, id)
    );
    COMMENT ON COLUMN run.number IS 'shown as a letter: 1 is A';
    COMMENT ON COLUMN run.input IS 'readings as the fit saw them, and the settings with their seed';
    COMMENT ON COLUMN run.recomputes_run_id IS 'set by Compute again: the run this one repeats past the cache';
    CREATE INDEX run_revision_idx ON run (sounding_id, revision_id);
    CREATE INDEX run_recomputes_idx ON run (recomputes_run_id);
    CREATE INDEX run_requester_idx ON run (requested_by);
    CREATE INDEX run_key_idx ON run (computation_key);
    CREATE TRIGGER run_immutable BEFORE UPDATE OR DELETE ON run
      FOR EACH ROW EXECUTE FUNCTION refuse_change();

    CREATE TABLE run_state (
      run_id uuid PRIMARY KEY CONSTRAINT run_state_run_fk REFERENCES run,
      state text NOT NULL CONSTRAINT run_state_known
        CHECK (state IN ('queued', 'running', 'finished', 'failed', 'cancelled')),
      progress double precision NOT NULL DEFAULT 0
        CONSTRAINT run_state_progress_range CHECK (progress >= 0 AND progress <= 1),
      progress_text text NOT NULL DEFAULT '',
      attempt integer NOT NULL DEFAULT 0,
      worker_id text,
      started_at timestamptz,
      ended_at timestamptz,
      from_cache boolean NOT NULL DEFAULT false,
      computation_id uuid CONSTRAINT run_state_computation_fk REFERENCES computation,
      comparison jsonb,
      error_message text,
      CONSTRAINT run_state_finished_has_computation CHECK ((state = 'finished') = (computation_id IS NOT NULL)),
      CONSTRAINT run_state_ended CHECK ((state IN ('finished', 'failed', 'cancelled')) = (ended_at IS NOT NULL))
    );
    COMMENT ON COLUMN run_state.comparison IS 'verdict and differences of Compute again';
    CREATE INDEX run_state_computation_idx ON run_state (computation_id);
    CREATE INDEX run_state_open_idx ON run_state (state) WHERE state IN ('queued', 'running');

    CREATE TABLE run_note (
      run_id uuid PRIMARY KEY CONSTRAINT run_note_run_fk REFERENCES run,
      label text NOT NULL DEFAULT '',
      note text NOT NULL DEFAULT '',
      pinned boolean NOT NULL DEFAULT false,
      version integer NOT NULL DEFAULT 1
    );

    CREATE TABLE worker_heartbeat (
      worker_id text PRIMARY KEY,
      host text NOT NULL,
      seen_at timestamptz NOT NULL DEFAULT now()
    );
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`DROP TABLE worker_heartbeat, run_note, run_state, run, computation;`);
}
