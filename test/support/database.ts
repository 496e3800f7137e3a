import { execFile } from 'node:child_process'
import { createHash, randomBytes } from 'node:crypto'
import { readdirSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { promisify } from 'node:util'
import knex, { type Knex } from 'knex'
import { knexConfig } from '@/server/db/knex-config'

const projectFolder = fileURLToPath(new URL('../..', import.meta.url))
const templateLock = 72_616_452

export interface TestDatabase {
  db: Knex
  url: string
  /** Closes the pool and drops the database. */
  drop(): Promise<void>
}

/** A migrated database of a test file's own: a clone of the template, so it is there in a blink. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const name = `leadline_test_${randomBytes(8).toString('hex')}`
  await onServer(async (server) => {
    const template = await ensureTemplate(server)
    await server.raw('create database ?? template ??', [name, template])
  })
  const url = databaseUrl(name)
  const db = knex(knexConfig(url))
  return {
    db,
    url,
    drop: async () => {
      await db.destroy()
      await dropDatabase(name)
    },
  }
}

/** An empty database, for tests of the migrations themselves. */
export async function createEmptyDatabase(): Promise<TestDatabase> {
  const name = `leadline_test_${randomBytes(8).toString('hex')}`
  await onServer((server) => server.raw('create database ??', [name]))
  const url = databaseUrl(name)
  const db = knex(knexConfig(url))
  return {
    db,
    url,
    drop: async () => {
      await db.destroy()
      await dropDatabase(name)
    },
  }
}

/** Runs the migrations the way `make start` does, in a process of its own, since they are TypeScript that Knex loads. */
export async function migrateDatabase(url: string): Promise<void> {
  const argv = ['--conditions=react-server', '--import', 'tsx', 'src/server/db/migrate.ts']
  await promisify(execFile)(process.execPath, argv, {
    cwd: projectFolder,
    env: { ...process.env, DATABASE_URL: url },
  })
}

/** Drops the templates; for the end of a test run. */
export async function dropTemplates(): Promise<void> {
  await onServer(async (server) => {
    const { rows } = await server.raw(
      "select datname from pg_database where datname like 'leadline\\_template\\_%'",
    )
    for (const { datname } of rows) await server.raw('drop database if exists ??', [datname])
  })
}

async function dropDatabase(name: string): Promise<void> {
  await onServer((server) => server.raw('drop database if exists ?? with (force)', [name]))
}

/**
 * The migrated template, made once however many test files ask for it at once. It is made under another name, so that
 * one left half done is never taken for whole; its name tells the migrations it was made from.
 */
async function ensureTemplate(server: Knex): Promise<string> {
  const template = `leadline_template_${migrationsHash()}`
  await server.transaction(async (lock) => {
    await lock.raw('select pg_advisory_xact_lock(?)', [templateLock])
    if (await lock('pg_database').where('datname', template).first('datname')) return
    const draft = `${template}_draft`
    await server.raw('drop database if exists ?? with (force)', [draft])
    await server.raw('create database ??', [draft])
    await migrateDatabase(databaseUrl(draft))
    await server.raw('alter database ?? rename to ??', [draft, template])
  })
  return template
}

function migrationsHash(): string {
  const folder = `${projectFolder}db/migrations/`
  const hash = createHash('sha256')
  for (const name of readdirSync(folder).sort()) hash.update(name).update(readFileSync(folder + name))
  return hash.digest('hex').slice(0, 12)
}

async function onServer<Answer>(work: (server: Knex) => Promise<Answer>): Promise<Answer> {
  const server = knex(knexConfig(databaseUrl('postgres'), { min: 0, max: 2 }))
  try {
    return await work(server)
  } finally {
    await server.destroy()
  }
}

/** An address on the test server, which must be this machine: these tests make and drop databases. */
function databaseUrl(name: string): string {
  const server = process.env.TEST_DATABASE_URL ?? process.env.DATABASE_URL
  if (!server) throw new Error('Database tests need TEST_DATABASE_URL, the address of a PostgreSQL server.')
  const url = new URL(server)
  assertLocalDatabase(url)
  url.pathname = `/${name}`
  return url.href
}

export function assertLocalDatabase(url: URL): void {
  const host = url.searchParams.get('host') ?? url.hostname
  if (!['127.0.0.1', 'localhost', '::1', '[::1]'].includes(host)) {
    throw new Error(`Tests refuse a database that is not on this machine: ${host || 'no host is named'}.`)
  }
}
