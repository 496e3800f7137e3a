import knex, { type Knex } from 'knex'
import { knexConfig } from '@/server/db/knex-config'
import { type ApiClient, uniqueCode } from './api'
import { locationOf } from './books'

/** The database of the site under test, for what no call can do: opening stock comes only by its documents. */
export function siteDatabase(): Knex {
  const url = process.env.DATABASE_URL
  if (!url) throw new Error('Set DATABASE_URL to the database of the running Leadline.')
  if (!['127.0.0.1', 'localhost'].includes(new URL(url).hostname)) {
    throw new Error('Tests run against a database on this machine only.')
  }
  return knex(knexConfig(url, { min: 0, max: 2 }))
}

export interface Shelf {
  cribId: string
  cribLocationId: string
  binId: string
  secondBinId: string
}

/** A crib of the test's own with two bins. */
export async function createShelf(crib: ApiClient, timeZone = 'Europe/Vienna'): Promise<Shelf> {
  const code = uniqueCode('CRIB')
  const made = await crib.post('/api/locations', { kind: 'crib', code, name: `Crib ${code}`, timeZone })
  const parentId = made.body.id
  const bin = (binCode: string) =>
    crib.post('/api/locations', { kind: 'bin', code: binCode, name: `Bin ${binCode}`, parentId })
  const first = await bin('A-1')
  const second = await bin('A-2')
  return {
    cribId: made.body.cribId,
    cribLocationId: parentId,
    binId: first.body.id,
    secondBinId: second.body.id,
  }
}

/** A 6 mm square end mill that can be; a test changes what it asks about. */
export function squareCutter(change: Record<string, unknown> = {}): Record<string, unknown> {
  return {
    code: uniqueCode('EM'),
    form: 'square',
    cuttingDiameterMm: 6,
    lengthOfCutMm: 12,
    shankDiameterMm: 6,
    overallLengthMm: 57,
    ...change,
  }
}

/** A cutter of the test's own; the answer is its id. */
export async function createCutter(crib: ApiClient, change: Record<string, unknown> = {}): Promise<string> {
  const made = await crib.post('/api/cutters', squareCutter(change))
  return made.body.id
}

/** Pieces on a shelf, posted as the opening stock of an import is. */
export async function putOnShelf(
  db: Knex,
  crib: ApiClient,
  stock: { itemId: string; binId: string; quantity: number; condition?: string },
): Promise<void> {
  const condition = stock.condition ?? 'new'
  await db('movements').insert({
    kind: 'adjustment',
    item_id: stock.itemId,
    quantity: stock.quantity,
    from_location_id: await locationOf(db, { kind: 'count_adjustment' }),
    from_condition: condition,
    to_location_id: stock.binId,
    to_condition: condition,
    actor_id: crib.user.id,
  })
}
