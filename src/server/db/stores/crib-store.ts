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
