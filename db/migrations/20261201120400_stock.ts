import type { Knex } from 'knex'

/**
 * The books. Movements are appended and never edited; balances, levels and the places of pieces follow from them and
 * are written by one trigger alone, which runs once a statement, so that tens of thousands of movements may be posted
 * by one INSERT … SELECT.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(pieces)
  await knex.raw(movements)
  await knex.raw(balances)
  await knex.raw(checkMovements)
  await knex.raw(postMovements)
  await knex.raw(guards)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER items_archiving ON items;
    DROP TRIGGER items_tracking ON items;
    DROP TRIGGER locations_archiving ON locations;
    DROP TABLE stock_levels, balances, movements, pieces;
    DROP FUNCTION refuse_archiving_stocked_item(), refuse_tracking_change(), refuse_archiving_stocked_location(),
      keep_piece_place(), post_movements(), check_movements(),
      movement_runs_between(text, text, text, bigint, bigint);
  `)
}

const positive = (column: string) =>
  `${column} double precision CHECK (${column} > 0 AND ${column} < 'Infinity')`
const notNegative = (column: string) =>
  `${column} double precision CHECK (${column} >= 0 AND ${column} < 'Infinity')`
const conditions = `('new', 'used', 'reground', 'worn')`

/**
 * A connection keeps a function's plans, whether they were made for one movement or for a hundred thousand, and the
 * planner may think a table empty that no longer is. So the posted rows always lead and all else is looked up by key:
 * LATERAL with OFFSET 0 is not turned round, and without sequential scans the lookup goes by the index.
 */
const steadyPlans = `SET enable_seqscan = off SET enable_hashjoin = off SET enable_mergejoin = off SET jit = off`

const pieces = `
  CREATE TABLE pieces (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    item_id bigint NOT NULL REFERENCES items,
    tag text NOT NULL CHECK (tag = btrim(tag) AND length(tag) BETWEEN 1 AND 100),
    location_id bigint REFERENCES locations,
    condition text CHECK (condition IN ${conditions}),
    ${positive('cutting_diameter_mm')},
    ${notNegative('corner_radius_mm')},
    ${positive('length_of_cut_mm')},
    ${positive('reach_length_mm')},
    ${positive('overall_length_mm')},
    ${notNegative('runout_mm')},
    regrind_count integer NOT NULL DEFAULT 0 CHECK (regrind_count >= 0),
    note text NOT NULL DEFAULT '' CHECK (length(note) <= 10000),
    version integer NOT NULL DEFAULT 1,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now(),
    UNIQUE (id, item_id),
    CONSTRAINT pieces_place_and_condition CHECK ((location_id IS NULL) = (condition IS NULL)),
    CONSTRAINT pieces_corner_radius_within_half_diameter CHECK (corner_radius_mm <= cutting_diameter_mm / 2 + 1e-9),
    CONSTRAINT pieces_length_of_cut_within_overall CHECK (length_of_cut_mm <= overall_length_mm + 1e-9),
    CONSTRAINT pieces_reach_length_within_overall CHECK (reach_length_mm <= overall_length_mm + 1e-9)
  );
  COMMENT ON COLUMN pieces.location_id IS 'where it is; null until its first movement';
  COMMENT ON COLUMN pieces.cutting_diameter_mm IS 'measured; null: as the catalogue says';
  CREATE UNIQUE INDEX pieces_tag_idx ON pieces (lower(tag));
  CREATE INDEX pieces_item_id_idx ON pieces (item_id);
  CREATE INDEX pieces_location_id_idx ON pieces (location_id);
`

