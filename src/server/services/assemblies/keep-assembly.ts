import { assemblyGaugeLengthMm, reachRequestOf } from '@/core/assemblies/assembly-figures'
import type { AssemblyTools } from '@/core/assemblies/types'
import { colletFitsBore, colletHolds, fixedBoreHolds } from '@/core/holding/holds'
import { reachAnswer } from '@/core/reach/reach-answer'
import { AppError } from '@/lib/app-error'
import type { AssemblyResponse, CreateAssemblyRequest } from '@/schemas/assembly'
import type { FieldProblem } from '@/schemas/problem'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { createAssembly, lockSizes } from '../../db/stores/assembly-store'
import { createAuditEntry } from '../../db/stores/audit-store'
import { findItem } from '../../db/stores/item-store'
import { findItemOfPiece } from '../../db/stores/movement-store'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { inTransaction } from '../../db/transaction'
import { type NamedPart, readPartSizes, toolsOf } from './assembly-tools'
import { checkOf, refuseShort } from './kept-check'
import { readAssembly } from './read-assembly'

/** Keeps an option as a numbered assembly, with the check it was found by. Only what reaches is kept. */
export async function keepAssembly(actor: Actor, request: CreateAssemblyRequest): Promise<AssemblyResponse> {
  return inTransaction(db(), async (trx) => {
    const parts = await namedParts(trx, request)
    await lockSizes(
      trx,
      parts.map(({ itemId }) => itemId),
      parts.flatMap(({ pieceId }) => pieceId ?? []),
    )
    await refuseUnusable(trx, parts)
    const sizes = await readPartSizes(trx, parts)
    const tools = toolsOf(sizes)
    refuseUnheldExtension(tools)
    const { reach } = await readShopSettings(trx)
    const check = checkOf(request)
    const answer = reachAnswer(reachRequestOf(tools, check, request.stickOutMm ?? null, reach))
    refuseShort(answer, check, 'stickOutMm')
    const stickOutMm = answer.stickOut.usedMm
    const id = await createAssembly(
      trx,
      {
        name: request.name ?? '',
        note: request.note ?? '',
        stickOutMm,
        gaugeLengthMm: assemblyGaugeLengthMm(tools, stickOutMm),
        toolNumber: request.toolNumber ?? null,
        lengthOffsetNumber: request.lengthOffsetNumber ?? null,
        diameterOffsetNumber: request.diameterOffsetNumber ?? null,
        createdBy: actor.id,
      },
      parts.map((part, index) => ({ ...part, geometry: sizes[index]?.geometry ?? {} })),
      { ...check, answer, createdBy: actor.id },
    )
    const kept = await readAssembly(trx, id)
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: 'assembly-kept',
      entity: 'assembly',
      entityId: id,
      after: { number: kept.number, stickOutMm, parts: kept.parts.map(({ kind, code }) => ({ kind, code })) },
    })
    return kept
  })
}

async function namedParts(trx: Database, request: CreateAssemblyRequest): Promise<NamedPart[]> {
  const named = (kind: NamedPart['kind'], item: { id: string } | null | undefined): NamedPart[] =>
    item ? [{ kind, itemId: item.id, pieceId: null }] : []
  return [
    await namedCutter(trx, request.cutter),
    ...named('collet', request.collet),
    ...named('extension', request.extension),
    ...named('extensionCollet', request.extensionCollet),
    ...named('holder', request.holder),
  ]
}

async function namedCutter(trx: Database, cutter: CreateAssemblyRequest['cutter']): Promise<NamedPart> {
  if ('id' in cutter) return { kind: 'cutter', itemId: cutter.id, pieceId: null }
  const itemId = await findItemOfPiece(trx, cutter.pieceId)
  if (!itemId) {
    const message = 'There is no such piece.'
    throw new AppError('not-found', message, { errors: [{ path: 'cutter.pieceId', message }] })
  }
  return { kind: 'cutter', itemId, pieceId: cutter.pieceId }
}

/** What can't be fetched can't be put together; a collet chuck without its collet is only half an assembly. */
async function refuseUnusable(trx: Database, parts: readonly NamedPart[]): Promise<void> {
  const faults: FieldProblem[] = []
  for (const { kind, itemId } of parts) {
    const item = await findItem(trx, itemId)
    if (item?.isArchived)
      faults.push({ path: `${kind}.id`, message: `${item.code} is archived: take another.` })
  }
  if (faults.length > 0) throw impossible(faults)
}

/** What holds the extension's own shank; nothing is asked where that was not entered. */
function refuseUnheldExtension({ extension, extensionCollet, holder }: AssemblyTools): void {
  const path = 'extensionCollet'
  const shankMm = extension?.shankDiameterMm ?? null
  if (extensionCollet && !extension)
    throw impossible([{ path, message: 'There is no extension for this collet to hold.' }])
  if (extensionCollet && !colletFitsBore(holder.bore, extensionCollet.series))
    throw impossible([{ path, message: 'The holder doesn’t take a collet of this series.' }])
  if (extensionCollet && shankMm !== null && !colletHolds(extensionCollet, shankMm).holds)
    throw impossible([{ path, message: 'This collet doesn’t take the extension’s shank.' }])
  if (holder.bore.kind === 'fixed' && shankMm !== null && !fixedBoreHolds(holder.bore.diameterMm, shankMm))
    throw impossible([
      { path: 'extension', message: 'The holder’s bore doesn’t take the extension’s shank.' },
    ])
  if (holder.bore.kind === 'collet' && shankMm !== null && !extensionCollet)
    throw impossible([{ path, message: 'The holder takes a collet for the extension: say which.' }])
}

function impossible(errors: FieldProblem[]): AppError {
  return new AppError('impossible', errors[0]?.message ?? 'This cannot be kept.', { errors })
}
