import type { Knex } from 'knex'

/** Items and their geometry, with the checks that keep it possible, and the version every change raises. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(items)
  await knex.raw(cutters)
  await knex.raw(holders)
  await knex.raw(collets)
  await knex.raw(extensions)
  await knex.raw(segmentsFit)
  await knex.raw(geometryVersions)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TABLE extension_segments, extensions, collets, holder_segments, holders, cutters;
    DROP TABLE items;
    DROP FUNCTION raise_item_versions(), refuse_overlong_holder(), refuse_overlong_extension(), raise_item_version(),
      flute_end_diameter_mm(text, double precision, double precision, double precision, double precision,
        double precision, double precision, double precision);
  `)
}

const positive = (column: string) => `CHECK (${column} > 0 AND ${column} < 'Infinity')`
const notNegative = (column: string) => `CHECK (${column} >= 0 AND ${column} < 'Infinity')`
const length = (column: string) => `${column} double precision ${positive(column)}`
const requiredLength = (column: string) => `${column} double precision NOT NULL ${positive(column)}`

const items = `
  CREATE TABLE items (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    kind text NOT NULL CHECK (kind IN ('cutter', 'holder', 'collet', 'extension', 'fixture', 'accessory')),
    code text NOT NULL CHECK (code = btrim(code) AND length(code) BETWEEN 1 AND 100),
    maker text CHECK (maker = btrim(maker) AND length(maker) BETWEEN 1 AND 200),
    part_number text CHECK (part_number = btrim(part_number) AND length(part_number) BETWEEN 1 AND 200),
    description text NOT NULL DEFAULT '' CHECK (length(description) <= 10000),
    unit_cost_minor bigint CHECK (unit_cost_minor BETWEEN 0 AND 9007199254740991),
    is_tracked_by_piece boolean NOT NULL DEFAULT false,
    version integer NOT NULL DEFAULT 1,
    archived_at timestamptz,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now(),
    UNIQUE (id, kind)
  );
  COMMENT ON COLUMN items.version IS 'raised by any change of the item or its geometry';
  COMMENT ON COLUMN items.is_tracked_by_piece IS 'every movement names a tagged piece';
  CREATE UNIQUE INDEX items_code_idx ON items (lower(code));
  -- Not unique: two rows may carry one maker's number until someone merges them; an import reports the ambiguity.
  CREATE INDEX items_maker_part_number_idx ON items (lower(maker), lower(part_number))
    WHERE maker IS NOT NULL AND part_number IS NOT NULL;
  CREATE INDEX items_kind_code_idx ON items (kind, lower(code), id) WHERE archived_at IS NULL;

  CREATE FUNCTION raise_item_version() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF (OLD.kind, OLD.code, OLD.maker, OLD.part_number, OLD.description, OLD.unit_cost_minor,
        OLD.is_tracked_by_piece, OLD.archived_at, OLD.version)
      IS DISTINCT FROM
       (NEW.kind, NEW.code, NEW.maker, NEW.part_number, NEW.description, NEW.unit_cost_minor,
        NEW.is_tracked_by_piece, NEW.archived_at, NEW.version) THEN
      NEW.version := OLD.version + 1;
      NEW.updated_at := now();
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER items_version BEFORE UPDATE ON items FOR EACH ROW EXECUTE FUNCTION raise_item_version();
`

const cutters = `
  -- Diameter of the cutting form at the end of the flutes: a taper carries on through the run-out, any other form keeps
  -- what it has at the end of its length of cut. Both lengths are given; what is null of the rest does not shape it.
  CREATE FUNCTION flute_end_diameter_mm(
    form text, cutting_diameter double precision, corner_radius double precision, taper_deg double precision,
    point_deg double precision, tip_diameter double precision, length_of_cut double precision,
    flute_length double precision
  ) RETURNS double precision LANGUAGE sql IMMUTABLE AS $$
    SELECT 2 * CASE
      WHEN form = 'tapered' AND corner_radius > 0 AND flute_length < corner_radius * (1 - sind(taper_deg)) THEN
        cutting_diameter / 2 - corner_radius + sqrt(corner_radius ^ 2 - (corner_radius - flute_length) ^ 2)
      WHEN form = 'tapered' THEN
        cutting_diameter / 2 - coalesce(corner_radius, 0) * (1 - cosd(taper_deg))
          + (flute_length - coalesce(corner_radius, 0) * (1 - sind(taper_deg))) * tand(taper_deg)
      WHEN form = 'ball' AND length_of_cut < cutting_diameter / 2 THEN
        sqrt((cutting_diameter / 2) ^ 2 - (cutting_diameter / 2 - length_of_cut) ^ 2)
      WHEN form = 'corner_radius' AND length_of_cut < corner_radius THEN
        cutting_diameter / 2 - corner_radius + sqrt(corner_radius ^ 2 - (corner_radius - length_of_cut) ^ 2)
      WHEN form = 'drill' AND point_deg < 180 THEN least(cutting_diameter / 2, length_of_cut * tand(point_deg / 2))
      WHEN form = 'chamfer' AND point_deg < 180 THEN
        least(cutting_diameter / 2, coalesce(tip_diameter, 0) / 2 + length_of_cut * tand(point_deg / 2))
      ELSE cutting_diameter / 2
    END
  $$;

  CREATE TABLE cutters (
    item_id bigint PRIMARY KEY,
    item_kind text NOT NULL GENERATED ALWAYS AS ('cutter') STORED,
    form text NOT NULL CHECK (form IN ('square', 'corner_radius', 'ball', 'tapered', 'drill', 'reamer', 'tap',
      'face_mill', 'slotting', 'thread_mill', 'chamfer')),
    ${requiredLength('cutting_diameter_mm')},
    corner_radius_mm double precision ${notNegative('corner_radius_mm')},
    taper_half_angle_deg double precision CHECK (taper_half_angle_deg >= 0 AND taper_half_angle_deg < 90),
    point_angle_deg double precision CHECK (point_angle_deg > 0 AND point_angle_deg <= 180),
    tip_diameter_mm double precision ${notNegative('tip_diameter_mm')},
    ${length('length_of_cut_mm')},
    ${length('flute_length_mm')},
    ${length('neck_diameter_mm')},
    neck_taper_half_angle_deg double precision
      CHECK (neck_taper_half_angle_deg >= 0 AND neck_taper_half_angle_deg < 90),
    ${length('reach_length_mm')},
    neck_transition_angle_deg double precision
      CHECK (neck_transition_angle_deg > 0 AND neck_transition_angle_deg <= 90),
    ${requiredLength('shank_diameter_mm')},
    ${requiredLength('overall_length_mm')},
    flute_count integer CHECK (flute_count BETWEEN 1 AND 1000),
    substrate text CHECK (substrate IN ('carbide', 'hss')),
    maximum_rpm integer CHECK (maximum_rpm > 0),
    FOREIGN KEY (item_id, item_kind) REFERENCES items (id, kind),
    CONSTRAINT cutters_length_of_cut_or_flute_length_given
      CHECK (length_of_cut_mm IS NOT NULL OR flute_length_mm IS NOT NULL),
    CONSTRAINT cutters_corner_radius_within_half_diameter
      CHECK (corner_radius_mm <= cutting_diameter_mm / 2 + 1e-9),
    CONSTRAINT cutters_tip_within_diameter CHECK (tip_diameter_mm <= cutting_diameter_mm + 1e-9),
    CONSTRAINT cutters_taper_has_angle CHECK (form <> 'tapered' OR taper_half_angle_deg IS NOT NULL),
    CONSTRAINT cutters_length_of_cut_within_flutes CHECK (length_of_cut_mm <= flute_length_mm + 1e-9),
    CONSTRAINT cutters_length_of_cut_within_overall CHECK (length_of_cut_mm <= overall_length_mm + 1e-9),
    CONSTRAINT cutters_flutes_within_overall CHECK (flute_length_mm <= overall_length_mm + 1e-9),
    CONSTRAINT cutters_reach_length_within_overall CHECK (reach_length_mm <= overall_length_mm + 1e-9),
    -- Of the length of cut and the flutes' length the one given stands for both where a neck follows.
    CONSTRAINT cutters_neck_beyond_flutes CHECK (neck_diameter_mm IS NULL
      OR coalesce(reach_length_mm > coalesce(flute_length_mm, length_of_cut_mm), false)),
    CONSTRAINT cutters_neck_within_flutes CHECK (neck_diameter_mm IS NULL
      OR neck_diameter_mm <= 1e-9 + flute_end_diameter_mm(form,
        cutting_diameter_mm, corner_radius_mm, taper_half_angle_deg, point_angle_deg, tip_diameter_mm,
        coalesce(length_of_cut_mm, flute_length_mm), coalesce(flute_length_mm, length_of_cut_mm)))
  );
  CREATE INDEX cutters_form_cutting_diameter_mm_idx ON cutters (form, cutting_diameter_mm);
  CREATE INDEX cutters_cutting_diameter_mm_idx ON cutters (cutting_diameter_mm);
`

/** What takes a shank, in a holder as in an extension. */
const bore = (table: string) => `
    bore_kind text NOT NULL CHECK (bore_kind IN ('collet', 'fixed')),
    bore_series text CHECK (bore_series = btrim(bore_series) AND length(bore_series) BETWEEN 1 AND 100),
    ${length('bore_diameter_mm')},
    ${length('bore_depth_mm')},
    ${length('minimum_grip_mm')},
    grip_start_mm double precision ${notNegative('grip_start_mm')},
    CONSTRAINT ${table}_bore_is_collet_or_fixed CHECK (
      (bore_kind = 'collet' AND bore_series IS NOT NULL AND bore_diameter_mm IS NULL) OR
      (bore_kind = 'fixed' AND bore_series IS NULL AND bore_diameter_mm IS NOT NULL)),
    CONSTRAINT ${table}_grip_within_bore
      CHECK (coalesce(grip_start_mm, 0) + coalesce(minimum_grip_mm, 0) <= bore_depth_mm + 1e-9)`

