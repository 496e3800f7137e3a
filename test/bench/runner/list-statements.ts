import { randomBytes } from 'node:crypto'
import { cutterListQuerySchema } from '@/schemas/cutter'
import type { Actor } from '@/server/auth/actor'

export interface Statement {
  sql: string
  bindings: unknown[]
}

/** A crib manager; who exactly asks for a list is nothing to its statements. */
const actor: Actor = {
  id: '1',
  name: '',
  email: '',
  role: 'cribManager',
  locationId: '1',
  lengthUnit: null,
  homeCribId: null,
}

/** The statements that the cutter list sends for each of these queries, in their order, caught on their way out. */
export async function listStatements<View extends string>(
  databaseUrl: string,
  views: Readonly<Record<View, string>>,
): Promise<Record<View, Statement[]>> {
  // Nobody signs in here; the settings are read as a whole.
  Object.assign(process.env, { DATABASE_URL: databaseUrl, SESSION_SECRET: randomBytes(32).toString('hex') })
  const { db, closeDb } = await import('@/server/db/connection')
  const { listItems } = await import('@/server/services/catalogue/list-items')
  let sent: Statement[] = []
  db().on('query', ({ sql, bindings }: Statement) => sent.push({ sql, bindings }))
  const statements: [string, Statement[]][] = []
  for (const [view, query] of Object.entries<string>(views)) {
    sent = []
    const asked = Object.fromEntries(new URLSearchParams(query))
    const { rows } = await listItems(actor, 'cutter', cutterListQuerySchema.parse(asked))
    if (rows.length === 0) throw new Error(`The view ${view} shows nothing.`)
    statements.push([view, sent])
  }
  await closeDb()
  return Object.fromEntries(statements) as Record<View, Statement[]>
}
