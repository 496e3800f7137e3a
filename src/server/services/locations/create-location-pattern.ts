import { CoreInputError } from '@/core/core-input-error'
import { binCodes } from '@/core/stock/bin-codes'
import { AppError } from '@/lib/app-error'
import type { CreateLocationPatternRequest, LocationPatternResponse } from '@/schemas/location'
import type { Actor } from '../../auth/actor'
import { type Database, db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import { createLocations, findLockedLocation, listTakenCodes } from '../../db/stores/location-store'
import { inTransaction } from '../../db/transaction'
import { explainingLocationRefusals } from './explain-location-refusal'

const namedAtMost = 5

/** Adds a wall of bins at once: all of them or, where a code is taken, none. */
export async function createLocationPattern(
  actor: Actor,
  request: CreateLocationPatternRequest,
): Promise<LocationPatternResponse> {
  const codes = codesOf(request)
  return explainingLocationRefusals(codes[0], () =>
    inTransaction(db(), async (trx) => {
      const parent = await findLockedLocation(trx, request.parentId)
      if (!parent?.cribId || parent.kind === 'bin') {
        const message = parent
          ? 'Only a crib, cabinet or drawer has bins in it.'
          : 'There is no such location.'
        throw new AppError('impossible', message, { errors: [{ path: 'parentId', message }] })
      }
      await refuseTaken(trx, parent.cribId, codes)
      const { cribId, id: parentId } = parent
      await createLocations(
        trx,
        codes.map((code) => ({ kind: 'bin', code, name: `Bin ${code}`, cribId, parentId })),
      )
      await createAuditEntry(trx, {
        actorId: actor.id,
        action: 'locations-added',
        entity: 'location',
        entityId: parentId,
        after: { parent: parent.code, codes },
      })
      return { added: codes.length, codes }
    }),
  )
}

function codesOf({ first, last }: CreateLocationPatternRequest): string[] {
  try {
    return binCodes(first, last)
  } catch (error) {
    if (!(error instanceof CoreInputError)) throw error
    const { path, message } = error
    throw new AppError('impossible', message, { errors: [{ path, message }] })
  }
}

async function refuseTaken(trx: Database, cribId: string, codes: string[]): Promise<void> {
  const taken = await listTakenCodes(trx, cribId, codes)
  if (taken.length === 0) return
  const named = taken.slice(0, namedAtMost).join(', ')
  const more = taken.length > namedAtMost ? ` and ${taken.length - namedAtMost} more` : ''
  const message = `Taken in this crib already, archived ones included: ${named}${more}. Nothing was added.`
  throw new AppError('code-taken', message, { errors: [{ path: 'first', message }] })
}