/** A straight piece of the outline; position counts from the nose face towards the spindle. */
const segment = `
    position integer NOT NULL CHECK (position BETWEEN 1 AND 100),
    ${requiredLength('length_mm')},
    ${requiredLength('nose_diameter_mm')},
    ${requiredLength('spindle_diameter_mm')}`

const holders = `
  CREATE TABLE holders (
    item_id bigint PRIMARY KEY,
    item_kind text NOT NULL GENERATED ALWAYS AS ('holder') STORED,
    taper text CHECK (taper = btrim(taper) AND length(taper) BETWEEN 1 AND 100),
    ${requiredLength('gauge_length_mm')},
    ${bore('holders')},
    ${length('side_lock_insertion_mm')},
    maximum_rpm integer CHECK (maximum_rpm > 0),
    FOREIGN KEY (item_id, item_kind) REFERENCES items (id, kind),
    CONSTRAINT holders_side_lock_is_fixed CHECK (side_lock_insertion_mm IS NULL OR bore_kind = 'fixed'),
    CONSTRAINT holders_side_lock_within_bore CHECK (side_lock_insertion_mm <= bore_depth_mm + 1e-9)
  );
  CREATE INDEX holders_bore_series_idx ON holders (lower(bore_series));

  CREATE TABLE holder_segments (
    item_id bigint NOT NULL REFERENCES holders ON DELETE CASCADE,
    part text NOT NULL CHECK (part IN ('nut', 'holder')),
    ${segment},
    PRIMARY KEY (item_id, position)
  );
`

