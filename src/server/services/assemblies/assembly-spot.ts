import { isSameTaper } from '@/core/machine/taper'
import { AppError } from '@/lib/app-error'
import type { Actor } from '../../auth/actor'
import type { Database } from '../../db/connection'
import { findMachinePlace, findSpindleEnd, type MachineSpot } from '../../db/stores/assembly-store'

export type AssemblySpot = MachineSpot & { locationId: string; words: string }

/**
 * Where an assembly goes: to a machine and perhaps a pocket of it, or into the hands of whoever acts. A holder of another
 * taper never goes in; of one whose taper was not entered nothing is known.
 */
export async function assemblySpot(
  trx: Database,
  actor: Actor,
  assemblyId: string,
  to: { machineId?: string | null | undefined; pocket?: number | null | undefined },
): Promise<AssemblySpot> {
  const pocket = to.pocket ?? null
  if (!to.machineId) {
    if (pocket !== null) throw impossible('pocket', 'A pocket is of a machine: say which.')
    return { machineId: null, pocket: null, locationId: actor.locationId, words: 'in hand' }
  }
  const machine = await findMachinePlace(trx, to.machineId)
  if (!machine) throw impossible('machineId', 'There is no such machine in use.')
  const end = await findSpindleEnd(trx, assemblyId)
  if (end?.taper && !isSameTaper(end.taper, machine.taper))
    throw impossible('machineId', `${end.code} is ${end.taper}, ${machine.code} takes ${machine.taper}.`)
  if (pocket !== null && machine.pocketCount !== null && pocket > machine.pocketCount)
    throw impossible('pocket', `${machine.code} has ${machine.pocketCount} pockets.`)
  const words = pocket === null ? machine.code : `${machine.code}, pocket ${pocket}`
  return { machineId: to.machineId, pocket, locationId: machine.locationId, words }
}

function impossible(path: string, message: string): AppError {
  return new AppError('impossible', message, { errors: [{ path, message }] })
}
