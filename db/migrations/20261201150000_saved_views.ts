import type { Knex } from 'knex'

/** A list as someone likes to see it: search, filters, sorting and columns as the address bar has them. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE saved_views (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      owner_id bigint NOT NULL REFERENCES users (id),
      kind text NOT NULL CHECK (kind IN ('cutter', 'holder', 'collet', 'extension')),
      name text NOT NULL CHECK (name = btrim(name) AND length(name) BETWEEN 1 AND 100),
      is_shared boolean NOT NULL DEFAULT false,
      query text NOT NULL CHECK (length(query) <= 5000),
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    COMMENT ON COLUMN saved_views.query IS 'of the address; what of it is no longer there is left out when it is opened';
    CREATE UNIQUE INDEX saved_views_name_idx ON saved_views (owner_id, kind, lower(name));
    CREATE INDEX saved_views_kind_idx ON saved_views (kind) WHERE is_shared;
    CREATE TRIGGER saved_views_version BEFORE UPDATE ON saved_views
      FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE saved_views')
}
