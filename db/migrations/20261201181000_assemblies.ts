import type { Knex } from 'knex'

/**
 * Numbered assemblies: what they are made of, what was asked of them when they were kept, what was measured on them, and
 * what no longer holds. Whatever could make one wrong writes, in its own transaction, that it is to be looked at again.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(assemblies)
  await knex.raw(records)
  await knex.raw(rules)
  await knex.raw(rechecks)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER items_recheck_assemblies ON items;
    DROP TRIGGER pieces_recheck_assemblies ON pieces;
    DROP TRIGGER movements_recheck_assemblies ON movements;
    DROP TRIGGER shop_settings_recheck_assemblies ON shop_settings;
    DROP TABLE assembly_rechecks, assembly_findings, assembly_measurements, assembly_checks;
    ALTER TABLE assemblies DROP CONSTRAINT assemblies_has_cutter, DROP CONSTRAINT assemblies_has_holder;
    DROP TABLE assembly_parts, assemblies;
    DROP SEQUENCE assembly_numbers;
    DROP FUNCTION check_assembly_state(), check_assembly_pocket(), keep_assembly_part(), check_assembly_whole(), recheck_assemblies_of_items(),
      recheck_assemblies_of_piece(), recheck_assemblies_of_movements(), recheck_all_assemblies();
  `)
}

const positive = (column: string) => `CHECK (${column} > 0 AND ${column} < 'Infinity')`

const assemblies = `
  CREATE SEQUENCE assembly_numbers AS integer;

  -- The kinds are columns so that the foreign keys below can say: every assembly has a cutter and a holder.
  CREATE TABLE assemblies (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    number integer NOT NULL UNIQUE DEFAULT nextval('assembly_numbers') CHECK (number > 0),
    name text NOT NULL DEFAULT '' CHECK (name = btrim(name) AND length(name) <= 200),
    note text NOT NULL DEFAULT '' CHECK (length(note) <= 10000),
    cutter_kind text NOT NULL GENERATED ALWAYS AS ('cutter') STORED,
    holder_kind text NOT NULL GENERATED ALWAYS AS ('holder') STORED,
    stick_out_mm double precision NOT NULL ${positive('stick_out_mm')},
    gauge_length_mm double precision NOT NULL ${positive('gauge_length_mm')},
    tool_number integer CHECK (tool_number BETWEEN 1 AND 99999999),
    length_offset_number integer CHECK (length_offset_number BETWEEN 1 AND 99999999),
    diameter_offset_number integer CHECK (diameter_offset_number BETWEEN 1 AND 99999999),
    machine_id bigint REFERENCES machines,
    pocket integer CHECK (pocket > 0),
    state text NOT NULL DEFAULT 'planned' CHECK (state IN ('planned', 'built', 'broken_down')),
    stick_out_set_at timestamptz NOT NULL DEFAULT now(),
    built_at timestamptz,
    broken_down_at timestamptz,
    created_by bigint NOT NULL REFERENCES users,
    version integer NOT NULL DEFAULT 1,
    archived_at timestamptz,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now(),
    CONSTRAINT assemblies_built_once_built CHECK ((state = 'planned') = (built_at IS NULL)),
    CONSTRAINT assemblies_broken_down_at CHECK ((state = 'broken_down') = (broken_down_at IS NOT NULL)),
    CONSTRAINT assemblies_in_machine_when_built CHECK (machine_id IS NULL OR state = 'built'),
    CONSTRAINT assemblies_pocket_of_machine CHECK (pocket IS NULL OR machine_id IS NOT NULL),
    CONSTRAINT assemblies_archived_not_built CHECK (archived_at IS NULL OR state <> 'built')
  );
  COMMENT ON COLUMN assemblies.gauge_length_mm IS 'gauge line to tip to be expected at the stick-out, with the sizes taken over';
  COMMENT ON COLUMN assemblies.stick_out_set_at IS 'the last time it was built or its stick-out changed: what was measured before is of the past';
  COMMENT ON COLUMN assemblies.built_at IS 'the last time it was built';
  COMMENT ON COLUMN assemblies.pocket IS 'of the magazine; null: at the machine, in none of its pockets';
  CREATE UNIQUE INDEX assemblies_one_of_pocket_idx ON assemblies (machine_id, pocket) WHERE pocket IS NOT NULL;
  CREATE UNIQUE INDEX assemblies_one_of_tool_number_idx ON assemblies (machine_id, tool_number)
    WHERE machine_id IS NOT NULL AND tool_number IS NOT NULL;
  CREATE INDEX assemblies_machine_id_idx ON assemblies (machine_id);
  CREATE INDEX assemblies_state_number_idx ON assemblies (state, number) WHERE archived_at IS NULL;
  CREATE INDEX assemblies_created_by_idx ON assemblies (created_by);

  CREATE TABLE assembly_parts (
    assembly_id bigint NOT NULL REFERENCES assemblies,
    kind text NOT NULL CHECK (kind IN ('cutter', 'collet', 'extension', 'extension_collet', 'holder')),
    item_id bigint NOT NULL,
    item_kind text NOT NULL GENERATED ALWAYS AS (CASE kind WHEN 'extension_collet' THEN 'collet' ELSE kind END) STORED,
    piece_id bigint,
    geometry jsonb NOT NULL,
    home_location_id bigint REFERENCES locations,
    location_id bigint REFERENCES locations,
    condition text CHECK (condition IN ('new', 'used', 'reground', 'worn')),
    PRIMARY KEY (assembly_id, kind),
    CONSTRAINT assembly_parts_item_of_kind FOREIGN KEY (item_id, item_kind) REFERENCES items (id, kind),
    CONSTRAINT assembly_parts_piece_of_item FOREIGN KEY (piece_id, item_id) REFERENCES pieces (id, item_id),
    CONSTRAINT assembly_parts_placed_whole CHECK (num_nulls(home_location_id, location_id, condition) IN (0, 3))
  );
  COMMENT ON COLUMN assembly_parts.kind IS 'the collet holds the cutter; the extension''s, its own shank in the holder';
  COMMENT ON COLUMN assembly_parts.geometry IS 'the sizes stick-out, gauge length and checks go by: those taken over last';
  COMMENT ON COLUMN assembly_parts.location_id IS 'where it is while the assembly is built; null otherwise';
  COMMENT ON COLUMN assembly_parts.home_location_id IS 'the bin it was taken from';
  CREATE INDEX assembly_parts_item_id_location_id_idx ON assembly_parts (item_id, location_id);
  CREATE INDEX assembly_parts_home_location_id_idx ON assembly_parts (home_location_id);
  CREATE INDEX assembly_parts_location_id_idx ON assembly_parts (location_id);
  CREATE INDEX assembly_parts_piece_id_idx ON assembly_parts (piece_id);
  CREATE UNIQUE INDEX assembly_parts_one_place_of_piece_idx ON assembly_parts (piece_id) WHERE location_id IS NOT NULL;

  ALTER TABLE assemblies
    ADD CONSTRAINT assemblies_has_cutter FOREIGN KEY (id, cutter_kind)
      REFERENCES assembly_parts (assembly_id, kind) DEFERRABLE INITIALLY DEFERRED,
    ADD CONSTRAINT assemblies_has_holder FOREIGN KEY (id, holder_kind)
      REFERENCES assembly_parts (assembly_id, kind) DEFERRABLE INITIALLY DEFERRED;
`

const records = `
  CREATE TABLE assembly_checks (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    assembly_id bigint NOT NULL REFERENCES assemblies,
    feature jsonb NOT NULL,
    clearances jsonb,
    kept_answer jsonb NOT NULL,
    answer jsonb,
    holds boolean NOT NULL DEFAULT true,
    checked_at timestamptz NOT NULL DEFAULT now(),
    created_by bigint NOT NULL REFERENCES users,
    created_at timestamptz NOT NULL DEFAULT now(),
    UNIQUE (id, assembly_id)
  );
  COMMENT ON COLUMN assembly_checks.clearances IS 'as asked; null: the shop''s own, whatever they are';
  COMMENT ON COLUMN assembly_checks.kept_answer IS 'what was answered when it was kept';
  COMMENT ON COLUMN assembly_checks.answer IS 'what was answered last; null where the sizes make no tool that could be checked';
  CREATE INDEX assembly_checks_assembly_id_idx ON assembly_checks (assembly_id);
  CREATE INDEX assembly_checks_created_by_idx ON assembly_checks (created_by);

  CREATE TABLE assembly_measurements (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    assembly_id bigint NOT NULL REFERENCES assemblies,
    gauge_length_mm double precision NOT NULL ${positive('gauge_length_mm')},
    diameter_mm double precision ${positive('diameter_mm')},
    expected_gauge_length_mm double precision NOT NULL,
    expected_diameter_mm double precision NOT NULL,
    source text NOT NULL CHECK (source IN ('by_hand', 'presetter')),
    actor_id bigint NOT NULL REFERENCES users,
    measured_at timestamptz NOT NULL DEFAULT now()
  );
  COMMENT ON COLUMN assembly_measurements.expected_gauge_length_mm IS 'what was calculated when it was measured';
  CREATE INDEX assembly_measurements_assembly_id_idx ON assembly_measurements (assembly_id, id);
  CREATE INDEX assembly_measurements_actor_id_idx ON assembly_measurements (actor_id);
  CREATE TRIGGER assembly_measurements_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON assembly_measurements
    FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();

  CREATE TABLE assembly_findings (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    assembly_id bigint NOT NULL REFERENCES assemblies,
    key text NOT NULL,
    code text NOT NULL CHECK (code IN ('sizes_changed', 'offset_changed', 'check_fails',
      'check_fails_as_measured', 'check_impossible', 'part_gone', 'part_archived')),
    check_id bigint,
    is_fault boolean NOT NULL,
    detail jsonb NOT NULL,
    movement_id bigint REFERENCES movements,
    found_at timestamptz NOT NULL DEFAULT now(),
    resolved_at timestamptz,
    CONSTRAINT assembly_findings_check_of_assembly FOREIGN KEY (check_id, assembly_id)
      REFERENCES assembly_checks (id, assembly_id)
  );
  COMMENT ON COLUMN assembly_findings.key IS 'what it is about: found again, it is the same finding';
  COMMENT ON COLUMN assembly_findings.movement_id IS 'what took a part away, where that is what happened';
  COMMENT ON COLUMN assembly_findings.is_fault IS 'something no longer holds; otherwise what changed and still holds';
  CREATE UNIQUE INDEX assembly_findings_one_open_idx ON assembly_findings (assembly_id, key) WHERE resolved_at IS NULL;
  CREATE INDEX assembly_findings_assembly_id_idx ON assembly_findings (assembly_id, id);
  CREATE INDEX assembly_findings_check_id_idx ON assembly_findings (check_id);
  CREATE INDEX assembly_findings_movement_id_idx ON assembly_findings (movement_id);

  CREATE TABLE assembly_rechecks (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    assembly_id bigint NOT NULL REFERENCES assemblies,
    movement_id bigint REFERENCES movements,
    requested_at timestamptz NOT NULL DEFAULT now()
  );
  COMMENT ON TABLE assembly_rechecks IS 'what is to be looked at again; the worker takes a row away when it has';
  CREATE INDEX assembly_rechecks_assembly_id_idx ON assembly_rechecks (assembly_id);
  CREATE INDEX assembly_rechecks_movement_id_idx ON assembly_rechecks (movement_id);
`

/**
 * LL019: an assembly is planned, built, broken down and built again; its parts stay what they are; a machine has the
 * pockets it has; built, each has a
 * place, all of them the same, in hands or on a machine; otherwise none has. The last is asked at the commit, since the
 * assembly and its parts change one after the other.
 */
