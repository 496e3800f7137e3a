import type { Knex } from 'knex'

/** Cribs, people and how they sign in, the shop's settings, and what is written down about all of it. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(sharedFunctions)
  await knex.raw(cribsAndUsers)
  await knex.raw(signingIn)
  await knex.raw(shopSettings)
  await knex.raw(records)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TABLE audit_entries, idempotency_keys, shop_settings, sign_in_attempts, sessions, user_tokens,
      crib_members, users, cribs;
    DROP FUNCTION refuse_unknown_time_zone(), refuse_change(), refuse_direct_change(), raise_version();
  `)
}

const sharedFunctions = `
  CREATE FUNCTION raise_version() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    NEW.version := OLD.version + 1;
    NEW.updated_at := now();
    RETURN NEW;
  END $$;

  -- LL001: the table is only ever added to.
  CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    RAISE EXCEPTION '% is append-only', TG_TABLE_NAME
      USING ERRCODE = 'LL001', TABLE = TG_TABLE_NAME, CONSTRAINT = TG_NAME;
  END $$;

  -- LL002: the table is written by triggers alone. A direct statement runs this at depth 1, one made inside
  -- another trigger at 2 or more.
  CREATE FUNCTION refuse_direct_change() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF pg_trigger_depth() < 2 THEN
      RAISE EXCEPTION '% is written only by the database itself', TG_TABLE_NAME
        USING ERRCODE = 'LL002', TABLE = TG_TABLE_NAME, CONSTRAINT = TG_NAME;
    END IF;
    RETURN NULL;
  END $$;
`

const cribsAndUsers = `
  CREATE TABLE cribs (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    code text NOT NULL CHECK (code = btrim(code) AND length(code) BETWEEN 1 AND 100),
    name text NOT NULL CHECK (length(btrim(name)) BETWEEN 1 AND 200),
    time_zone text NOT NULL,
    version integer NOT NULL DEFAULT 1,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now()
  );
  CREATE UNIQUE INDEX cribs_code_idx ON cribs (lower(code));

  -- Raises 22023 for a time zone PostgreSQL does not know.
  CREATE FUNCTION refuse_unknown_time_zone() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    PERFORM now() AT TIME ZONE NEW.time_zone;
    RETURN NEW;
  END $$;
  CREATE TRIGGER cribs_time_zone BEFORE INSERT OR UPDATE OF time_zone ON cribs
    FOR EACH ROW EXECUTE FUNCTION refuse_unknown_time_zone();
  CREATE TRIGGER cribs_version BEFORE UPDATE ON cribs
    FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();

  CREATE TABLE users (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    email text NOT NULL CHECK (email = btrim(email) AND length(email) BETWEEN 3 AND 254),
    name text NOT NULL CHECK (length(btrim(name)) BETWEEN 1 AND 200),
    role text NOT NULL CHECK (role IN ('machinist', 'estimator', 'crib_manager', 'admin')),
    password_hash text,
    length_unit text CHECK (length_unit IN ('mm', 'in')),
    home_crib_id bigint REFERENCES cribs,
    is_active boolean NOT NULL DEFAULT true,
    version integer NOT NULL DEFAULT 1,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now()
  );
  COMMENT ON COLUMN users.password_hash IS 'null until the invitation is accepted';
  COMMENT ON COLUMN users.length_unit IS 'null: as the shop';
  CREATE UNIQUE INDEX users_email_idx ON users (lower(email));
  CREATE TRIGGER users_version BEFORE UPDATE ON users
    FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();

  CREATE TABLE crib_members (
    crib_id bigint NOT NULL REFERENCES cribs ON DELETE CASCADE,
    user_id bigint NOT NULL REFERENCES users ON DELETE CASCADE,
    created_at timestamptz NOT NULL DEFAULT now(),
    PRIMARY KEY (crib_id, user_id)
  );
  CREATE INDEX crib_members_user_id_idx ON crib_members (user_id);
`

const signingIn = `
  CREATE TABLE user_tokens (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    purpose text NOT NULL CHECK (purpose IN ('setup', 'invitation', 'password_reset')),
    user_id bigint REFERENCES users ON DELETE CASCADE,
    token_hash text NOT NULL UNIQUE,
    expires_at timestamptz NOT NULL,
    used_at timestamptz,
    created_by bigint REFERENCES users,
    created_at timestamptz NOT NULL DEFAULT now(),
    CONSTRAINT user_tokens_setup_has_no_user CHECK ((purpose = 'setup') = (user_id IS NULL))
  );
  CREATE INDEX user_tokens_user_id_idx ON user_tokens (user_id);

  CREATE TABLE sessions (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    token_hash text NOT NULL UNIQUE,
    user_id bigint NOT NULL REFERENCES users ON DELETE CASCADE,
    user_agent text,
    created_at timestamptz NOT NULL DEFAULT now(),
    last_seen_at timestamptz NOT NULL DEFAULT now(),
    expires_at timestamptz NOT NULL,
    ended_at timestamptz
  );
  CREATE INDEX sessions_user_id_idx ON sessions (user_id);
  CREATE INDEX sessions_expires_at_idx ON sessions (expires_at);

  -- The e-mail as typed in, lower case, so that tries at accounts that do not exist are counted too.
  CREATE TABLE sign_in_attempts (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    email text NOT NULL CHECK (email = lower(email)),
    address text NOT NULL,
    succeeded boolean NOT NULL,
    attempted_at timestamptz NOT NULL DEFAULT now()
  );
  CREATE INDEX sign_in_attempts_email_attempted_at_idx ON sign_in_attempts (email, attempted_at) WHERE NOT succeeded;
  CREATE INDEX sign_in_attempts_address_attempted_at_idx ON sign_in_attempts (address, attempted_at) WHERE NOT succeeded;
  CREATE INDEX sign_in_attempts_attempted_at_idx ON sign_in_attempts (attempted_at);
`

const notNegative = (column: string) => `CHECK (${column} >= 0 AND ${column} < 'Infinity')`
const positive = (column: string) => `CHECK (${column} > 0 AND ${column} < 'Infinity')`

const shopSettings = `
  CREATE TABLE shop_settings (
    id integer PRIMARY KEY DEFAULT 1 CHECK (id = 1),
    shop_name text NOT NULL DEFAULT '' CHECK (length(shop_name) <= 200),
    currency text NOT NULL DEFAULT 'EUR' CHECK (currency ~ '^[A-Z]{3}$'),
    length_unit text NOT NULL DEFAULT 'mm' CHECK (length_unit IN ('mm', 'in')),
    decimal_comma boolean NOT NULL DEFAULT false,
    shank_clearance_mm double precision NOT NULL DEFAULT 0.025 ${notNegative('shank_clearance_mm')},
    holder_clearance_mm double precision NOT NULL DEFAULT 0.5 ${notNegative('holder_clearance_mm')},
    stick_out_step_mm double precision NOT NULL DEFAULT 0.5 ${positive('stick_out_step_mm')},
    flute_to_grip_mm double precision NOT NULL DEFAULT 1 ${notNegative('flute_to_grip_mm')},
    hole_tolerance_mm double precision NOT NULL DEFAULT 0.1 ${notNegative('hole_tolerance_mm')},
    drill_chip_room_diameters double precision NOT NULL DEFAULT 1.5 ${notNegative('drill_chip_room_diameters')},
    flute_stiffness_ratio double precision NOT NULL DEFAULT 0.8
      CHECK (flute_stiffness_ratio > 0 AND flute_stiffness_ratio <= 1),
    carbide_modulus_gpa double precision NOT NULL DEFAULT 580 ${positive('carbide_modulus_gpa')},
    steel_modulus_gpa double precision NOT NULL DEFAULT 210 ${positive('steel_modulus_gpa')},
    setup_completed_at timestamptz,
    demo_loaded_at timestamptz,
    version integer NOT NULL DEFAULT 1,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now()
  );
  INSERT INTO shop_settings DEFAULT VALUES;
  CREATE TRIGGER shop_settings_version BEFORE UPDATE ON shop_settings
    FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();
  CREATE TRIGGER shop_settings_stays BEFORE DELETE OR TRUNCATE ON shop_settings
    FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
`

const records = `
  -- Written in the transaction of the call it belongs to; a second call with the key waits for the first one's end.
  CREATE TABLE idempotency_keys (
    actor_id bigint NOT NULL REFERENCES users,
    route text NOT NULL,
    key text NOT NULL CHECK (length(key) BETWEEN 1 AND 255),
    body_hash text NOT NULL,
    status integer CHECK (status BETWEEN 200 AND 299),
    answer jsonb,
    created_at timestamptz NOT NULL DEFAULT now(),
    PRIMARY KEY (actor_id, route, key)
  );
  CREATE INDEX idempotency_keys_created_at_idx ON idempotency_keys (created_at);

  CREATE TABLE audit_entries (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    actor_id bigint REFERENCES users,
    action text NOT NULL CHECK (action <> ''),
    entity text NOT NULL CHECK (entity <> ''),
    entity_id text,
    before jsonb,
    after jsonb,
    request_id text,
    recorded_at timestamptz NOT NULL DEFAULT now()
  );
  COMMENT ON COLUMN audit_entries.actor_id IS 'null: the program itself';
  CREATE INDEX audit_entries_entity_entity_id_idx ON audit_entries (entity, entity_id, id);
  CREATE INDEX audit_entries_actor_id_idx ON audit_entries (actor_id, id);
  CREATE INDEX audit_entries_recorded_at_idx ON audit_entries (recorded_at);
  CREATE TRIGGER audit_entries_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON audit_entries
    FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
`
