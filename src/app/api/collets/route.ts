import {
  colletListQuerySchema,
  colletListResponseSchema,
  colletResponseSchema,
  createColletRequestSchema,
} from '@/schemas/collet'
import { route } from '@/server/http/route'
import { createItem } from '@/server/services/catalogue/create-item'
import { listItems } from '@/server/services/catalogue/list-items'

export const GET = route({
  access: 'see',
  query: colletListQuerySchema,
  answer: colletListResponseSchema,
  handle: ({ actor, query }) => listItems(actor, 'collet', query),
})

export const POST = route({
  access: 'keepCrib',
  body: createColletRequestSchema,
  answer: colletResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createItem(actor, 'collet', body),
})
