import knex, { type Knex } from 'knex'
import { databaseUrl } from '../env'
import { knexConfig } from './knex-config'

/** Any number will do, as long as nobody else in this database uses it. */
const advisoryLock = 72_616_451

/**
 * Brings the database up to date and answers the names of the migrations it ran. Two at once follow each other. A lock
 * of Knex's own that a killed run left behind is freed first, which is safe once the advisory lock is held.
 */
async function migrateToLatest(url: string): Promise<string[]> {
  const db = knex(knexConfig(url, { min: 0, max: 4 }))
  try {
    return await db.transaction(async (lock) => {
      await lock.raw('select pg_advisory_xact_lock(?)', [advisoryLock])
      return runMigrations(db)
    })
  } finally {
    await db.destroy()
  }
}

async function runMigrations(db: Knex): Promise<string[]> {
  await db.migrate.forceFreeMigrationsLock()
  const [, names] = await db.migrate.latest()
  return names
}

try {
  for (const name of await migrateToLatest(databaseUrl())) process.stdout.write(`${name}\n`)
} catch (error) {
  process.stderr.write(`${causeOf(error)}\n`)
  process.exitCode = 1
}

/** Knex puts the whole statement before the cause, and has shown it by now; a refused connection has no words at all. */
function causeOf(error: unknown): string {
  if (!(error instanceof Error)) return String(error)
  if (error instanceof AggregateError) return error.errors.map(causeOf).join('; ')
  return error.message.split(' - ').at(-1) ?? error.message
}
