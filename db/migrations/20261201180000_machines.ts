import type { Knex } from 'knex'

/** Machines with their spindle curves, fixtures, set-ups, and what a shop sets about cutting and measuring. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(machines)
  await knex.raw(fixtures)
  await knex.raw(setUps)
  await knex.raw(settings)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE shop_settings DROP CONSTRAINT shop_settings_stick_out_bands, DROP COLUMN measuring_tolerance_mm,
      DROP COLUMN stick_out_limit_ratio, DROP COLUMN stick_out_caution_ratio, DROP COLUMN radial_force_share;
    ALTER TABLE extensions DROP COLUMN shank_diameter_mm;
    DELETE FROM found_changes WHERE kind = 'fixture';
    ALTER TABLE found_changes DROP CONSTRAINT found_changes_kind_check,
      ADD CONSTRAINT found_changes_kind_check CHECK (kind IN ('cutter', 'holder', 'collet', 'extension'));
    DELETE FROM saved_views WHERE kind = 'fixture';
    ALTER TABLE saved_views DROP CONSTRAINT saved_views_kind_check,
      ADD CONSTRAINT saved_views_kind_check CHECK (kind IN ('cutter', 'holder', 'collet', 'extension'));
    DROP TABLE set_up_fixtures, set_ups, fixtures, machine_spindle_points, machines;
    DROP FUNCTION keep_machine_location(), place_machine();
  `)
}

const positive = (column: string) => `CHECK (${column} > 0 AND ${column} < 'Infinity')`
const notNegative = (column: string) => `CHECK (${column} >= 0 AND ${column} < 'Infinity')`
const length = (column: string) => `${column} double precision ${positive(column)}`
const requiredLength = (column: string) => `${column} double precision NOT NULL ${positive(column)}`
const distance = (column: string) => `${column} double precision ${notNegative(column)}`
const requiredDistance = (column: string) => `${column} double precision NOT NULL ${notNegative(column)}`
const finite = (column: string) =>
  `${column} double precision CHECK (${column} > '-Infinity' AND ${column} < 'Infinity')`

const machines = `
  CREATE TABLE machines (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    code text NOT NULL CHECK (code = btrim(code) AND length(code) BETWEEN 1 AND 100),
    name text NOT NULL CHECK (name = btrim(name) AND length(name) BETWEEN 1 AND 200),
    location_id bigint NOT NULL UNIQUE REFERENCES locations,
    taper text NOT NULL CHECK (taper = btrim(taper) AND length(taper) BETWEEN 1 AND 100),
    ${requiredLength('gauge_line_to_table_mm')},
    ${length('x_travel_mm')},
    ${length('y_travel_mm')},
    ${requiredLength('z_travel_mm')},
    ${length('spindle_nose_diameter_mm')},
    ${length('longest_tool_mm')},
    ${length('widest_tool_mm')},
    heaviest_tool_kg double precision ${positive('heaviest_tool_kg')},
    pocket_count integer CHECK (pocket_count BETWEEN 1 AND 10000),
    minimum_rpm integer CHECK (minimum_rpm > 0),
    maximum_rpm integer NOT NULL CHECK (maximum_rpm > 0),
    efficiency double precision NOT NULL DEFAULT 0.8 CHECK (efficiency > 0 AND efficiency <= 1),
    note text NOT NULL DEFAULT '' CHECK (length(note) <= 10000),
    version integer NOT NULL DEFAULT 1,
    archived_at timestamptz,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now(),
    CONSTRAINT machines_speeds_in_order CHECK (minimum_rpm <= maximum_rpm)
  );
  COMMENT ON COLUMN machines.gauge_line_to_table_mm IS 'with Z at the top of its travel';
  COMMENT ON COLUMN machines.efficiency IS 'what of the motor''s power comes to the cutter';
  CREATE UNIQUE INDEX machines_code_idx ON machines (lower(code));
  CREATE TRIGGER machines_version BEFORE UPDATE ON machines
    FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();

  CREATE TABLE machine_spindle_points (
    machine_id bigint NOT NULL REFERENCES machines ON DELETE CASCADE,
    rpm integer NOT NULL CHECK (rpm > 0),
    power_kw double precision ${positive('power_kw')},
    torque_nm double precision ${positive('torque_nm')},
    PRIMARY KEY (machine_id, rpm),
    CONSTRAINT machine_spindle_points_give_something CHECK (num_nonnulls(power_kw, torque_nm) > 0)
  );

  -- A machine stands where its stock is. One of its code that was there before the machine was entered becomes its own.
  CREATE FUNCTION place_machine() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    SELECT id INTO NEW.location_id FROM locations
      WHERE kind = 'machine' AND lower(code) = lower(NEW.code)
        AND NOT EXISTS (SELECT FROM machines WHERE location_id = locations.id);
    IF NEW.location_id IS NULL THEN
      INSERT INTO locations (kind, code, name) VALUES ('machine', NEW.code, NEW.name) RETURNING id INTO NEW.location_id;
    ELSE
      UPDATE locations SET code = NEW.code, name = NEW.name, archived_at = NULL WHERE id = NEW.location_id;
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER machines_placed BEFORE INSERT ON machines FOR EACH ROW EXECUTE FUNCTION place_machine();

  -- Archiving it is refused while there is stock on it, by the location's own guard.
  CREATE FUNCTION keep_machine_location() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    UPDATE locations SET code = NEW.code, name = NEW.name, archived_at = NEW.archived_at WHERE id = NEW.location_id;
    RETURN NULL;
  END $$;
  CREATE TRIGGER machines_location AFTER UPDATE OF code, name, archived_at ON machines
    FOR EACH ROW EXECUTE FUNCTION keep_machine_location();
`

const fixtures = `
  CREATE TABLE fixtures (
    item_id bigint PRIMARY KEY,
    item_kind text NOT NULL GENERATED ALWAYS AS ('fixture') STORED,
    ${requiredLength('height_mm')},
    FOREIGN KEY (item_id, item_kind) REFERENCES items (id, kind)
  );
  ALTER TABLE saved_views DROP CONSTRAINT saved_views_kind_check,
    ADD CONSTRAINT saved_views_kind_check CHECK (kind IN ('cutter', 'holder', 'collet', 'extension', 'fixture'));
  ALTER TABLE found_changes DROP CONSTRAINT found_changes_kind_check,
    ADD CONSTRAINT found_changes_kind_check CHECK (kind IN ('cutter', 'holder', 'collet', 'extension', 'fixture'));
  CREATE TRIGGER fixtures_added AFTER INSERT ON fixtures REFERENCING NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION raise_item_versions();
  CREATE TRIGGER fixtures_changed AFTER UPDATE ON fixtures REFERENCING OLD TABLE AS old_rows NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION raise_item_versions();
  CREATE TRIGGER fixtures_removed AFTER DELETE ON fixtures REFERENCING OLD TABLE AS old_rows
    FOR EACH STATEMENT EXECUTE FUNCTION raise_item_versions();
`

const setUps = `
  CREATE TABLE set_ups (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    machine_id bigint NOT NULL REFERENCES machines,
    name text NOT NULL CHECK (name = btrim(name) AND length(name) BETWEEN 1 AND 200),
    ${requiredDistance('highest_mm')},
    ${requiredDistance('lowest_tip_mm')},
    ${requiredDistance('retract_clearance_mm')},
    ${length('stock_width_mm')},
    ${length('stock_height_mm')},
    ${finite('stock_offset_x_mm')},
    ${finite('stock_offset_y_mm')},
    ${length('axis_height_mm')},
    ${distance('chuck_radius_mm')},
    ${length('part_diameter_mm')},
    ${distance('centring_error_mm')},
    note text NOT NULL DEFAULT '' CHECK (length(note) <= 10000),
    version integer NOT NULL DEFAULT 1,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now(),
    CONSTRAINT set_ups_rotary_stock_whole CHECK (num_nulls(stock_width_mm, stock_height_mm, axis_height_mm) IN (0, 3)),
    CONSTRAINT set_ups_rotary_details_have_stock CHECK (axis_height_mm IS NOT NULL
      OR num_nonnulls(stock_offset_x_mm, stock_offset_y_mm, chuck_radius_mm, part_diameter_mm, centring_error_mm) = 0)
  );
  COMMENT ON COLUMN set_ups.highest_mm IS 'of part, jaws and clamps; fixtures and rotary stock have their own heights';
  CREATE UNIQUE INDEX set_ups_name_idx ON set_ups (machine_id, lower(name));
  CREATE TRIGGER set_ups_version BEFORE UPDATE ON set_ups
    FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();

  CREATE TABLE set_up_fixtures (
    set_up_id bigint NOT NULL REFERENCES set_ups ON DELETE CASCADE,
    position integer NOT NULL CHECK (position BETWEEN 1 AND 100),
    item_id bigint NOT NULL,
    item_kind text NOT NULL GENERATED ALWAYS AS ('fixture') STORED,
    ${requiredDistance('base_mm')},
    PRIMARY KEY (set_up_id, position),
    FOREIGN KEY (item_id, item_kind) REFERENCES items (id, kind)
  );
  COMMENT ON COLUMN set_up_fixtures.base_mm IS 'height above the table of what it stands on';
  CREATE INDEX set_up_fixtures_item_id_idx ON set_up_fixtures (item_id);
`

const settings = `
  ALTER TABLE extensions ADD COLUMN ${length('shank_diameter_mm')};
  COMMENT ON COLUMN extensions.shank_diameter_mm IS 'what the holder takes; null: not entered, so not checked';

  ALTER TABLE shop_settings
    ADD COLUMN radial_force_share double precision NOT NULL DEFAULT 0.4
      CHECK (radial_force_share >= 0 AND radial_force_share <= 2),
    ADD COLUMN stick_out_caution_ratio double precision NOT NULL DEFAULT 4 ${positive('stick_out_caution_ratio')},
    ADD COLUMN stick_out_limit_ratio double precision NOT NULL DEFAULT 8 ${positive('stick_out_limit_ratio')},
    ADD COLUMN measuring_tolerance_mm double precision NOT NULL DEFAULT 0.05 ${notNegative('measuring_tolerance_mm')},
    ADD CONSTRAINT shop_settings_stick_out_bands CHECK (stick_out_caution_ratio <= stick_out_limit_ratio);
`
