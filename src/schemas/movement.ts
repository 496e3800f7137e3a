import { z } from 'zod'
import { conditions, locationKinds, movementKinds } from '@/core/stock/kinds'
import { countSchema, descriptionSchema, idSchema } from './fields'
import { listQuerySchema, listResponseSchema, setFilter } from './paging'

/** Most pieces one movement may carry. */
export const largestMovement = 1_000_000

const condition = z.enum(conditions, `Only ${conditions.join(', ')}.`)

/** What it leaves in a condition it enters in the same one, unless another is said. */
export const createMovementRequestSchema = z.object({
  kind: z.enum(movementKinds, `Only ${movementKinds.join(', ')}.`),
  itemId: idSchema,
  pieceId: idSchema.nullable().optional(),
  quantity: countSchema(largestMovement, 'Give the number of pieces.'),
  fromLocationId: idSchema,
  fromCondition: condition.default('new'),
  /** May be left out of a scrap alone: what is broken has one way to go. */
  toLocationId: idSchema.nullable().optional(),
  toCondition: condition.nullable().optional(),
  jobId: idSchema.nullable().optional(),
  note: descriptionSchema.nullable().optional(),
})
export type CreateMovementRequest = z.output<typeof createMovementRequestSchema>

const movementEndSchema = z.object({
  kind: z.enum(locationKinds),
  code: z.string().nullable(),
  name: z.string(),
  cribCode: z.string().nullable(),
})

export const movementResponseSchema = z.object({
  id: z.string(),
  kind: z.enum(movementKinds),
  itemId: z.string(),
  itemCode: z.string(),
  pieceId: z.string().nullable(),
  quantity: z.number(),
  /** Null at a far end of the books, which no page shows; what kind of end it is stands in `from` and `to`. */
  fromLocationId: z.string().nullable(),
  from: movementEndSchema,
  fromCondition: z.enum(conditions),
  toLocationId: z.string().nullable(),
  to: movementEndSchema,
  toCondition: z.enum(conditions),
  note: z.string(),
  actorId: z.string(),
  actorName: z.string(),
  occurredAt: z.iso.datetime(),
  recordedAt: z.iso.datetime(),
  reversesId: z.string().nullable(),
  reversedById: z.string().nullable(),
  /** Whether the person who asks may reverse it now. */
  canReverse: z.boolean(),
})
export type MovementResponse = z.infer<typeof movementResponseSchema>

export const movementListResponseSchema = listResponseSchema(movementResponseSchema)

export const movementListQuerySchema = listQuerySchema({ kind: setFilter(movementKinds) })
