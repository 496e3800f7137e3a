import { randomBytes } from 'node:crypto'
import { cutterListQuerySchema } from '@/schemas/cutter'
import type { Actor } from '@/server/auth/actor'

/** Three blocks of the cutter list as the grid asks for them. */
export const listViews = {
  plain: 'limit=100&offset=0',
  filtered:
    'q=ball+long&form=ball,cornerRadius&cuttingDiameterMm.min=6&cuttingDiameterMm.max=12&limit=100&offset=0',
  jump: 'limit=100&offset=90000',
}
export type ListView = keyof typeof listViews

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

/** The statements that the cutter list sends for each of its views, in their order, caught on their way out. */
export async function listStatements(databaseUrl: string): Promise<Record<ListView, Statement[]>> {
  // Nobody signs in here; the settings are read as a whole.
  Object.assign(process.env, { DATABASE_URL: databaseUrl, SESSION_SECRET: randomBytes(32).toString('hex') })
  const { db, closeDb } = await import('@/server/db/connection')
  const { listItems } = await import('@/server/services/catalogue/list-items')
  const sent: Record<ListView, Statement[]> = { plain: [], filtered: [], jump: [] }
  for (const view of Object.keys(sent) as ListView[]) {
    const note = ({ sql, bindings }: Statement) => sent[view].push({ sql, bindings })
    const asked = Object.fromEntries(new URLSearchParams(listViews[view]))
    db().on('query', note)
    const { rows } = await listItems(actor, 'cutter', cutterListQuerySchema.parse(asked))
    db().off('query', note)
    if (rows.length === 0) throw new Error(`The view ${view} shows nothing.`)
  }
  await closeDb()
  return sent
}