const movements = `
  CREATE TABLE movements (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    kind text NOT NULL CHECK (kind IN ('receipt', 'issue', 'return', 'relocation', 'transfer', 'regrind', 'scrap',
      'adjustment', 'reversal')),
    item_id bigint NOT NULL REFERENCES items,
    piece_id bigint,
    quantity integer NOT NULL CHECK (quantity BETWEEN 1 AND 1000000),
    from_location_id bigint NOT NULL REFERENCES locations,
    from_condition text NOT NULL CHECK (from_condition IN ${conditions}),
    to_location_id bigint NOT NULL REFERENCES locations,
    to_condition text NOT NULL CHECK (to_condition IN ${conditions}),
    note text NOT NULL DEFAULT '' CHECK (length(note) <= 10000),
    actor_id bigint NOT NULL REFERENCES users,
    occurred_at timestamptz NOT NULL DEFAULT now(),
    recorded_at timestamptz NOT NULL DEFAULT now(),
    reverses_id bigint UNIQUE REFERENCES movements,
    FOREIGN KEY (piece_id, item_id) REFERENCES pieces (id, item_id),
    CONSTRAINT movements_one_of_a_piece CHECK (piece_id IS NULL OR quantity = 1),
    CONSTRAINT movements_somewhere_else
      CHECK ((from_location_id, from_condition) <> (to_location_id, to_condition)),
    CONSTRAINT movements_reversal_names_what CHECK ((kind = 'reversal') = (reverses_id IS NOT NULL))
  );
  CREATE INDEX movements_item_id_idx ON movements (item_id, id);
  CREATE INDEX movements_piece_id_idx ON movements (piece_id, id) WHERE piece_id IS NOT NULL;
  CREATE INDEX movements_from_location_id_idx ON movements (from_location_id, id);
  CREATE INDEX movements_to_location_id_idx ON movements (to_location_id, id);
  CREATE INDEX movements_actor_id_idx ON movements (actor_id, id);
  CREATE INDEX movements_occurred_at_idx ON movements (occurred_at, id);
  CREATE TRIGGER movements_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON movements
    FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
`

const balances = `
  -- The flag comes with the location by the composite key, since a CHECK cannot look at another table.
  CREATE TABLE balances (
    item_id bigint NOT NULL REFERENCES items,
    location_id bigint NOT NULL,
    condition text NOT NULL CHECK (condition IN ${conditions}),
    is_outside boolean NOT NULL,
    quantity integer NOT NULL,
    PRIMARY KEY (item_id, location_id, condition),
    FOREIGN KEY (location_id, is_outside) REFERENCES locations (id, is_outside),
    CONSTRAINT balances_not_below_zero CHECK (is_outside OR quantity >= 0)
  );
  CREATE INDEX balances_location_id_idx ON balances (location_id, item_id) WHERE quantity <> 0;

  CREATE TABLE stock_levels (
    item_id bigint NOT NULL REFERENCES items,
    crib_id bigint NOT NULL REFERENCES cribs,
    on_hand integer NOT NULL DEFAULT 0 CHECK (on_hand >= 0),
    reserved integer NOT NULL DEFAULT 0 CHECK (reserved >= 0),
    coming integer NOT NULL DEFAULT 0 CHECK (coming >= 0),
    PRIMARY KEY (item_id, crib_id)
  );
  COMMENT ON COLUMN stock_levels.on_hand IS 'pieces in bins of the crib that are not worn';
  CREATE INDEX stock_levels_crib_id_idx ON stock_levels (crib_id, item_id);

  CREATE TRIGGER balances_guarded BEFORE INSERT OR UPDATE OR DELETE OR TRUNCATE ON balances
    FOR EACH STATEMENT EXECUTE FUNCTION refuse_direct_change();
  CREATE TRIGGER stock_levels_guarded BEFORE INSERT OR UPDATE OR DELETE OR TRUNCATE ON stock_levels
    FOR EACH STATEMENT EXECUTE FUNCTION refuse_direct_change();
`

/**
 * What a movement must be, beyond its own row. A reversal runs between the ends of what it reverses, whichever these are.
 * LL010 a kind between the wrong places; LL011 a reversal that is not the mirror of what it reverses; LL012 a piece
 * missing, or named where the item has none; LL013 an archived item or destination.
 */
