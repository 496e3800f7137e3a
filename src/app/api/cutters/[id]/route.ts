import { cutterResponseSchema, updateCutterRequestSchema } from '@/schemas/cutter'
import { idParamsSchema } from '@/schemas/fields'
import { itemQuerySchema } from '@/schemas/item'
import { route } from '@/server/http/route'
import { archiveItem } from '@/server/services/catalogue/archive-item'
import { getItem } from '@/server/services/catalogue/get-item'
import { updateItem } from '@/server/services/catalogue/update-item'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  query: itemQuerySchema,
  answer: cutterResponseSchema,
  handle: ({ actor, params, query }) => getItem(actor, 'cutter', params.id, query.cribId),
})

export const PATCH = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: updateCutterRequestSchema,
  answer: cutterResponseSchema,
  handle: ({ actor, params, body }) => updateItem(actor, 'cutter', params.id, body),
})

export const DELETE = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: ({ actor, params }) => archiveItem(actor, 'cutter', params.id),
})
