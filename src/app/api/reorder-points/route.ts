import { reorderPointListQuerySchema, reorderPointListResponseSchema } from '@/schemas/reordering'
import { route } from '@/server/http/route'
import { listReorderPoints } from '@/server/services/reordering/list-reorder-points'

export const GET = route({
  access: 'see',
  query: reorderPointListQuerySchema,
  answer: reorderPointListResponseSchema,
  handle: ({ query }) => listReorderPoints(query),
})
