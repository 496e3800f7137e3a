import { AppError } from '@/lib/app-error'
import { type Database, db } from '../../db/connection'
import { readSetUps, type SetUpRow } from '../../db/read-models/set-up-rows'

export async function getSetUp(id: string, database: Database = db()): Promise<SetUpRow> {
  const [found] = await readSetUps(database, { id })
  if (!found) throw new AppError('not-found', 'There is no such set-up.')
  return found
}