const checkMovements = `
  CREATE FUNCTION movement_runs_between(kind text, from_kind text, to_kind text, from_crib bigint, to_crib bigint)
  RETURNS boolean LANGUAGE sql IMMUTABLE AS $$
    SELECT CASE kind
      WHEN 'receipt' THEN from_kind = 'supplier' AND to_kind = 'bin'
      WHEN 'issue' THEN from_kind = 'bin' AND to_kind IN ('person', 'machine')
      WHEN 'return' THEN from_kind IN ('person', 'machine') AND to_kind = 'bin'
      WHEN 'relocation' THEN from_kind = 'bin' AND to_kind = 'bin' AND from_crib = to_crib
      WHEN 'transfer' THEN (from_kind, to_kind) IN (('bin', 'in_transit'), ('in_transit', 'bin'))
      WHEN 'regrind' THEN (from_kind, to_kind) IN (('bin', 'regrind'), ('regrind', 'bin'))
      WHEN 'scrap' THEN from_kind IN ('bin', 'person', 'machine', 'regrind', 'in_transit') AND to_kind = 'scrap'
      WHEN 'adjustment' THEN (from_kind, to_kind) IN (('bin', 'count_adjustment'), ('count_adjustment', 'bin'))
      ELSE kind = 'reversal'
    END
  $$;

  CREATE FUNCTION check_movements() RETURNS trigger LANGUAGE plpgsql ${steadyPlans} AS $$
  DECLARE
    broken record;
  BEGIN
    SELECT posted.kind, source.kind AS from_kind, target.kind AS to_kind INTO broken
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT kind, crib_id FROM locations WHERE id = posted.from_location_id OFFSET 0) AS source
      CROSS JOIN LATERAL (SELECT kind, crib_id FROM locations WHERE id = posted.to_location_id OFFSET 0) AS target
      WHERE NOT movement_runs_between(posted.kind, source.kind, target.kind, source.crib_id, target.crib_id) LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION 'no % runs from this % to this %', broken.kind, broken.from_kind, broken.to_kind USING
        ERRCODE = 'LL010', TABLE = 'movements', CONSTRAINT = 'movements_kind_fixes_places';
    END IF;

    SELECT posted.reverses_id INTO broken
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT * FROM movements WHERE id = posted.reverses_id OFFSET 0) AS reversed
      WHERE posted.reverses_id IS NOT NULL AND (
        reversed.kind = 'reversal'
        OR (posted.item_id, posted.quantity, posted.from_location_id, posted.from_condition,
            posted.to_location_id, posted.to_condition)
          <> (reversed.item_id, reversed.quantity, reversed.to_location_id, reversed.to_condition,
            reversed.from_location_id, reversed.from_condition)
        OR posted.piece_id IS DISTINCT FROM reversed.piece_id) LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION 'this does not reverse movement %', broken.reverses_id USING
        ERRCODE = 'LL011', TABLE = 'movements', CONSTRAINT = 'movements_reversal_mirrors';
    END IF;

    SELECT item.code, item.is_tracked_by_piece INTO broken
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT * FROM items WHERE id = posted.item_id OFFSET 0) AS item
      WHERE item.is_tracked_by_piece <> (posted.piece_id IS NOT NULL) LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION '% is % piece by piece', broken.code,
        CASE WHEN broken.is_tracked_by_piece THEN 'tracked' ELSE 'not tracked' END USING
        ERRCODE = 'LL012', TABLE = 'movements', CONSTRAINT = 'movements_piece_where_tracked';
    END IF;

    SELECT CASE WHEN item.archived_at IS NULL THEN target.code ELSE item.code END AS code INTO broken
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT code, archived_at FROM items WHERE id = posted.item_id OFFSET 0) AS item
      CROSS JOIN LATERAL (SELECT code, archived_at FROM locations WHERE id = posted.to_location_id OFFSET 0) AS target
      WHERE item.archived_at IS NOT NULL OR target.archived_at IS NOT NULL LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION '% is archived', broken.code USING
        ERRCODE = 'LL013', TABLE = 'movements', CONSTRAINT = 'movements_of_what_is_in_use';
    END IF;
    RETURN NULL;
  END $$;
  -- Triggers of one event fire in the order of their names: checks first.
  CREATE TRIGGER movements_checked AFTER INSERT ON movements REFERENCING NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION check_movements();
`

/** Both ends of the posted movements, each with what it gains, summed by balance. */
const movedByBalance = `
        SELECT item_id, location_id, condition, sum(quantity)::integer AS quantity FROM (
          SELECT item_id, from_location_id AS location_id, from_condition AS condition, -quantity AS quantity FROM new_rows
          UNION ALL
          SELECT item_id, to_location_id, to_condition, quantity FROM new_rows
        ) AS an_end GROUP BY item_id, location_id, condition`

/** The same with the place of each. */
const movedWithPlace = `(${movedByBalance}
      ) AS moved
      CROSS JOIN LATERAL (SELECT kind, crib_id, is_outside FROM locations WHERE id = moved.location_id OFFSET 0) AS place`

/**
 * Locks are taken in one order, by whoever posts: levels, then balances, then pieces, each by key. An upsert whose
 * WHERE is false inserts what is missing and locks what is there, in the order it meets them, and changes nothing; a
 * second one then writes what the locked rows come to. (One upsert of the difference would not do: its proposed row,
 * below zero, breaks the CHECK before it meets the row that is there.)
 * LL014 less than nothing would be left, with what is held as JSON in DETAIL; LL015 the piece is not where the
 * movement takes it from.
 */
