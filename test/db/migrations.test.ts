import { execFile } from 'node:child_process'
import { readFile } from 'node:fs/promises'
import { fileURLToPath } from 'node:url'
import { promisify } from 'node:util'
import type { Knex } from 'knex'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { rowTypesSource } from '@/server/db/row-types-source'
import { createBooks, receive } from '../support/books'
import {
  assertLocalDatabase,
  createEmptyDatabase,
  createTestDatabase,
  migrateDatabase,
  type TestDatabase,
} from '../support/database'

const projectFolder = fileURLToPath(new URL('../..', import.meta.url))

let database: TestDatabase

beforeAll(async () => {
  database = await createEmptyDatabase()
})
afterAll(() => database.drop())

/** Every table's columns and constraints, every index, trigger and function, in words. */
async function schemaOf(db: Knex): Promise<string[]> {
  const { rows } = await db.raw(`
    select table_name || '.' || column_name || ' ' || udt_name || ' ' || is_nullable || ' ' || coalesce(column_default, '')
        || coalesce(generation_expression, '') as part
      from information_schema.columns where table_schema = 'public'
    union all
    select conrelid::regclass || ' ' || conname || ' ' || pg_get_constraintdef(oid) from pg_constraint
      where connamespace = 'public'::regnamespace
    union all
    select indexdef from pg_indexes where schemaname = 'public'
    union all
    select pg_get_triggerdef(pg_trigger.oid) from pg_trigger where not tgisinternal
    union all
    select pg_get_functiondef(pg_proc.oid) from pg_proc
      where pronamespace = 'public'::regnamespace
        and not exists (select from pg_depend where objid = pg_proc.oid and deptype = 'e')
    order by part`)
  return rows.map((row: { part: string }) => row.part)
}

async function rollBackAll(url: string): Promise<void> {
  const argv = [
    '--import',
    'tsx',
    'node_modules/.bin/knex',
    '--knexfile',
    'knexfile.ts',
    'migrate:rollback',
    '--all',
  ]
  await promisify(execFile)(process.execPath, argv, {
    cwd: projectFolder,
    env: { ...process.env, DATABASE_URL: url },
  })
}

const isKnexOwn = (part: string) => part.includes('knex_migrations')

describe('the migrations', () => {
  test('they go up, down to nothing, and up again to the same', async () => {
    await migrateDatabase(database.url)
    const first = await schemaOf(database.db)
    expect(first.filter((part) => !isKnexOwn(part)).length).toBeGreaterThan(300)
    await rollBackAll(database.url)
    const nothing = await schemaOf(database.db)
    expect(nothing.filter((part) => !isKnexOwn(part))).toEqual([])
    await migrateDatabase(database.url)
    expect(await schemaOf(database.db)).toEqual(first)
  })

  test('they run once where two start at the same time', async () => {
    await rollBackAll(database.url)
    await Promise.all([migrateDatabase(database.url), migrateDatabase(database.url)])
    const names = await database.db('knex_migrations').select('name')
    expect(new Set(names.map((row) => row.name)).size).toBe(names.length)
    expect(names.length).toBeGreaterThan(0)
  })

  test('they get past a lock that a killed run left behind, and leave what is there', async () => {
    await receive(database.db, await createBooks(database.db), 3)
    await database.db('knex_migrations_lock').update({ is_locked: 1 })
    await migrateDatabase(database.url)
    expect(await database.db('knex_migrations_lock').select('is_locked')).toEqual([{ is_locked: 0 }])
    expect(await database.db('movements').select('quantity')).toEqual([{ quantity: 3 }])
  })
})

describe('the row types', () => {
  test('they are what the database says of itself', async () => {
    const migrated = await createTestDatabase()
    const source = await rowTypesSource(migrated.db)
    await migrated.drop()
    expect(await readFile(`${projectFolder}src/server/db/row-types.ts`, 'utf8')).toBe(source)
  })
})

describe('a test', () => {
  test('it refuses a database that is not on this machine', () => {
    for (const address of [
      'postgres://shop@db.leadline.example/books',
      'postgres://127.0.0.1.leadline.example/books',
      'postgres://127.0.0.1/books?host=db.leadline.example',
      'postgres:///books',
    ]) {
      expect(() => assertLocalDatabase(new URL(address)), address).toThrow('not on this machine')
    }
    for (const address of [
      'postgres://127.0.0.1:5/books',
      'postgres://me@localhost/books',
      'postgres://[::1]/books',
    ]) {
      expect(() => assertLocalDatabase(new URL(address)), address).not.toThrow()
    }
  })
})
