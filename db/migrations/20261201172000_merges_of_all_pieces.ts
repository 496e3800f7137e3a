import type { Knex } from 'knex'

/**
 * A merge takes every piece along: tagged ones, and what is in hands, on machines, at the grinder or on its way. Its
 * adjustments name the item that was merged, come in pairs within one statement, and alone may reach beyond the bins.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(movementsOfMerges)
  await knex.raw(placesOfAdjustments(`('bin', 'person', 'machine', 'regrind', 'in_transit')`))
  await knex.raw(checkMerges)
  await knex.raw(
    guardOfPieces(`(pg_trigger_depth() < 2 OR NOT EXISTS (
      SELECT FROM item_merges WHERE item_id = OLD.item_id AND kept_item_id = NEW.item_id))`),
  )
  await knex.raw(piecesNowhere)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER item_merges_pieces ON item_merges;
    DROP FUNCTION take_pieces_over();
    DROP TRIGGER movements_checked_merges ON movements;
    DROP FUNCTION check_merges();
    ALTER TABLE movements DROP CONSTRAINT movements_piece_id_fkey, DROP COLUMN merged_item_id,
      ADD FOREIGN KEY (piece_id, item_id) REFERENCES pieces (id, item_id) NOT VALID;
  `)
  await knex.raw(guardOfPieces('true'))
  await knex.raw(placesOfAdjustments(`('bin')`))
}

/** The piece's own item is asked for by trigger: a piece that went over has movements under both codes. */
const movementsOfMerges = `
  ALTER TABLE movements
    ADD COLUMN merged_item_id bigint REFERENCES items,
    ADD CONSTRAINT movements_merge_adjusts CHECK (merged_item_id IS NULL OR kind = 'adjustment'),
    DROP CONSTRAINT movements_piece_id_item_id_fkey,
    ADD CONSTRAINT movements_piece_id_fkey FOREIGN KEY (piece_id) REFERENCES pieces;
  COMMENT ON COLUMN movements.merged_item_id IS 'half of a merge: the item whose pieces went over';
  CREATE INDEX movements_merged_item_id_idx ON movements (merged_item_id, id) WHERE merged_item_id IS NOT NULL;
`

const placesOfAdjustments = (places: string) => `
  CREATE OR REPLACE FUNCTION movement_runs_between(kind text, from_kind text, to_kind text, from_crib bigint,
    to_crib bigint)
  RETURNS boolean LANGUAGE sql IMMUTABLE AS $$
    SELECT CASE kind
      WHEN 'receipt' THEN from_kind = 'supplier' AND to_kind = 'bin'
      WHEN 'issue' THEN from_kind = 'bin' AND to_kind IN ('person', 'machine')
      WHEN 'return' THEN from_kind IN ('person', 'machine') AND to_kind = 'bin'
      WHEN 'relocation' THEN from_kind = 'bin' AND to_kind = 'bin' AND from_crib = to_crib
      WHEN 'transfer' THEN (from_kind, to_kind) IN (('bin', 'in_transit'), ('in_transit', 'bin'))
      WHEN 'regrind' THEN (from_kind, to_kind) IN (('bin', 'regrind'), ('regrind', 'bin'))
      WHEN 'scrap' THEN from_kind IN ('bin', 'person', 'machine', 'regrind', 'in_transit') AND to_kind = 'scrap'
      WHEN 'adjustment' THEN (from_kind IN ${places} AND to_kind = 'count_adjustment')
        OR (from_kind = 'count_adjustment' AND to_kind IN ${places})
      ELSE kind = 'reversal'
    END
  $$;
`

/**
 * LL010 again: an adjustment beyond the bins that is no part of a merge. LL012 again: a piece that is not of the item.
 * LL018 half a merge: each piece leaves the merged item's books and enters the kept one's where it lies, in one
 * statement, and is never reversed by itself.
 */
