import 'server-only'
import type { Knex } from 'knex'
import PgBoss from 'pg-boss'
import type { z } from 'zod'
import { db } from '../db/connection'
import { withRawConnection } from '../db/raw-connection'
import { log } from '../log'
import { type JobDefinition, jobDefinitions } from './definitions'

/** pg-boss's way into a database of ours: a transaction of Knex, or its pool. */
function bossDb(knex: Knex): PgBoss.Db {
  return {
    executeSql: (text, values) => withRawConnection(knex, (connection) => connection.query(text, values)),
  }
}

const startLock = 72_616_453

/** A queue on the pool of this process, with its tables and every queue in place; `supervise` in the worker alone. */
export async function startBoss(options: { supervise: boolean }): Promise<PgBoss> {
  const boss = new PgBoss({ db: bossDb(db()), supervise: options.supervise, schedule: false })
  boss.on('error', (error) => log.error({ error: error.stack }, 'job queue'))
  // Web server and worker may come up at once, and making the same queue twice is a deadlock to PostgreSQL.
  await db().transaction(async (lock) => {
    await lock.raw('select pg_advisory_xact_lock(?)', [startLock])
    await boss.start()
    for (const { name } of jobDefinitions) await boss.createQueue(name)
  })
  return boss
}

let sender: Promise<PgBoss> | undefined

async function startSender(): Promise<PgBoss> {
  try {
    return await startBoss({ supervise: false })
  } catch (error) {
    sender = undefined
    throw error
  }
}

/** Asks the worker for a job, in the transaction of the change it belongs to: both happen or neither. */
export async function sendJob<Payload extends z.ZodType>(
  trx: Knex.Transaction,
  job: JobDefinition<Payload>,
  payload: z.input<Payload> & object,
): Promise<void> {
  sender ??= startSender()
  const boss = await sender
  await boss.send(job.name, payload, { db: bossDb(trx), retryLimit: 3, retryDelay: 5, expireInHours: 2 })
}