const postMovements = `
  CREATE FUNCTION post_movements() RETURNS trigger LANGUAGE plpgsql ${steadyPlans} AS $$
  DECLARE
    broken record;
    moved_piece record;
  BEGIN
    IF NOT EXISTS (SELECT FROM new_rows) THEN
      RETURN NULL;
    END IF;

    INSERT INTO stock_levels AS level (item_id, crib_id)
      SELECT DISTINCT moved.item_id, place.crib_id
      FROM ${movedWithPlace}
      WHERE place.kind = 'bin'
      ORDER BY 1, 2
      ON CONFLICT (item_id, crib_id) DO UPDATE SET on_hand = level.on_hand WHERE false;

    INSERT INTO balances AS balance (item_id, location_id, condition, is_outside, quantity)
      SELECT moved.item_id, moved.location_id, moved.condition, place.is_outside, 0
      FROM ${movedWithPlace}
      ORDER BY 1, 2, 3
      ON CONFLICT (item_id, location_id, condition) DO UPDATE SET quantity = balance.quantity WHERE false;

    SELECT moved.item_id, moved.location_id, moved.condition, held.quantity AS held, -moved.quantity AS wanted INTO broken
      FROM (${movedByBalance}
      ) AS moved
      CROSS JOIN LATERAL (
        SELECT quantity, is_outside FROM balances
        WHERE (item_id, location_id, condition) = (moved.item_id, moved.location_id, moved.condition) OFFSET 0
      ) AS held
      WHERE NOT held.is_outside AND held.quantity + moved.quantity < 0
      ORDER BY 1, 2, 3 LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION 'only % there, % wanted', broken.held, broken.wanted USING
        ERRCODE = 'LL014', TABLE = 'balances', CONSTRAINT = 'balances_not_below_zero',
        DETAIL = json_build_object('itemId', broken.item_id::text, 'locationId', broken.location_id::text,
          'condition', broken.condition, 'held', broken.held, 'wanted', broken.wanted);
    END IF;

    INSERT INTO balances AS balance (item_id, location_id, condition, is_outside, quantity)
      SELECT moved.item_id, moved.location_id, moved.condition, held.is_outside, held.quantity + moved.quantity
      FROM (${movedByBalance}
      ) AS moved
      CROSS JOIN LATERAL (
        SELECT quantity, is_outside FROM balances
        WHERE (item_id, location_id, condition) = (moved.item_id, moved.location_id, moved.condition) OFFSET 0
      ) AS held
      WHERE moved.quantity <> 0
      ON CONFLICT (item_id, location_id, condition) DO UPDATE SET quantity = excluded.quantity;

    INSERT INTO stock_levels AS level (item_id, crib_id, on_hand)
      SELECT gained.item_id, gained.crib_id, held.on_hand + gained.quantity
      FROM (
        SELECT moved.item_id, place.crib_id, sum(moved.quantity)::integer AS quantity
        FROM ${movedWithPlace}
        WHERE place.kind = 'bin' AND moved.condition <> 'worn'
        GROUP BY moved.item_id, place.crib_id
      ) AS gained
      CROSS JOIN LATERAL (
        SELECT on_hand FROM stock_levels WHERE (item_id, crib_id) = (gained.item_id, gained.crib_id) OFFSET 0
      ) AS held
      WHERE gained.quantity <> 0
      ON CONFLICT (item_id, crib_id) DO UPDATE SET on_hand = excluded.on_hand;

    IF NOT EXISTS (SELECT FROM new_rows WHERE piece_id IS NOT NULL) THEN
      RETURN NULL;
    END IF;

    PERFORM FROM pieces WHERE id = ANY (ARRAY(SELECT piece_id FROM new_rows)) ORDER BY id FOR UPDATE;

    -- A piece without a place has not come in yet: it comes from outside. The movements of one statement follow each
    -- other by id.
    SELECT piece.tag INTO broken
      FROM (
        SELECT piece_id, from_location_id, from_condition,
          row_number() OVER by_piece AS step,
          lag(to_location_id) OVER by_piece AS last_location_id,
          lag(to_condition) OVER by_piece AS last_condition
        FROM new_rows WHERE piece_id IS NOT NULL
        WINDOW by_piece AS (PARTITION BY piece_id ORDER BY id)
      ) AS posted
      CROSS JOIN LATERAL (SELECT tag, location_id, condition FROM pieces WHERE id = posted.piece_id OFFSET 0) AS piece
      CROSS JOIN LATERAL (SELECT is_outside FROM locations WHERE id = posted.from_location_id OFFSET 0) AS source
      WHERE CASE
        WHEN posted.step > 1 THEN
          (posted.last_location_id, posted.last_condition) <> (posted.from_location_id, posted.from_condition)
        WHEN piece.location_id IS NULL THEN NOT source.is_outside
        ELSE (piece.location_id, piece.condition) <> (posted.from_location_id, posted.from_condition)
      END LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION 'piece % is not there', broken.tag USING
        ERRCODE = 'LL015', TABLE = 'pieces', CONSTRAINT = 'pieces_move_from_where_they_are';
    END IF;

    FOR moved_piece IN
      SELECT DISTINCT ON (piece_id) piece_id, to_location_id, to_condition
      FROM new_rows WHERE piece_id IS NOT NULL ORDER BY piece_id, id DESC
    LOOP
      UPDATE pieces SET location_id = moved_piece.to_location_id, condition = moved_piece.to_condition
        WHERE id = moved_piece.piece_id;
    END LOOP;
    RETURN NULL;
  END $$;
  CREATE TRIGGER movements_posted AFTER INSERT ON movements REFERENCING NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION post_movements();
`

