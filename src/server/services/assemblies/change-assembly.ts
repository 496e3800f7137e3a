import { assemblyGaugeLengthMm, reachRequestOf } from '@/core/assemblies/assembly-figures'
import type { Recheck } from '@/core/assemblies/assembly-findings'
import { can } from '@/core/policies/permissions'
import { reachAnswer } from '@/core/reach/reach-answer'
import { AppError } from '@/lib/app-error'
import { findingSentence } from '@/lib/assembly-sentences'
import type { AddAssemblyCheckRequest, AssemblyResponse, UpdateAssemblyRequest } from '@/schemas/assembly'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { readAssemblyParts } from '../../db/read-models/assembly-details'
import {
  type AssemblyRecord,
  createAssemblyCheck,
  takeOverSizes as keepSizes,
  lockSizes,
  archiveAssembly as markArchived,
  updateAssembly as writeAssembly,
} from '../../db/stores/assembly-store'
import { createAuditEntry } from '../../db/stores/audit-store'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { inTransaction } from '../../db/transaction'
import { readPartSizes, toolsOf } from './assembly-tools'
import { checkOf, refuseShort } from './kept-check'
import { getLockedAssembly } from './locked-assembly'
import { readAssembly } from './read-assembly'
import { recheckAssembly } from './recheck-assembly'

/** Changes names, offset numbers and stick-out. A stick-out with which a kept check fails is refused. */
export async function updateAssembly(
  actor: Actor,
  id: string,
  { version, ...request }: UpdateAssemblyRequest,
): Promise<AssemblyResponse> {
  return changing(actor, id, version, 'assembly-changed', async (trx, assembly) => {
    const { stickOutMm } = request
    if (stickOutMm === undefined) return writeAssembly(trx, id, request)
    const tools = toolsOf(await readAssemblyParts(trx, id))
    await writeAssembly(trx, id, { ...request, gaugeLengthMm: assemblyGaugeLengthMm(tools, stickOutMm) })
    refuseFailing(await recheckAssembly(trx, { ...assembly, stickOutMm }), 'stickOutMm')
  })
}

/** Another feature it is good for as it is set: kept, it is looked at with the others from now on. */
export async function addAssemblyCheck(
  actor: Actor,
  id: string,
  { version, ...request }: AddAssemblyCheckRequest,
): Promise<AssemblyResponse> {
  return changing(actor, id, version, 'assembly-check-added', async (trx, assembly) => {
    const tools = toolsOf(await readAssemblyParts(trx, id))
    const { reach } = await readShopSettings(trx)
    const check = checkOf(request)
    const answer = reachAnswer(reachRequestOf(tools, check, assembly.stickOutMm, reach))
    refuseShort(answer, check, 'feature')
    await createAssemblyCheck(trx, id, { ...check, answer, createdBy: actor.id })
    await recheckAssembly(trx, assembly)
  })
}

/** What was found changed is now what the assembly goes by. What fails with it stays marked. */
export async function takeOverSizes(actor: Actor, id: string, version: number): Promise<AssemblyResponse> {
  return changing(actor, id, version, 'assembly-sizes-taken-over', async (trx, assembly) => {
    await takeOver(trx, assembly)
    await recheckAssembly(trx, assembly)
  })
}

/** Out of the lists; a built one is broken down first, so that its parts come back. */
export async function archiveAssembly(actor: Actor, id: string, version: number): Promise<AssemblyResponse> {
  return changing(actor, id, version, 'assembly-archived', async (trx, assembly) => {
    if (assembly.state === 'built') {
      throw new AppError('wrong-state', `Assembly ${assembly.number} is built: break it down first.`)
    }
    await markArchived(trx, id)
  })
}

/** The sizes the parts have now, and the gauge length to expect with them. */
export async function takeOver(trx: Database, assembly: AssemblyRecord): Promise<void> {
  const parts = await readAssemblyParts(trx, assembly.id)
  await lockSizes(
    trx,
    parts.map(({ itemId }) => itemId),
    parts.flatMap(({ pieceId }) => pieceId ?? []),
  )
  const sizes = await readPartSizes(trx, parts)
  await keepSizes(trx, assembly.id, sizes)
  await writeAssembly(trx, assembly.id, {
    gaugeLengthMm: assemblyGaugeLengthMm(toolsOf(sizes), assembly.stickOutMm),
  })
}

async function changing(
  actor: Actor,
  id: string,
  version: number,
  action: string,
  change: (trx: Database, assembly: AssemblyRecord) => Promise<void>,
): Promise<AssemblyResponse> {
  return inTransaction(db(), async (trx) => {
    const assembly = await getLockedAssembly(trx, id, version)
    refuseOthersHands(actor, assembly)
    const before = await readAssembly(trx, id)
    await change(trx, assembly)
    const after = await readAssembly(trx, id)
    if (JSON.stringify(audited(before)) !== JSON.stringify(audited(after))) {
      await createAuditEntry(trx, {
        actorId: actor.id,
        action,
        entity: 'assembly',
        entityId: id,
        before: audited(before),
        after: audited(after),
      })
    }
    return after
  })
}

/** Whoever only plans changes plans; what stands in a machine is for those who move tools. */
function refuseOthersHands(actor: Actor, { state, number }: AssemblyRecord): void {
  if (state !== 'built' || can(actor.role, 'move')) return
  throw new AppError('not-allowed', `Assembly ${number} is built: your role changes only what is planned.`)
}

/** A check that fails for any other reason than the measured length stands in the way. */
export function refuseFailing(recheck: Recheck, path: string): void {
  const failing = recheck.findings.find(
    ({ detail }) => detail.code === 'checkFails' || detail.code === 'checkImpossible',
  )
  if (!failing) return
  const message = findingSentence(failing.detail, 'mm')
  throw new AppError('impossible', message, { errors: [{ path, message }] })
}

function audited(assembly: AssemblyResponse): Record<string, unknown> {
  const { number, name, note, state, stickOutMm, gaugeLengthMm, archivedAt, tools, checks } = assembly
  const { toolNumber, lengthOffsetNumber, diameterOffsetNumber } = assembly
  return {
    ...{ number, name, note, state, stickOutMm, gaugeLengthMm, archivedAt },
    ...{ toolNumber, lengthOffsetNumber, diameterOffsetNumber, tools },
    features: checks.map(({ feature }) => feature),
  }
}