const rules = `
  -- Named one by one, since a generated column has no value yet before the update.
  CREATE TRIGGER assemblies_version BEFORE UPDATE ON assemblies
    FOR EACH ROW WHEN (
      (OLD.number, OLD.name, OLD.note, OLD.stick_out_mm, OLD.gauge_length_mm, OLD.tool_number, OLD.length_offset_number,
        OLD.diameter_offset_number, OLD.machine_id, OLD.pocket, OLD.state, OLD.built_at, OLD.broken_down_at, OLD.archived_at)
      IS DISTINCT FROM
      (NEW.number, NEW.name, NEW.note, NEW.stick_out_mm, NEW.gauge_length_mm, NEW.tool_number, NEW.length_offset_number,
        NEW.diameter_offset_number, NEW.machine_id, NEW.pocket, NEW.state, NEW.built_at, NEW.broken_down_at, NEW.archived_at))
    EXECUTE FUNCTION raise_version();

  CREATE FUNCTION check_assembly_state() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF (TG_OP = 'INSERT' AND NEW.state <> 'planned')
      OR (TG_OP = 'UPDATE' AND NEW.state <> OLD.state
        AND (OLD.state, NEW.state) NOT IN (('planned', 'built'), ('built', 'broken_down'), ('broken_down', 'built'))) THEN
      RAISE EXCEPTION 'assembly % cannot become % now', NEW.number, NEW.state USING
        ERRCODE = 'LL019', TABLE = 'assemblies', CONSTRAINT = 'assemblies_states_in_order';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER assemblies_state BEFORE INSERT OR UPDATE OF state ON assemblies
    FOR EACH ROW EXECUTE FUNCTION check_assembly_state();

  CREATE FUNCTION check_assembly_pocket() RETURNS trigger LANGUAGE plpgsql AS $$
  DECLARE
    pockets integer;
  BEGIN
    SELECT pocket_count INTO pockets FROM machines WHERE id = NEW.machine_id;
    IF NEW.pocket > pockets THEN
      RAISE EXCEPTION 'there are % pockets, no %', pockets, NEW.pocket USING
        ERRCODE = 'LL019', TABLE = 'assemblies', CONSTRAINT = 'assemblies_pocket_there';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER assemblies_pocket BEFORE INSERT OR UPDATE OF machine_id, pocket ON assemblies
    FOR EACH ROW WHEN (NEW.pocket IS NOT NULL) EXECUTE FUNCTION check_assembly_pocket();

  CREATE FUNCTION keep_assembly_part() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    RAISE EXCEPTION 'an assembly keeps its parts: another part makes another assembly' USING
      ERRCODE = 'LL019', TABLE = 'assembly_parts', CONSTRAINT = 'assembly_parts_stay';
  END $$;
  CREATE TRIGGER assembly_parts_stay BEFORE UPDATE ON assembly_parts
    FOR EACH ROW WHEN ((OLD.assembly_id, OLD.kind, OLD.item_id) IS DISTINCT FROM (NEW.assembly_id, NEW.kind, NEW.item_id))
    EXECUTE FUNCTION keep_assembly_part();
  CREATE TRIGGER assembly_parts_not_removed BEFORE DELETE ON assembly_parts
    FOR EACH ROW EXECUTE FUNCTION keep_assembly_part();

  CREATE FUNCTION check_assembly_whole() RETURNS trigger LANGUAGE plpgsql AS $$
  DECLARE
    whole_id bigint := CASE TG_TABLE_NAME WHEN 'assemblies' THEN (to_jsonb(NEW) ->> 'id')::bigint
      ELSE (to_jsonb(NEW) ->> 'assembly_id')::bigint END;
    whole assemblies;
  BEGIN
    SELECT * INTO whole FROM assemblies WHERE id = whole_id;
    IF EXISTS (
      SELECT FROM assembly_parts WHERE assembly_id = whole.id AND (location_id IS NOT NULL) <> (whole.state = 'built')
    ) OR EXISTS (
      SELECT FROM assembly_parts AS part JOIN locations ON locations.id = part.location_id
      WHERE part.assembly_id = whole.id
      HAVING count(DISTINCT part.location_id) > 1 OR bool_or(locations.kind NOT IN ('person', 'machine'))
    ) OR EXISTS (
      SELECT FROM assembly_parts AS part JOIN machines ON machines.id = whole.machine_id
      WHERE part.assembly_id = whole.id AND part.location_id <> machines.location_id
    ) THEN
      RAISE EXCEPTION 'the parts of assembly % are not where a % one''s are', whole.number, whole.state USING
        ERRCODE = 'LL019', TABLE = 'assembly_parts', CONSTRAINT = 'assembly_parts_follow_state';
    END IF;
    RETURN NULL;
  END $$;
  CREATE CONSTRAINT TRIGGER assemblies_whole AFTER INSERT OR UPDATE ON assemblies
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_assembly_whole();
  CREATE CONSTRAINT TRIGGER assembly_parts_whole AFTER INSERT OR UPDATE ON assembly_parts
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_assembly_whole();
`

