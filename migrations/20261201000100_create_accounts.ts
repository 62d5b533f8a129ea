import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      RAISE EXCEPTION 'rows of % are never changed or deleted', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
    END $$;

    CREATE TABLE app_user (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      email text NOT NULL CONSTRAINT app_user_email_lower CHECK (email = lower(email)),
      name text NOT NULL,
      password_hash text NOT NULL,
      is_admin boolean NOT NULL DEFAULT false,
      disabled_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT app_user_email_unique UNIQUE (email)
    );

    CREATE TABLE session (
      id text PRIMARY KEY,
      user_id uuid NOT NULL CONSTRAINT session_user_fk REFERENCES app_user ON DELETE CASCADE,
      expires_at timestamptz NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      user_agent text NOT NULL DEFAULT ''
    );
    CREATE INDEX session_user_idx ON session (user_id);

    CREATE TABLE password_reset (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      user_id uuid NOT NULL CONSTRAINT password_reset_user_fk REFERENCES app_user,
      token_hash text NOT NULL CONSTRAINT password_reset_token_unique UNIQUE,
      expires_at timestamptz NOT NULL,
      used_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX password_reset_user_idx ON password_reset (user_id);

    CREATE TABLE sign_in_attempt (
      key text PRIMARY KEY,
      failures integer NOT NULL,
      window_ends_at timestamptz NOT NULL
    );
    COMMENT ON TABLE sign_in_attempt IS 'failed sign-ins counted by address and by account';

    CREATE TABLE audit_event (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      at timestamptz NOT NULL DEFAULT now(),
      actor_id uuid CONSTRAINT audit_event_actor_fk REFERENCES app_user,
      survey_id uuid,
      action text NOT NULL,
      subject text NOT NULL,
      details jsonb NOT NULL DEFAULT '{}'
    );
    CREATE INDEX audit_event_actor_idx ON audit_event (actor_id);
    CREATE INDEX audit_event_survey_idx ON audit_event (survey_id, id);
    CREATE TRIGGER audit_event_immutable BEFORE UPDATE OR DELETE ON audit_event
      FOR EACH ROW EXECUTE FUNCTION refuse_change();

    CREATE TABLE received_mail (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      received_at timestamptz NOT NULL DEFAULT now(),
      sender text NOT NULL,
      recipients text[] NOT NULL,
      subject text NOT NULL,
      text text NOT NULL
    );
    COMMENT ON TABLE received_mail IS 'messages taken by the local mail sink when no MAIL_URL is set';
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TABLE received_mail, audit_event, sign_in_attempt, password_reset, session, app_user;
    DROP FUNCTION refuse_change();
  `);
}
