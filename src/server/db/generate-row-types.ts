import { writeFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import knex from 'knex'
import { databaseUrl } from '../env'
import { knexConfig } from './knex-config'
import { rowTypesSource } from './row-types-source'

const db = knex(knexConfig(databaseUrl(), { min: 0, max: 1 }))
try {
  writeFileSync(fileURLToPath(new URL('./row-types.ts', import.meta.url)), await rowTypesSource(db))
} finally {
  await db.destroy()
}
