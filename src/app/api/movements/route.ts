import { createMovementRequestSchema, movementResponseSchema } from '@/schemas/movement'
import { route } from '@/server/http/route'
import { postMovement } from '@/server/services/stock/post-movement'

export const POST = route({
  access: 'move',
  body: createMovementRequestSchema,
  answer: movementResponseSchema,
  status: 201,
  needsIdempotencyKey: true,
  handle: ({ actor, body, idempotency }) => postMovement(actor, body, idempotency),
})
