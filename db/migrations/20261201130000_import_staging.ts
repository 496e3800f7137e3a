import type { Knex } from 'knex'

/** What staging needs beyond the first import tables: which run of the worker writes, and headings kept one by one. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE imports
      ADD COLUMN attempt integer NOT NULL DEFAULT 0,
      ADD COLUMN heading_line integer,
      ADD COLUMN warning_count integer NOT NULL DEFAULT 0;
    COMMENT ON COLUMN imports.attempt IS 'raised by each run of the worker: an older run that still lives can write nothing more';
    COMMENT ON COLUMN imports.headings IS 'the columns of the file: an array of {heading, samples, field, unit, origin, note}';
    COMMENT ON COLUMN imports.error IS 'why it failed, or why a commit was turned back';

    ALTER TABLE import_rows
      ADD COLUMN item_version integer,
      ADD COLUMN changes jsonb NOT NULL DEFAULT '[]';
    COMMENT ON COLUMN import_rows.line IS 'where the item begins in the file; an outline takes several rows';
    COMMENT ON COLUMN import_rows.cells IS 'the rows as they stood in the file: an array of {line, cells}';
    COMMENT ON COLUMN import_rows.item_version IS 'of the item when it was compared';
    COMMENT ON COLUMN import_rows.changes IS 'an array of {field, before, after}';
    CREATE INDEX import_rows_outcome_idx ON import_rows (import_id, outcome, line);
    DROP INDEX import_rows_rejected_idx;

    -- By heading instead of by whole sets of them: a list that gains a column keeps what was said of the others.
    DROP TABLE import_mappings;
    CREATE TABLE import_mappings (
      kind text NOT NULL CHECK (kind IN ('cutters', 'holders', 'collets', 'extensions', 'stock')),
      heading text NOT NULL CHECK (length(heading) BETWEEN 1 AND 500),
      field text,
      unit text CHECK (unit IN ('mm', 'in')),
      updated_by bigint NOT NULL REFERENCES users,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (kind, heading)
    );
    COMMENT ON COLUMN import_mappings.heading IS 'in lower case';
    COMMENT ON COLUMN import_mappings.field IS 'null: the column is left out';
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TABLE import_mappings;
    CREATE TABLE import_mappings (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      kind text NOT NULL CHECK (kind IN ('cutters', 'holders', 'collets', 'extensions', 'stock')),
      headings jsonb NOT NULL CHECK (jsonb_typeof(headings) = 'array'),
      mapping jsonb NOT NULL,
      unit text CHECK (unit IN ('mm', 'in')),
      updated_by bigint NOT NULL REFERENCES users,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE UNIQUE INDEX import_mappings_kind_headings_idx ON import_mappings (kind, md5(headings::text));
    DROP INDEX import_rows_outcome_idx;
    CREATE INDEX import_rows_rejected_idx ON import_rows (import_id, line) WHERE outcome = 'rejected';
    ALTER TABLE import_rows DROP COLUMN changes, DROP COLUMN item_version;
    ALTER TABLE imports DROP COLUMN warning_count, DROP COLUMN heading_line, DROP COLUMN attempt;
  `)
}
