import { AppError } from '@/lib/app-error'
import type { MachineResponse } from '@/schemas/machine'
import { type Database, db } from '../../db/connection'
import { findMachine } from '../../db/stores/machine-store'

export async function getMachine(id: string, database: Database = db()): Promise<MachineResponse> {
  const found = await findMachine(database, id)
  if (!found) throw new AppError('not-found', 'There is no such machine.')
  return found
}
