import type { z } from 'zod'
import type { LocationResponse, locationListQuerySchema } from '@/schemas/location'
import { db } from '../../db/connection'
import { readLocationKeys, readLocationRows } from '../../db/read-models/location-rows'

export interface LocationList {
  rows: LocationResponse[]
  nextCursor: string | null
  total?: number
}

/** One block of the places where stock can be. */
export async function listLocations(query: z.output<typeof locationListQuerySchema>): Promise<LocationList> {
  const { ids, ...page } = await readLocationKeys(db(), query)
  return { rows: await readLocationRows(db(), ids), ...page }
}
