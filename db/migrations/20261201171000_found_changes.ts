import type { Knex } from 'knex'

/** One field of everything a filter found, changed in one go, with what stood in each row before, so that it can be taken back. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE found_changes (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      actor_id bigint NOT NULL REFERENCES users (id),
      kind text NOT NULL CHECK (kind IN ('cutter', 'holder', 'collet', 'extension')),
      field text NOT NULL CHECK (field <> ''),
      value jsonb NOT NULL,
      changed_at timestamptz NOT NULL DEFAULT now(),
      undone_at timestamptz
    );
    COMMENT ON COLUMN found_changes.value IS 'as the API takes it; the JSON null where the field was cleared';
    CREATE INDEX found_changes_actor_id_idx ON found_changes (actor_id, kind, id) WHERE undone_at IS NULL;
    CREATE INDEX found_changes_changed_at_idx ON found_changes (changed_at);

    CREATE TABLE found_change_rows (
      found_change_id bigint NOT NULL REFERENCES found_changes (id) ON DELETE CASCADE,
      item_id bigint NOT NULL REFERENCES items (id),
      before jsonb NOT NULL,
      version integer NOT NULL,
      PRIMARY KEY (found_change_id, item_id)
    );
    COMMENT ON COLUMN found_change_rows.version IS 'of the item once it was changed: while it has this version, nobody changed it since';
    CREATE INDEX found_change_rows_item_id_idx ON found_change_rows (item_id);
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE found_change_rows, found_changes')
}
