import type { Knex } from 'knex'
import type { Client } from 'pg'

/**
 * Runs `work` on the connection below Knex: for COPY, and for programs that bring SQL with `$1` in it. Of a transaction
 * it is the transaction's own connection; of the pool one that is given back.
 */
export async function withRawConnection<Answer>(
  db: Knex,
  work: (connection: Client) => Promise<Answer>,
): Promise<Answer> {
  const connection: Client = await db.client.acquireConnection()
  try {
    return await work(connection)
  } finally {
    await db.client.releaseConnection(connection)
  }
}
