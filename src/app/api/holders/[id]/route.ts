import { idParamsSchema } from '@/schemas/fields'
import { holderResponseSchema, updateHolderRequestSchema } from '@/schemas/holder'
import { itemQuerySchema } from '@/schemas/item'
import { route } from '@/server/http/route'
import { archiveItem } from '@/server/services/catalogue/archive-item'
import { getItem } from '@/server/services/catalogue/get-item'
import { updateItem } from '@/server/services/catalogue/update-item'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  query: itemQuerySchema,
  answer: holderResponseSchema,
  handle: ({ actor, params, query }) => getItem(actor, 'holder', params.id, query.cribId),
})

export const PATCH = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: updateHolderRequestSchema,
  answer: holderResponseSchema,
  handle: ({ actor, params, body }) => updateItem(actor, 'holder', params.id, body),
})

export const DELETE = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: ({ actor, params }) => archiveItem(actor, 'holder', params.id),
})