const steadyPlans = `SET enable_seqscan = off SET enable_hashjoin = off SET enable_mergejoin = off SET jit = off`

/**
 * What asks for another look, in the transaction of the change itself. The changed rows lead and the parts are looked up
 * by key: a connection keeps these plans for one row and for a hundred thousand.
 */
const rechecks = `
  CREATE FUNCTION recheck_assemblies_of_items() RETURNS trigger LANGUAGE plpgsql ${steadyPlans} AS $$
  DECLARE
    changed bigint[] := ARRAY(
      SELECT id FROM (SELECT id, version FROM new_rows EXCEPT SELECT id, version FROM old_rows) AS raised);
  BEGIN
    IF cardinality(changed) > 0 AND EXISTS (SELECT FROM assembly_parts) THEN
      INSERT INTO assembly_rechecks (assembly_id)
        SELECT DISTINCT part.assembly_id
        FROM unnest(changed) AS item (id)
        CROSS JOIN LATERAL (SELECT assembly_id FROM assembly_parts WHERE item_id = item.id OFFSET 0) AS part
        CROSS JOIN LATERAL (SELECT archived_at FROM assemblies WHERE id = part.assembly_id OFFSET 0) AS whole
        WHERE whole.archived_at IS NULL;
    END IF;
    RETURN NULL;
  END $$;
  CREATE TRIGGER items_recheck_assemblies AFTER UPDATE ON items
    REFERENCING OLD TABLE AS old_rows NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION recheck_assemblies_of_items();

  CREATE FUNCTION recheck_assemblies_of_piece() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    INSERT INTO assembly_rechecks (assembly_id)
      SELECT part.assembly_id FROM assembly_parts AS part JOIN assemblies ON assemblies.id = part.assembly_id
      WHERE part.piece_id = NEW.id AND assemblies.archived_at IS NULL;
    RETURN NULL;
  END $$;
  CREATE TRIGGER pieces_recheck_assemblies AFTER UPDATE ON pieces
    FOR EACH ROW WHEN (
      (OLD.cutting_diameter_mm, OLD.corner_radius_mm, OLD.length_of_cut_mm, OLD.reach_length_mm, OLD.overall_length_mm)
      IS DISTINCT FROM
      (NEW.cutting_diameter_mm, NEW.corner_radius_mm, NEW.length_of_cut_mm, NEW.reach_length_mm, NEW.overall_length_mm))
    EXECUTE FUNCTION recheck_assemblies_of_piece();

  -- Both ends: what comes back makes an assembly whole again.
  CREATE FUNCTION recheck_assemblies_of_movements() RETURNS trigger LANGUAGE plpgsql ${steadyPlans} AS $$
  BEGIN
    IF NOT EXISTS (SELECT FROM assembly_parts WHERE location_id IS NOT NULL) THEN
      RETURN NULL;
    END IF;
    INSERT INTO assembly_rechecks (assembly_id, movement_id)
      SELECT DISTINCT ON (part.assembly_id) part.assembly_id, posted.id
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT assembly_id FROM assembly_parts
        WHERE item_id = posted.item_id AND location_id IN (posted.from_location_id, posted.to_location_id) OFFSET 0) AS part
      ORDER BY part.assembly_id, posted.id DESC;
    RETURN NULL;
  END $$;
  CREATE TRIGGER movements_recheck_assemblies AFTER INSERT ON movements REFERENCING NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION recheck_assemblies_of_movements();

  CREATE FUNCTION recheck_all_assemblies() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    INSERT INTO assembly_rechecks (assembly_id) SELECT id FROM assemblies WHERE archived_at IS NULL;
    RETURN NULL;
  END $$;
  CREATE TRIGGER shop_settings_recheck_assemblies AFTER UPDATE ON shop_settings
    FOR EACH ROW WHEN (
      (OLD.shank_clearance_mm, OLD.holder_clearance_mm, OLD.flute_to_grip_mm, OLD.hole_tolerance_mm,
        OLD.drill_chip_room_diameters, OLD.measuring_tolerance_mm)
      IS DISTINCT FROM
      (NEW.shank_clearance_mm, NEW.holder_clearance_mm, NEW.flute_to_grip_mm, NEW.hole_tolerance_mm,
        NEW.drill_chip_room_diameters, NEW.measuring_tolerance_mm))
    EXECUTE FUNCTION recheck_all_assemblies();
`
