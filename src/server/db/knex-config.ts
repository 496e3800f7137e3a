import type { Knex } from 'knex'

/**
 * How every process of Leadline talks to its database, the Knex command line included. Migrations are run from source
 * everywhere, in the project's folder, so that their recorded names (which carry `.ts`) stay the same.
 */
export function knexConfig(databaseUrl: string, pool: Knex.PoolConfig = { min: 0, max: 10 }): Knex.Config {
  return {
    client: 'pg',
    connection: { connectionString: databaseUrl, application_name: 'leadline' },
    pool,
    acquireConnectionTimeout: 20_000,
    migrations: { directory: './db/migrations', extension: 'ts', loadExtensions: ['.ts'] },
  }
}