/**
 * LL016: what still holds stock is not archived. A movement's foreign keys lock its item and its locations against FOR
 * UPDATE, so archiving waits for the movements under way, and those that come later wait for it and see it.
 */
const guards = `
  CREATE FUNCTION keep_piece_place() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF TG_OP = 'INSERT' THEN
      IF NEW.location_id IS NOT NULL THEN
        RAISE EXCEPTION 'a piece comes in by a movement' USING
          ERRCODE = 'LL002', TABLE = 'pieces', CONSTRAINT = 'pieces_place_kept_by_movements';
      END IF;
      RETURN NEW;
    END IF;
    IF (OLD.location_id, OLD.condition) IS DISTINCT FROM (NEW.location_id, NEW.condition) AND pg_trigger_depth() < 2
      OR OLD.item_id <> NEW.item_id THEN
      RAISE EXCEPTION 'a piece is moved by a movement and stays of its item' USING
        ERRCODE = 'LL002', TABLE = 'pieces', CONSTRAINT = 'pieces_place_kept_by_movements';
    END IF;
    NEW.version := OLD.version + 1;
    NEW.updated_at := now();
    RETURN NEW;
  END $$;
  CREATE TRIGGER pieces_guarded BEFORE INSERT OR UPDATE ON pieces
    FOR EACH ROW EXECUTE FUNCTION keep_piece_place();

  CREATE FUNCTION refuse_archiving_stocked_item() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    PERFORM FROM items WHERE id = NEW.id FOR UPDATE;
    IF EXISTS (SELECT FROM balances WHERE item_id = NEW.id AND quantity <> 0 AND NOT is_outside) THEN
      RAISE EXCEPTION '% is still in stock', NEW.code USING
        ERRCODE = 'LL016', TABLE = 'items', CONSTRAINT = 'items_archived_without_stock';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER items_archiving BEFORE UPDATE OF archived_at ON items
    FOR EACH ROW WHEN (OLD.archived_at IS NULL AND NEW.archived_at IS NOT NULL)
    EXECUTE FUNCTION refuse_archiving_stocked_item();

  -- LL012 again: with movements on the books an item keeps the way it is tracked.
  CREATE FUNCTION refuse_tracking_change() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    PERFORM FROM items WHERE id = NEW.id FOR UPDATE;
    IF EXISTS (SELECT FROM movements WHERE item_id = NEW.id) THEN
      RAISE EXCEPTION '% has movements', NEW.code USING
        ERRCODE = 'LL012', TABLE = 'items', CONSTRAINT = 'items_keep_their_tracking';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER items_tracking BEFORE UPDATE OF is_tracked_by_piece ON items
    FOR EACH ROW WHEN (OLD.is_tracked_by_piece <> NEW.is_tracked_by_piece) EXECUTE FUNCTION refuse_tracking_change();

  CREATE FUNCTION refuse_archiving_stocked_location() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    PERFORM FROM locations WHERE id = NEW.id FOR UPDATE;
    IF NEW.is_outside OR NEW.kind = 'crib'
      OR EXISTS (SELECT FROM balances WHERE location_id = NEW.id AND quantity <> 0)
      OR EXISTS (SELECT FROM locations WHERE parent_id = NEW.id AND archived_at IS NULL) THEN
      RAISE EXCEPTION '% is still in use', NEW.code USING
        ERRCODE = 'LL016', TABLE = 'locations', CONSTRAINT = 'locations_archived_when_empty';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER locations_archiving BEFORE UPDATE OF archived_at ON locations
    FOR EACH ROW WHEN (OLD.archived_at IS NULL AND NEW.archived_at IS NOT NULL)
    EXECUTE FUNCTION refuse_archiving_stocked_location();
`
