import { idParamsSchema } from '@/schemas/fields'
import { movementListQuerySchema, movementListResponseSchema } from '@/schemas/movement'
import { route } from '@/server/http/route'
import { listItemMovements } from '@/server/services/stock/list-item-movements'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  query: movementListQuerySchema,
  answer: movementListResponseSchema,
  handle: ({ actor, params, query }) => listItemMovements(actor, params.id, query),
})
