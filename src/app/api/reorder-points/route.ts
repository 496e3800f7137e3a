import {
  putReorderPointsRequestSchema,
  putReorderPointsResponseSchema,
  reorderPointListQuerySchema,
  reorderPointListResponseSchema,
} from '@/schemas/reordering'
import { route } from '@/server/http/route'
import { listReorderPoints } from '@/server/services/reordering/list-reorder-points'
import { putReorderPoints } from '@/server/services/reordering/put-reorder-points'

export const GET = route({
  access: 'see',
  query: reorderPointListQuerySchema,
  answer: reorderPointListResponseSchema,
  handle: ({ query }) => listReorderPoints(query),
})

/** Sets many at once: all of them or none. */
export const PUT = route({
  access: 'keepCrib',
  body: putReorderPointsRequestSchema,
  answer: putReorderPointsResponseSchema,
  handle: ({ actor, body }) => putReorderPoints(actor, body.rows),
})
