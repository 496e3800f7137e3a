import { type Database, db } from '../../db/connection'

/** First half of the advisory locks of imports; the second is the import's id. */
const lockClass = 72_616

/**
 * Runs `work` unless another process is at this import. The lock is a transaction's, so it goes with the process that
 * held it, however that ends.
 */
export async function whileAlone(importId: string, work: () => Promise<void>): Promise<void> {
  await db().transaction(async (lock: Database) => {
    const { rows } = await lock.raw('select pg_try_advisory_xact_lock(?, ?::int) as is_held', [
      lockClass,
      importId,
    ])
    if (rows[0].is_held) await work()
  })
}

/** Ends a run over an import that another run, a cancel or a re-check has taken away. */
export class ClaimLost extends Error {
  override readonly name = 'ClaimLost'
}

/** Throws ClaimLost where a claimed write found the import taken away. */
export async function held(write: Promise<boolean>): Promise<void> {
  if (!(await write)) throw new ClaimLost()
}
