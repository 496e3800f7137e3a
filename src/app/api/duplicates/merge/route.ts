import {
  mergeItemsRequestSchema,
  mergeItemsResponseSchema,
  mergePreviewResponseSchema,
} from '@/schemas/duplicate'
import { route } from '@/server/http/route'
import { mergeItems } from '@/server/services/duplicates/merge-items'
import { previewMerge } from '@/server/services/duplicates/preview-merge'

export const GET = route({
  access: 'keepCrib',
  query: mergeItemsRequestSchema,
  answer: mergePreviewResponseSchema,
  handle: ({ query }) => previewMerge(query),
})

export const POST = route({
  access: 'keepCrib',
  needsIdempotencyKey: true,
  body: mergeItemsRequestSchema,
  answer: mergeItemsResponseSchema,
  status: 201,
  handle: ({ actor, body, idempotency }) => mergeItems(actor, body, idempotency),
})