const collets = `
  CREATE TABLE collets (
    item_id bigint PRIMARY KEY,
    item_kind text NOT NULL GENERATED ALWAYS AS ('collet') STORED,
    series text NOT NULL CHECK (series = btrim(series) AND length(series) BETWEEN 1 AND 100),
    ${requiredLength('minimum_mm')},
    ${requiredLength('maximum_mm')},
    ${length('length_mm')},
    ${length('minimum_grip_mm')},
    FOREIGN KEY (item_id, item_kind) REFERENCES items (id, kind),
    CONSTRAINT collets_minimum_within_maximum CHECK (minimum_mm <= maximum_mm),
    CONSTRAINT collets_grip_within_length CHECK (minimum_grip_mm <= length_mm + 1e-9)
  );
  CREATE INDEX collets_series_idx ON collets (lower(series), minimum_mm, maximum_mm);
`

const extensions = `
  CREATE TABLE extensions (
    item_id bigint PRIMARY KEY,
    item_kind text NOT NULL GENERATED ALWAYS AS ('extension') STORED,
    ${requiredLength('projection_mm')},
    ${bore('extensions')},
    FOREIGN KEY (item_id, item_kind) REFERENCES items (id, kind)
  );

  CREATE TABLE extension_segments (
    item_id bigint NOT NULL REFERENCES extensions ON DELETE CASCADE,
    ${segment},
    PRIMARY KEY (item_id, position)
  );
`

