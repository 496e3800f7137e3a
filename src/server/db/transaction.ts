import 'server-only'
import type { Knex } from 'knex'
import { databaseErrorCode } from './database-errors'

const attempts = 4
/** serialization_failure, deadlock_detected: the same work, done again, may go through. */
const retriedCodes = ['40001', '40P01']

export interface TransactionOptions {
  isolation?: 'read committed' | 'repeatable read' | 'serializable'
}

/**
 * Runs `work` in one transaction: all of it or none. Where PostgreSQL broke it off to untangle it from another, it is
 * run again from the start, a few times at most, so `work` must do nothing outside the database.
 */
export async function inTransaction<Answer>(
  db: Knex,
  work: (trx: Knex.Transaction) => Promise<Answer>,
  options: TransactionOptions = {},
): Promise<Answer> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await db.transaction(work, { isolationLevel: options.isolation ?? 'read committed' })
    } catch (error) {
      const code = databaseErrorCode(error)
      if (attempt === attempts || !code || !retriedCodes.includes(code)) throw error
      await pauseMs(Math.random() * 20 * 2 ** attempt)
    }
  }
}

function pauseMs(ms: number): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, ms))
}
