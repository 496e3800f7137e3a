import { foundChangeRequestSchemas, foundChangeResponseSchema } from '@/schemas/found-change'
import { route } from '@/server/http/route'
import { changeFound } from '@/server/services/catalogue/change-found'

/** Changes one field of everything a filter finds, as it was rehearsed: all of it or none. */
export const POST = route({
  access: 'keepCrib',
  body: foundChangeRequestSchemas.cutter,
  answer: foundChangeResponseSchema,
  status: 201,
  needsIdempotencyKey: true,
  handle: ({ actor, body, idempotency }) => changeFound(actor, 'cutter', body, idempotency),
})
