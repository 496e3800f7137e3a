import type { StartingSpeed } from '@/schemas/starting-speed'
import { db } from '../../db/connection'
import { listStartingSpeeds as readStartingSpeeds } from '../../db/stores/starting-speed-store'

/** The shop's whole table, by group, material and substrate. */
export async function listStartingSpeeds(): Promise<{ rows: StartingSpeed[] }> {
  return { rows: await readStartingSpeeds(db()) }
}
