import type { z } from 'zod'
import type { updateMeRequestSchema } from '@/schemas/session'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { updateUserLengthUnit } from '../../db/stores/user-store'

/** Changes what a person may change of their own account. */
export async function updateMe(actor: Actor, change: z.output<typeof updateMeRequestSchema>): Promise<Actor> {
  await updateUserLengthUnit(db(), actor.id, change.lengthUnit)
  return { ...actor, lengthUnit: change.lengthUnit }
}
