import type { z } from 'zod'
import { AppError } from '@/lib/app-error'
import type { MovementResponse, movementListQuerySchema } from '@/schemas/movement'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { readMovementKeys, readMovementRows } from '../../db/read-models/movement-rows'
import { findItem } from '../../db/stores/item-store'
import { visibleMovement } from './visible-movement'

export interface MovementList {
  rows: MovementResponse[]
  nextCursor: string | null
  total?: number
}

/** One block of an item's movements, newest first. */
export async function listItemMovements(
  actor: Actor,
  itemId: string,
  query: z.output<typeof movementListQuerySchema>,
): Promise<MovementList> {
  if (!(await findItem(db(), itemId))) throw new AppError('not-found', 'There is no such item.')
  const { ids, ...page } = await readMovementKeys(db(), itemId, query)
  const rows = await readMovementRows(db(), ids)
  return { rows: rows.map((row) => visibleMovement(actor, row)), ...page }
}
