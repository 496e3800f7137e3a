import { makerListQuerySchema, makerListResponseSchema } from '@/schemas/item'
import { route } from '@/server/http/route'
import { listMakers } from '@/server/services/catalogue/list-makers'

export const GET = route({
  access: 'see',
  query: makerListQuerySchema,
  answer: makerListResponseSchema,
  handle: ({ query }) => listMakers(query.kind ?? null),
})
