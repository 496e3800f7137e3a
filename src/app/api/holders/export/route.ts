import { exportQuerySchemas } from '@/schemas/catalogue-export'
import { csvResponse } from '@/server/http/csv-response'
import { route } from '@/server/http/route'
import { exportItems } from '@/server/services/catalogue/export-items'

/** What the list shows as CSV: the same filters, search and sorting, and the columns. */
export const GET = route({
  access: 'see',
  query: exportQuerySchemas.holder,
  answer: null,
  handle: async ({ actor, query }) => csvResponse(await exportItems(actor, 'holder', query)),
})