const checkMerges = `
  CREATE FUNCTION check_merges() RETURNS trigger LANGUAGE plpgsql
    SET enable_seqscan = off SET enable_hashjoin = off SET enable_mergejoin = off SET jit = off AS $$
  DECLARE
    broken record;
  BEGIN
    SELECT source.kind AS from_kind, target.kind AS to_kind INTO broken
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT kind FROM locations WHERE id = posted.from_location_id OFFSET 0) AS source
      CROSS JOIN LATERAL (SELECT kind FROM locations WHERE id = posted.to_location_id OFFSET 0) AS target
      WHERE posted.kind = 'adjustment' AND posted.merged_item_id IS NULL AND 'bin' NOT IN (source.kind, target.kind)
      LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION 'no adjustment runs from this % to this %', broken.from_kind, broken.to_kind USING
        ERRCODE = 'LL010', TABLE = 'movements', CONSTRAINT = 'movements_kind_fixes_places';
    END IF;

    SELECT piece.tag INTO broken
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT tag, item_id FROM pieces WHERE id = posted.piece_id OFFSET 0) AS piece
      WHERE piece.item_id <> coalesce(posted.merged_item_id, posted.item_id) LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION 'piece % is of another item', broken.tag USING
        ERRCODE = 'LL012', TABLE = 'movements', CONSTRAINT = 'movements_piece_of_item';
    END IF;

    SELECT posted.reverses_id INTO broken
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT merged_item_id FROM movements WHERE id = posted.reverses_id OFFSET 0) AS reversed
      WHERE reversed.merged_item_id IS NOT NULL LIMIT 1;
    IF FOUND THEN
      RAISE EXCEPTION 'movement % is half of a merge', broken.reverses_id USING
        ERRCODE = 'LL018', TABLE = 'movements', CONSTRAINT = 'movements_merge_stays';
    END IF;

    IF NOT EXISTS (SELECT FROM new_rows WHERE merged_item_id IS NOT NULL) THEN
      RETURN NULL;
    END IF;

    SELECT posted.merged_item_id INTO broken
      FROM new_rows AS posted
      CROSS JOIN LATERAL (SELECT is_outside FROM locations WHERE id = posted.from_location_id OFFSET 0) AS source
      LEFT JOIN LATERAL (SELECT kept_item_id FROM item_merges WHERE item_id = posted.merged_item_id OFFSET 0) AS merge
        ON true
      WHERE posted.merged_item_id IS NOT NULL AND (
        posted.from_condition <> posted.to_condition
        OR posted.item_id IS DISTINCT FROM
          CASE WHEN source.is_outside THEN merge.kept_item_id ELSE posted.merged_item_id END) LIMIT 1;
    IF NOT FOUND THEN
      SELECT posted.merged_item_id INTO broken
        FROM new_rows AS posted
        CROSS JOIN LATERAL (SELECT is_outside FROM locations WHERE id = posted.from_location_id OFFSET 0) AS source
        WHERE posted.merged_item_id IS NOT NULL
        GROUP BY posted.merged_item_id, posted.piece_id, posted.from_condition,
          CASE WHEN source.is_outside THEN posted.to_location_id ELSE posted.from_location_id END
        HAVING sum(CASE WHEN source.is_outside THEN posted.quantity ELSE -posted.quantity END) <> 0
        LIMIT 1;
    END IF;
    IF FOUND THEN
      RAISE EXCEPTION 'half of the merge of item %', broken.merged_item_id USING
        ERRCODE = 'LL018', TABLE = 'movements', CONSTRAINT = 'movements_merge_in_pairs';
    END IF;

    UPDATE pieces SET item_id = posted.item_id FROM new_rows AS posted
      WHERE pieces.id = posted.piece_id AND posted.merged_item_id <> posted.item_id;
    RETURN NULL;
  END $$;
  -- After movements_checked, before movements_posted.
  CREATE TRIGGER movements_checked_merges AFTER INSERT ON movements REFERENCING NEW TABLE AS new_rows
    FOR EACH STATEMENT EXECUTE FUNCTION check_merges();
`

/** A piece changes its item by the movements of a merge alone. */
const guardOfPieces = (isOtherItemRefused: string) => `
  CREATE OR REPLACE FUNCTION keep_piece_place() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF TG_OP = 'INSERT' THEN
      IF NEW.location_id IS NOT NULL THEN
        RAISE EXCEPTION 'a piece comes in by a movement' USING
          ERRCODE = 'LL002', TABLE = 'pieces', CONSTRAINT = 'pieces_place_kept_by_movements';
      END IF;
      RETURN NEW;
    END IF;
    IF (OLD.location_id, OLD.condition) IS DISTINCT FROM (NEW.location_id, NEW.condition) AND pg_trigger_depth() < 2
      OR OLD.item_id <> NEW.item_id AND ${isOtherItemRefused} THEN
      RAISE EXCEPTION 'a piece is moved by a movement and stays of its item' USING
        ERRCODE = 'LL002', TABLE = 'pieces', CONSTRAINT = 'pieces_place_kept_by_movements';
    END IF;
    NEW.version := OLD.version + 1;
    NEW.updated_at := now();
    RETURN NEW;
  END $$;
`

/** Tagged pieces that have not come in yet, or that a count missed, go over too; what is scrapped stays with its code. */
const piecesNowhere = `
  CREATE FUNCTION take_pieces_over() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    UPDATE pieces SET item_id = NEW.kept_item_id
      WHERE item_id = NEW.item_id
        AND (location_id IS NULL OR location_id IN (SELECT id FROM locations WHERE kind = 'count_adjustment'))
        AND EXISTS (SELECT FROM items WHERE id = NEW.kept_item_id AND is_tracked_by_piece);
    RETURN NULL;
  END $$;
  CREATE TRIGGER item_merges_pieces AFTER INSERT ON item_merges
    FOR EACH ROW EXECUTE FUNCTION take_pieces_over();
`
