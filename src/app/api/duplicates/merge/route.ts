import { mergeItemsRequestSchema, mergeItemsResponseSchema } from '@/schemas/duplicate'
import { route } from '@/server/http/route'
import { mergeItems } from '@/server/services/duplicates/merge-items'

export const POST = route({
  access: 'keepCrib',
  needsIdempotencyKey: true,
  body: mergeItemsRequestSchema,
  answer: mergeItemsResponseSchema,
  status: 201,
  handle: ({ actor, body, idempotency }) => mergeItems(actor, body, idempotency),
})
