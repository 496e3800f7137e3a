import type { CribResponse } from '@/schemas/location'
import { db } from '../../db/connection'
import { readCribs } from '../../db/read-models/location-rows'

/** All cribs, by code. */
export async function listCribs(): Promise<{ rows: CribResponse[] }> {
  return { rows: await readCribs(db()) }
}
