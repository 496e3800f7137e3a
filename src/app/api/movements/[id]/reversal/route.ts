import { idParamsSchema } from '@/schemas/fields'
import { movementResponseSchema } from '@/schemas/movement'
import { route } from '@/server/http/route'
import { reverseMovement } from '@/server/services/stock/reverse-movement'

export const POST = route({
  access: 'move',
  params: idParamsSchema,
  answer: movementResponseSchema,
  status: 201,
  needsIdempotencyKey: true,
  handle: ({ actor, params, idempotency }) => reverseMovement(actor, params.id, idempotency),
})
