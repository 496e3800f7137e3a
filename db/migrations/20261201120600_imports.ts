import type { Knex } from 'knex'

const kinds = `('cutters', 'holders', 'collets', 'extensions', 'stock')`

/** Files on their way in: the file, its rows staged and checked, and the headings a shop has explained once. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE imports (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      kind text NOT NULL CHECK (kind IN ${kinds}),
      state text NOT NULL DEFAULT 'reading'
        CHECK (state IN ('reading', 'checked', 'committing', 'committed', 'failed', 'cancelled')),
      unit text CHECK (unit IN ('mm', 'in')),
      mapping jsonb,
      rejects text CHECK (rejects IN ('stop', 'skip')),
      file_name text NOT NULL CHECK (length(file_name) BETWEEN 1 AND 255),
      file_size_bytes bigint NOT NULL CHECK (file_size_bytes >= 0),
      file_path text,
      encoding text,
      delimiter text,
      headings jsonb,
      warnings jsonb NOT NULL DEFAULT '[]',
      rows_read integer NOT NULL DEFAULT 0,
      rows_total integer,
      added integer NOT NULL DEFAULT 0,
      changed integer NOT NULL DEFAULT 0,
      unchanged integer NOT NULL DEFAULT 0,
      rejected_count integer NOT NULL DEFAULT 0,
      error text,
      created_by bigint NOT NULL REFERENCES users,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      checked_at timestamptz,
      ended_at timestamptz,
      CONSTRAINT imports_ended CHECK ((state IN ('committed', 'failed', 'cancelled')) = (ended_at IS NOT NULL)),
      CONSTRAINT imports_file_dropped_at_end CHECK (ended_at IS NULL OR file_path IS NULL)
    );
    COMMENT ON COLUMN imports.mapping IS 'column to field, as the person set it';
    COMMENT ON COLUMN imports.file_path IS 'where the stored file is; null once it is dropped';
    COMMENT ON COLUMN imports.rejects IS 'what the commit does with rejected rows';
    CREATE INDEX imports_created_by_idx ON imports (created_by, id);
    CREATE INDEX imports_state_idx ON imports (state) WHERE ended_at IS NULL;

    CREATE TABLE import_rows (
      import_id bigint NOT NULL REFERENCES imports ON DELETE CASCADE,
      line integer NOT NULL CHECK (line >= 1),
      outcome text NOT NULL CHECK (outcome IN ('added', 'changed', 'unchanged', 'rejected')),
      item_id bigint REFERENCES items,
      cells jsonb NOT NULL,
      field_values jsonb,
      problems jsonb NOT NULL DEFAULT '[]',
      PRIMARY KEY (import_id, line)
    );
    COMMENT ON COLUMN import_rows.line IS 'where the row begins in the file';
    COMMENT ON COLUMN import_rows.cells IS 'the row as it stood in the file: an array of strings';
    COMMENT ON COLUMN import_rows.field_values IS 'what was read from it, by column of the database';
    COMMENT ON COLUMN import_rows.problems IS 'an array of {column, value, message}';
    CREATE INDEX import_rows_rejected_idx ON import_rows (import_id, line) WHERE outcome = 'rejected';
    CREATE INDEX import_rows_item_id_idx ON import_rows (item_id) WHERE item_id IS NOT NULL;

    CREATE TABLE import_mappings (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      kind text NOT NULL CHECK (kind IN ${kinds}),
      headings jsonb NOT NULL CHECK (jsonb_typeof(headings) = 'array'),
      mapping jsonb NOT NULL,
      unit text CHECK (unit IN ('mm', 'in')),
      updated_by bigint NOT NULL REFERENCES users,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    COMMENT ON COLUMN import_mappings.headings IS 'the file''s headings: an array of strings, lower case, sorted';
    -- By digest, since two hundred headings are longer than an index entry may be.
    CREATE UNIQUE INDEX import_mappings_kind_headings_idx ON import_mappings (kind, md5(headings::text));
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE import_mappings, import_rows, imports')
}
