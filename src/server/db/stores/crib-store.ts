import type { Knex } from 'knex'

export interface NewCrib {
  code: string
  name: string
  timeZone: string
}

/** The id of the new crib; its root location is made by the database. */
export async function createCrib(trx: Knex, crib: NewCrib): Promise<string> {
  const [row] = await trx('cribs')
    .insert({ code: crib.code, name: crib.name, time_zone: crib.timeZone })
    .returning('id')
  return row.id
}

export async function findCrib(
  db: Knex,
  cribId: string,
): Promise<{ id: string; code: string; name: string } | null> {
  return (await db('cribs').where('id', cribId).first('id', 'code', 'name')) ?? null
}

/** Of these, those that there are. */
export async function findKnownCribs(db: Knex, ids: readonly string[]): Promise<Set<string>> {
  const rows: { id: string }[] = await db('cribs').whereIn('id', ids).select('id')
  return new Set(rows.map(({ id }) => id))
}

/** The root of a crib among the locations. */
export async function getCribLocationId(db: Knex, cribId: string): Promise<string> {
  const row = await db('locations').where({ crib_id: cribId, kind: 'crib' }).first('id')
  return row.id
}

/** What is absent is left alone; the root location follows. */
export async function updateCrib(
  trx: Knex,
  cribId: string,
  change: { code?: string | undefined; name?: string | undefined },
): Promise<void> {
  const set = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined))
  if (Object.keys(set).length > 0) await trx('cribs').where('id', cribId).update(set)
}
