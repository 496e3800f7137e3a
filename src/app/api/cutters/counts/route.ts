import { catalogueCountsResponseSchema, countsQuerySchemas } from '@/schemas/catalogue-counts'
import { route } from '@/server/http/route'
import { countItems } from '@/server/services/catalogue/count-items'

/** How many rows each choice of the filters asked for would leave, with the other filters as they are. */
export const GET = route({
  access: 'see',
  query: countsQuerySchemas.cutter,
  answer: catalogueCountsResponseSchema,
  handle: ({ actor, query }) => countItems(actor, 'cutter', query),
})
