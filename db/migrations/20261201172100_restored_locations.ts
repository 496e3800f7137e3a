import type { Knex } from 'knex'

/** A location that is brought back stands in something in use, like one that is added or moved. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(
    checkLocation(
      `TG_OP = 'INSERT' OR OLD.parent_id <> NEW.parent_id
        OR OLD.archived_at IS NOT NULL AND NEW.archived_at IS NULL`,
      'FOR KEY SHARE',
    ),
  )
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(checkLocation(`TG_OP = 'INSERT' OR OLD.parent_id <> NEW.parent_id`, ''))
}

/** The parent is held against being archived, as a foreign key holds it for a location that is added. */
const checkLocation = (isParentAsked: string, hold: string) => `
  CREATE OR REPLACE FUNCTION check_location() RETURNS trigger LANGUAGE plpgsql AS $$
  DECLARE
    ranks CONSTANT text[] := ARRAY['crib', 'cabinet', 'drawer', 'bin'];
    parent locations;
  BEGIN
    IF TG_OP = 'UPDATE' AND (OLD.kind, OLD.crib_id, OLD.user_id) IS DISTINCT FROM (NEW.kind, NEW.crib_id, NEW.user_id) THEN
      RAISE EXCEPTION 'a location keeps its kind, crib and person' USING
        ERRCODE = 'LL003', TABLE = 'locations', CONSTRAINT = 'locations_keep_kind_and_crib';
    END IF;
    IF NEW.parent_id IS NOT NULL AND (${isParentAsked}) THEN
      SELECT * INTO parent FROM locations WHERE id = NEW.parent_id ${hold};
      IF array_position(ranks, parent.kind) >= array_position(ranks, NEW.kind) THEN
        RAISE EXCEPTION 'a % cannot stand in a %', NEW.kind, parent.kind USING
          ERRCODE = 'LL003', TABLE = 'locations', CONSTRAINT = 'locations_ranks_of_tree';
      END IF;
      IF parent.archived_at IS NOT NULL AND NEW.archived_at IS NULL THEN
        RAISE EXCEPTION 'location % is archived', parent.code USING
          ERRCODE = 'LL003', TABLE = 'locations', CONSTRAINT = 'locations_parent_in_use';
      END IF;
    END IF;
    IF TG_OP = 'UPDATE' THEN
      NEW.version := OLD.version + 1;
      NEW.updated_at := now();
    END IF;
    RETURN NEW;
  END $$;
`
