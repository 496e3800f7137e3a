import {
  createHolderRequestSchema,
  holderListQuerySchema,
  holderListResponseSchema,
  holderResponseSchema,
} from '@/schemas/holder'
import { route } from '@/server/http/route'
import { createItem } from '@/server/services/catalogue/create-item'
import { listItems } from '@/server/services/catalogue/list-items'

export const GET = route({
  access: 'see',
  query: holderListQuerySchema,
  answer: holderListResponseSchema,
  handle: ({ actor, query }) => listItems(actor, 'holder', query),
})

export const POST = route({
  access: 'keepCrib',
  body: createHolderRequestSchema,
  answer: holderResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createItem(actor, 'holder', body),
})
