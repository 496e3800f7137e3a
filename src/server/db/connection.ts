import 'server-only'
import knex, { type Knex } from 'knex'
import { env } from '../env'
import { knexConfig } from './knex-config'

let pool: Knex | undefined

/** The pool of this process, made when it is first asked for. */
export function db(): Knex {
  pool ??= knex(knexConfig(env().DATABASE_URL))
  return pool
}

/** Ends the pool, so that a script can end. */
export async function closeDb(): Promise<void> {
  await pool?.destroy()
  pool = undefined
}

/** What a service may hold of the database: the pool, or the transaction it opened. */
export type Database = Knex
