import {
  createCutterRequestSchema,
  cutterListQuerySchema,
  cutterListResponseSchema,
  cutterResponseSchema,
} from '@/schemas/cutter'
import { route } from '@/server/http/route'
import { createItem } from '@/server/services/catalogue/create-item'
import { listItems } from '@/server/services/catalogue/list-items'

export const GET = route({
  access: 'see',
  query: cutterListQuerySchema,
  answer: cutterListResponseSchema,
  handle: ({ actor, query }) => listItems(actor, 'cutter', query),
})

export const POST = route({
  access: 'keepCrib',
  body: createCutterRequestSchema,
  answer: cutterResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createItem(actor, 'cutter', body),
})
