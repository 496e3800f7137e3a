import { AppError } from '@/lib/app-error'
import type { LocationContents } from '@/schemas/location'
import { db } from '../../db/connection'
import { findLocationContents } from '../../db/read-models/location-contents'

/** What lies in a location of the shop and in all that stands in it. */
export async function getLocationContents(id: string): Promise<LocationContents> {
  const contents = await findLocationContents(db(), id)
  if (!contents) throw new AppError('not-found', 'There is no such location.')
  return contents
}
