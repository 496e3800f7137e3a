import type { Knex } from 'knex'

/** Where stock can be: a tree in each crib, a place for every person, and the far ends of the books. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(locations)
  await knex.raw(placesOfCribsAndPeople)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER cribs_location ON cribs;
    DROP TRIGGER users_location ON users;
    DROP FUNCTION keep_crib_location(), keep_user_location();
    DROP TABLE locations;
    DROP FUNCTION check_location();
  `)
}

const locations = `
  CREATE TABLE locations (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    kind text NOT NULL CHECK (kind IN ('crib', 'cabinet', 'drawer', 'bin', 'person', 'machine', 'regrind', 'in_transit',
      'supplier', 'scrap', 'count_adjustment')),
    code text NOT NULL CHECK (code = btrim(code) AND length(code) BETWEEN 1 AND 254),
    name text NOT NULL CHECK (length(btrim(name)) BETWEEN 1 AND 200),
    crib_id bigint REFERENCES cribs,
    parent_id bigint,
    user_id bigint UNIQUE REFERENCES users,
    is_outside boolean NOT NULL GENERATED ALWAYS AS (kind IN ('supplier', 'scrap', 'count_adjustment')) STORED,
    version integer NOT NULL DEFAULT 1,
    archived_at timestamptz,
    created_at timestamptz NOT NULL DEFAULT now(),
    updated_at timestamptz NOT NULL DEFAULT now(),
    UNIQUE (id, crib_id),
    UNIQUE (id, is_outside),
    CONSTRAINT locations_parent_in_crib FOREIGN KEY (parent_id, crib_id) REFERENCES locations (id, crib_id),
    CONSTRAINT locations_crib_of_tree CHECK ((kind IN ('crib', 'cabinet', 'drawer', 'bin')) = (crib_id IS NOT NULL)),
    CONSTRAINT locations_parent_of_tree CHECK ((kind IN ('cabinet', 'drawer', 'bin')) = (parent_id IS NOT NULL)),
    CONSTRAINT locations_user_of_person CHECK ((kind = 'person') = (user_id IS NOT NULL))
  );
  COMMENT ON COLUMN locations.is_outside IS 'a far end of the books, which no page shows';
  CREATE UNIQUE INDEX locations_crib_id_code_idx ON locations (crib_id, lower(code)) NULLS NOT DISTINCT;
  CREATE UNIQUE INDEX locations_one_root_of_crib_idx ON locations (crib_id) WHERE kind = 'crib';
  CREATE UNIQUE INDEX locations_one_outside_of_kind_idx ON locations (kind)
    WHERE kind IN ('supplier', 'scrap', 'count_adjustment');
  CREATE INDEX locations_parent_id_idx ON locations (parent_id);
  CREATE INDEX locations_kind_idx ON locations (kind);

  -- LL003: a tree goes crib, cabinet, drawer, bin, each rank to be left out but never turned round, so it has no rings;
  -- and what a location is, and in which crib, stays: balances and levels were counted by it.
  CREATE FUNCTION check_location() RETURNS trigger LANGUAGE plpgsql AS $$
  DECLARE
    ranks CONSTANT text[] := ARRAY['crib', 'cabinet', 'drawer', 'bin'];
    parent locations;
  BEGIN
    IF TG_OP = 'UPDATE' AND (OLD.kind, OLD.crib_id, OLD.user_id) IS DISTINCT FROM (NEW.kind, NEW.crib_id, NEW.user_id) THEN
      RAISE EXCEPTION 'a location keeps its kind, crib and person' USING
        ERRCODE = 'LL003', TABLE = 'locations', CONSTRAINT = 'locations_keep_kind_and_crib';
    END IF;
    IF NEW.parent_id IS NOT NULL AND (TG_OP = 'INSERT' OR OLD.parent_id <> NEW.parent_id) THEN
      SELECT * INTO parent FROM locations WHERE id = NEW.parent_id;
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
  CREATE TRIGGER locations_checked BEFORE INSERT OR UPDATE ON locations
    FOR EACH ROW EXECUTE FUNCTION check_location();

  INSERT INTO locations (kind, code, name) VALUES
    ('supplier', 'outside:supplier', 'Supplier'),
    ('scrap', 'outside:scrap', 'Scrap'),
    ('count_adjustment', 'outside:count_adjustment', 'Count adjustment');
`

/** Every crib has its root and every person a place, named after them; both follow when the name changes. */
const placesOfCribsAndPeople = `
  CREATE FUNCTION keep_crib_location() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF TG_OP = 'INSERT' THEN
      INSERT INTO locations (kind, code, name, crib_id) VALUES ('crib', NEW.code, NEW.name, NEW.id);
    ELSE
      UPDATE locations SET code = NEW.code, name = NEW.name WHERE crib_id = NEW.id AND kind = 'crib';
    END IF;
    RETURN NULL;
  END $$;
  CREATE TRIGGER cribs_location AFTER INSERT OR UPDATE OF code, name ON cribs
    FOR EACH ROW EXECUTE FUNCTION keep_crib_location();
  INSERT INTO locations (kind, code, name, crib_id) SELECT 'crib', code, name, id FROM cribs;

  CREATE FUNCTION keep_user_location() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF TG_OP = 'INSERT' THEN
      INSERT INTO locations (kind, code, name, user_id) VALUES ('person', lower(NEW.email), NEW.name, NEW.id);
    ELSE
      UPDATE locations SET code = lower(NEW.email), name = NEW.name WHERE user_id = NEW.id;
    END IF;
    RETURN NULL;
  END $$;
  CREATE TRIGGER users_location AFTER INSERT OR UPDATE OF email, name ON users
    FOR EACH ROW EXECUTE FUNCTION keep_user_location();
  INSERT INTO locations (kind, code, name, user_id) SELECT 'person', lower(email), name, id FROM users;
`
