import {
  putReorderPointRequestSchema,
  reorderPointParamsSchema,
  reorderPointResponseSchema,
} from '@/schemas/reordering'
import { route } from '@/server/http/route'
import { putReorderPoint } from '@/server/services/reordering/put-reorder-point'
import { removeReorderPoint } from '@/server/services/reordering/remove-reorder-point'

export const PUT = route({
  access: 'keepCrib',
  params: reorderPointParamsSchema,
  body: putReorderPointRequestSchema,
  answer: reorderPointResponseSchema,
  handle: ({ actor, params, body }) => putReorderPoint(actor, params, body),
})

export const DELETE = route({
  access: 'keepCrib',
  params: reorderPointParamsSchema,
  answer: null,
  handle: ({ actor, params }) => removeReorderPoint(actor, params),
})
