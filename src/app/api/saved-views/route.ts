import {
  createSavedViewRequestSchema,
  savedViewListQuerySchema,
  savedViewListResponseSchema,
  savedViewResponseSchema,
} from '@/schemas/saved-view'
import { route } from '@/server/http/route'
import { createSavedView } from '@/server/services/views/create-saved-view'
import { listSavedViews } from '@/server/services/views/list-saved-views'

export const GET = route({
  access: 'see',
  query: savedViewListQuerySchema,
  answer: savedViewListResponseSchema,
  handle: ({ actor, query }) => listSavedViews(actor, query.kind),
})

export const POST = route({
  access: 'see',
  body: createSavedViewRequestSchema,
  answer: savedViewResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createSavedView(actor, body),
})
