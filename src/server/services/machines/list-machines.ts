import type { MachineResponse } from '@/schemas/machine'
import { db } from '../../db/connection'
import { listMachines as readMachines } from '../../db/stores/machine-store'

/** The machines of the shop, by code. */
export async function listMachines(archived: 'no' | 'only' | 'all'): Promise<{ rows: MachineResponse[] }> {
  return { rows: await readMachines(db(), archived) }
}
