import type { SetUpResponse } from '@/schemas/set-up'
import { db } from '../../db/connection'
import { readSetUps } from '../../db/read-models/set-up-rows'
import { setUpAnswer } from './set-up-answer'

/** The set-ups of the machines in use, or of one machine, each with its window. */
export async function listSetUps(machineId: string | undefined): Promise<{ rows: SetUpResponse[] }> {
  return { rows: (await readSetUps(db(), { machineId })).map(setUpAnswer) }
}
