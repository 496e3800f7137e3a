import { catalogueCountsResponseSchema } from '@/schemas/catalogue-counts'
import { reorderPointCountsQuerySchema } from '@/schemas/reordering'
import { route } from '@/server/http/route'
import { countReorderPoints } from '@/server/services/reordering/count-reorder-points'

export const GET = route({
  access: 'see',
  query: reorderPointCountsQuerySchema,
  answer: catalogueCountsResponseSchema,
  handle: ({ query }) => countReorderPoints(query),
})
