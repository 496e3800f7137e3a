import type { Knex } from 'knex'

/** Which archived item went into which: its own movements stay under its old code. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE item_merges (
      item_id bigint PRIMARY KEY REFERENCES items,
      kept_item_id bigint NOT NULL REFERENCES items,
      merged_by bigint NOT NULL REFERENCES users,
      merged_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT item_merges_into_another CHECK (item_id <> kept_item_id)
    );
    COMMENT ON COLUMN item_merges.item_id IS 'archived; brought back, it is merged no more';
    CREATE INDEX item_merges_kept_item_id_idx ON item_merges (kept_item_id);
    CREATE INDEX item_merges_merged_by_idx ON item_merges (merged_by);

    CREATE FUNCTION forget_merge_of_restored_item() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      DELETE FROM item_merges WHERE item_id = NEW.id;
      RETURN NULL;
    END $$;
    CREATE TRIGGER items_restored_merges AFTER UPDATE OF archived_at ON items
      FOR EACH ROW WHEN (OLD.archived_at IS NOT NULL AND NEW.archived_at IS NULL)
      EXECUTE FUNCTION forget_merge_of_restored_item();
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER items_restored_merges ON items;
    DROP FUNCTION forget_merge_of_restored_item();
    DROP TABLE item_merges;
  `)
}
