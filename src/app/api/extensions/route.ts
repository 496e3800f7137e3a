import {
  createExtensionRequestSchema,
  extensionListQuerySchema,
  extensionListResponseSchema,
  extensionResponseSchema,
} from '@/schemas/extension'
import { route } from '@/server/http/route'
import { createItem } from '@/server/services/catalogue/create-item'
import { listItems } from '@/server/services/catalogue/list-items'

export const GET = route({
  access: 'see',
  query: extensionListQuerySchema,
  answer: extensionListResponseSchema,
  handle: ({ actor, query }) => listItems(actor, 'extension', query),
})

export const POST = route({
  access: 'keepCrib',
  body: createExtensionRequestSchema,
  answer: extensionResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createItem(actor, 'extension', body),
})
