import knex from 'knex'
import { databaseUrl } from '../env'
import { knexConfig } from './knex-config'
import { ledgerFaults } from './ledger-faults'

const db = knex(knexConfig(databaseUrl(), { min: 0, max: 1 }))
try {
  const { movements, faults } = await ledgerFaults(db)
  for (const fault of faults) process.stdout.write(`${fault}\n`)
  const verdict = faults.length === 0 ? 'the books are right' : `${faults.length} wrong`
  process.stdout.write(`${movements} movements checked: ${verdict}\n`)
  process.exitCode = faults.length === 0 ? 0 : 1
} finally {
  await db.destroy()
}
