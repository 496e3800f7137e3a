import { AppError } from '@/lib/app-error'
import type { AssemblyResponse, MeasureAssemblyRequest } from '@/schemas/assembly'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { readAssemblyParts } from '../../db/read-models/assembly-details'
import { type AssemblyRecord, createMeasurement } from '../../db/stores/assembly-store'
import { createAuditEntry } from '../../db/stores/audit-store'
import { inTransaction } from '../../db/transaction'
import { toolsOf } from './assembly-tools'
import { getLockedBuiltAssembly } from './locked-assembly'
import { readAssembly } from './read-assembly'
import { recheckAssembly } from './recheck-assembly'

export interface Measured {
  gaugeLengthMm: number
  diameterMm: number | null
}

/** Keeps what was measured by hand beside what was calculated, and asks every check at the stick-out it means. */
export async function measureAssembly(
  actor: Actor,
  id: string,
  { version, gaugeLengthMm, diameterMm }: MeasureAssemblyRequest,
): Promise<AssemblyResponse> {
  return inTransaction(db(), async (trx) => {
    const assembly = await getLockedBuiltAssembly(trx, id, version)
    await keepMeasurement(trx, actor, assembly, { gaugeLengthMm, diameterMm: diameterMm ?? null }, 'byHand')
    return readAssembly(trx, id)
  })
}

/** The same for a locked, built assembly, whatever measured it. */
export async function keepMeasurement(
  trx: Database,
  actor: Actor,
  assembly: AssemblyRecord,
  measured: Measured,
  source: 'byHand' | 'presetter',
): Promise<void> {
  refuseImpossible(measured, assembly)
  const { cutter } = toolsOf(await readAssemblyParts(trx, assembly.id))
  await createMeasurement(trx, {
    ...measured,
    source,
    assemblyId: assembly.id,
    expectedGaugeLengthMm: assembly.gaugeLengthMm,
    expectedDiameterMm: cutter.cuttingDiameterMm,
    actorId: actor.id,
  })
  await recheckAssembly(trx, assembly)
  await createAuditEntry(trx, {
    actorId: actor.id,
    action: 'assembly-measured',
    entity: 'assembly',
    entityId: assembly.id,
    after: { ...measured, source, expectedGaugeLengthMm: assembly.gaugeLengthMm },
  })
}

/** Shorter than what holds the cutter: nothing of it would stand out. */
function refuseImpossible({ gaugeLengthMm }: Measured, assembly: AssemblyRecord): void {
  const nothingOutMm = assembly.gaugeLengthMm - assembly.stickOutMm
  if (gaugeLengthMm > nothingOutMm) return
  const message = 'This is shorter than holder and extension alone: check the unit and the number.'
  throw new AppError('impossible', message, { errors: [{ path: 'gaugeLengthMm', message }] })
}
