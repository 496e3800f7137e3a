import { reorderPointExportQuerySchema } from '@/schemas/reordering'
import { csvResponse } from '@/server/http/csv-response'
import { route } from '@/server/http/route'
import { exportReorderPoints } from '@/server/services/reordering/export-reorder-points'

/** What the list shows as CSV: the same filters, search and sorting. */
export const GET = route({
  access: 'see',
  query: reorderPointExportQuerySchema,
  answer: null,
  handle: async ({ query }) => csvResponse(await exportReorderPoints(query)),
})
