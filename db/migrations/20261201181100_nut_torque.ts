import type { Knex } from 'knex'

/** What the nut of a chuck is tightened to: set-up sheets say it where it is known. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE holders ADD COLUMN nut_torque_nm integer CHECK (nut_torque_nm BETWEEN 1 AND 2000);
    ALTER TABLE extensions ADD COLUMN nut_torque_nm integer CHECK (nut_torque_nm BETWEEN 1 AND 2000);
    COMMENT ON COLUMN holders.nut_torque_nm IS 'as the maker says; null: not known';
    COMMENT ON COLUMN extensions.nut_torque_nm IS 'as the maker says; null: not known';
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE extensions DROP COLUMN nut_torque_nm;
    ALTER TABLE holders DROP COLUMN nut_torque_nm;
  `)
}
