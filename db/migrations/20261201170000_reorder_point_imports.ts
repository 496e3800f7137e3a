import type { Knex } from 'knex'

/** Reorder points come by file too. */
export async function up(knex: Knex): Promise<void> {
  await setKinds(knex, [...kindsBefore, 'reorder_points'])
  await knex.raw(`
    COMMENT ON COLUMN import_rows.item_version IS 'of what was compared: the item, or its reorder point in the crib'
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DELETE FROM import_rows WHERE import_id IN (SELECT id FROM imports WHERE kind = 'reorder_points');
    DELETE FROM imports WHERE kind = 'reorder_points';
    DELETE FROM import_mappings WHERE kind = 'reorder_points';
    COMMENT ON COLUMN import_rows.item_version IS 'of the item when it was compared';
  `)
  await setKinds(knex, kindsBefore)
}

const kindsBefore = ['cutters', 'holders', 'collets', 'extensions', 'stock']

async function setKinds(knex: Knex, kinds: readonly string[]): Promise<void> {
  const list = kinds.map((kind) => `'${kind}'`).join(', ')
  for (const table of ['imports', 'import_mappings']) {
    await knex.raw(`
      ALTER TABLE ${table} DROP CONSTRAINT ${table}_kind_check;
      ALTER TABLE ${table} ADD CONSTRAINT ${table}_kind_check CHECK (kind IN (${list}));
    `)
  }
}
