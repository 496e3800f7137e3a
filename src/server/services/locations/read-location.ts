import { AppError } from '@/lib/app-error'
import type { LocationResponse } from '@/schemas/location'
import type { Database } from '../../db/connection'
import { readLocationRows } from '../../db/read-models/location-rows'

/** One place of the shop as it is shown. */
export async function readLocation(database: Database, id: string): Promise<LocationResponse> {
  const [row] = await readLocationRows(database, [id])
  if (!row) throw new AppError('not-found', 'There is no such location.')
  return row
}
