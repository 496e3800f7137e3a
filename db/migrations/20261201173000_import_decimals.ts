import type { Knex } from 'knex'

/** Whether a file writes decimals with a point or a comma: said for the import, or guessed from its numbers. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE imports
      ADD COLUMN decimals text CHECK (decimals IN ('point', 'comma')),
      ADD COLUMN decimals_origin text CHECK (decimals_origin IN ('set', 'guessed', 'shop')),
      ADD CONSTRAINT imports_decimals_have_an_origin CHECK ((decimals IS NULL) = (decimals_origin IS NULL));
    COMMENT ON COLUMN imports.decimals IS 'by which the file is read; null until it has been looked at';
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE imports DROP COLUMN decimals, DROP COLUMN decimals_origin')
}
