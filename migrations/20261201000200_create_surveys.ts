import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE survey (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      name text NOT NULL,
      description text NOT NULL DEFAULT '',
      grid text NOT NULL DEFAULT '',
      epsg_code integer,
      error_floor double precision NOT NULL DEFAULT 0.03
        CONSTRAINT survey_error_floor_range CHECK (error_floor > 0 AND error_floor <= 0.5),
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    COMMENT ON COLUMN survey.grid IS 'name of the grid that x_m and y_m are in';
    COMMENT ON COLUMN survey.error_floor IS 'relative error added in quadrature to each reading''s own';

    CREATE TABLE survey_member (
      survey_id uuid NOT NULL CONSTRAINT survey_member_survey_fk REFERENCES survey,
      user_id uuid NOT NULL CONSTRAINT survey_member_user_fk REFERENCES app_user,
      role text NOT NULL CONSTRAINT survey_member_role_known
        CHECK (role IN ('lead', 'geophysicist', 'hydrogeologist', 'analyst', 'guest')),
      joined_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (survey_id, user_id)
    );
    CREATE INDEX survey_member_user_idx ON survey_member (user_id);

    CREATE TABLE invitation (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      email text NOT NULL CONSTRAINT invitation_email_lower CHECK (email = lower(email)),
      survey_id uuid NOT NULL CONSTRAINT invitation_survey_fk REFERENCES survey,
      role text NOT NULL CONSTRAINT invitation_role_known
        CHECK (role IN ('lead', 'geophysicist', 'hydrogeologist', 'analyst', 'guest')),
      token_hash text NOT NULL CONSTRAINT invitation_token_unique UNIQUE,
      invited_by uuid NOT NULL CONSTRAINT invitation_inviter_fk REFERENCES app_user,
      created_at timestamptz NOT NULL DEFAULT now(),
      expires_at timestamptz NOT NULL,
      accepted_at timestamptz,
      revoked_at timestamptz
    );
    CREATE INDEX invitation_survey_idx ON invitation (survey_id);
    CREATE INDEX invitation_inviter_idx ON invitation (invited_by);

    CREATE TABLE line (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      survey_id uuid NOT NULL CONSTRAINT line_survey_fk REFERENCES survey,
      name text NOT NULL,
      version integer NOT NULL DEFAULT 1,
      CONSTRAINT line_name_unique UNIQUE (survey_id, name),
      CONSTRAINT line_survey_id_unique UNIQUE (survey_id, id)
    );

    CREATE TABLE sounding (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      survey_id uuid NOT NULL CONSTRAINT sounding_survey_fk REFERENCES survey,
      line_id uuid,
      name text NOT NULL,
      spread_type text NOT NULL CONSTRAINT sounding_spread_type_known CHECK (spread_type IN
        ('schlumberger', 'half-schlumberger', 'wenner', 'pole-pole', 'dipole-dipole', 'electrodes')),
      x_m double precision,
      y_m double precision,
      elevation_m double precision,
      elevation_datum text NOT NULL DEFAULT '',
      azimuth_deg double precision
        CONSTRAINT sounding_azimuth_range CHECK (azimuth_deg >= 0 AND azimuth_deg < 360),
      measured_on date,
      crew text NOT NULL DEFAULT '',
      instrument text NOT NULL DEFAULT '',
      note text NOT NULL DEFAULT '',
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT sounding_name_unique UNIQUE (survey_id, name),
      CONSTRAINT sounding_line_fk FOREIGN KEY (survey_id, line_id) REFERENCES line (survey_id, id)
    );
    CREATE INDEX sounding_line_idx ON sounding (survey_id, line_id);

    CREATE TABLE borehole (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      survey_id uuid NOT NULL CONSTRAINT borehole_survey_fk REFERENCES survey,
      name text NOT NULL,
      x_m double precision,
      y_m double precision,
      elevation_m double precision,
      depth_m double precision NOT NULL CONSTRAINT borehole_depth_positive CHECK (depth_m > 0),
      drilled_on date,
      note text NOT NULL DEFAULT '',
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT borehole_name_unique UNIQUE (survey_id, name)
    );

    CREATE TABLE borehole_interval (
      borehole_id uuid NOT NULL CONSTRAINT borehole_interval_borehole_fk REFERENCES borehole ON DELETE CASCADE,
      position integer NOT NULL,
      top_m double precision NOT NULL,
      base_m double precision NOT NULL,
      description text NOT NULL,
      PRIMARY KEY (borehole_id, position),
      CONSTRAINT borehole_interval_order CHECK (top_m >= 0 AND base_m > top_m)
    );

    CREATE TABLE water_level (
      borehole_id uuid NOT NULL CONSTRAINT water_level_borehole_fk REFERENCES borehole ON DELETE CASCADE,
      measured_on date NOT NULL,
      depth_m double precision NOT NULL,
      PRIMARY KEY (borehole_id, measured_on)
    );
    COMMENT ON COLUMN water_level.depth_m IS 'below ground; negative where the water stands above ground';
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TABLE water_level, borehole_interval, borehole, sounding, line, invitation, survey_member, survey;
  `);
}
