import type { Knex } from 'knex'

/** What holds for all rows of a file that has no column for it. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE imports ADD COLUMN defaults jsonb NOT NULL DEFAULT '{}' CHECK (jsonb_typeof(defaults) = 'object');
    COMMENT ON COLUMN imports.defaults IS 'field to what is written for it where a row gives nothing';
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE imports DROP COLUMN defaults')
}