/** Deferred to the commit, so that a holder and its segments may be written in any order within one transaction. */
const refuseOverlong = (name: string, table: string, bound: string) => `
  CREATE FUNCTION ${name}() RETURNS trigger LANGUAGE plpgsql AS $$
  DECLARE
    bound_mm double precision;
    sum_mm double precision;
  BEGIN
    SELECT ${bound} INTO bound_mm FROM ${table}s WHERE item_id = NEW.item_id;
    SELECT sum(length_mm) INTO sum_mm FROM ${table}_segments WHERE item_id = NEW.item_id;
    IF sum_mm > bound_mm + 1e-9 THEN
      RAISE EXCEPTION 'the segments are % mm long together, more than % mm', sum_mm, bound_mm USING
        ERRCODE = 'check_violation', TABLE = '${table}_segments', CONSTRAINT = '${table}_segments_within_${bound}';
    END IF;
    RETURN NULL;
  END $$;
  CREATE CONSTRAINT TRIGGER ${table}_segments_fit AFTER INSERT OR UPDATE ON ${table}_segments
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION ${name}();
  CREATE CONSTRAINT TRIGGER ${table}s_fit AFTER UPDATE OF ${bound} ON ${table}s
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION ${name}();
`

const segmentsFit =
  refuseOverlong('refuse_overlong_holder', 'holder', 'gauge_length_mm') +
  refuseOverlong('refuse_overlong_extension', 'extension', 'projection_mm')

const geometryTables = [
  'cutters',
  'holders',
  'holder_segments',
  'collets',
  'extensions',
  'extension_segments',
]

/**
 * Rows that a statement leaves as they were raise nothing, and neither does geometry written in the transaction that
 * makes the item: nobody has seen that version yet. A connection keeps a function's plan, whether it was made for one
 * row or for a hundred thousand, so the items are looked up from a list by their index, which serves both.
 */
const geometryVersions = `
  CREATE FUNCTION raise_item_versions() RETURNS trigger LANGUAGE plpgsql
  SET enable_seqscan = off SET jit = off AS $$
  DECLARE
    changed bigint[];
  BEGIN
    IF TG_OP = 'INSERT' THEN
      changed := ARRAY(SELECT DISTINCT item_id FROM new_rows);
    ELSIF TG_OP = 'DELETE' THEN
      changed := ARRAY(SELECT DISTINCT item_id FROM old_rows);
    ELSE
      changed := ARRAY(
        SELECT DISTINCT item_id FROM (SELECT * FROM new_rows EXCEPT SELECT * FROM old_rows) AS changed_rows);
    END IF;
    UPDATE items SET version = version + 1 WHERE id = ANY (changed) AND created_at <> transaction_timestamp();
    RETURN NULL;
  END $$;
  ${geometryTables
    .map(
      (table) => `
  CREATE TRIGGER ${table}_added AFTER INSERT ON ${table} REFERENCING NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION raise_item_versions();
  CREATE TRIGGER ${table}_changed AFTER UPDATE ON ${table} REFERENCING OLD TABLE AS old_rows NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION raise_item_versions();
  CREATE TRIGGER ${table}_removed AFTER DELETE ON ${table} REFERENCING OLD TABLE AS old_rows
    FOR EACH STATEMENT EXECUTE FUNCTION raise_item_versions();`,
    )
    .join('')}
`
