import { bulkRequestSchemas, bulkResponseSchemas } from '@/schemas/catalogue-bulk'
import { route } from '@/server/http/route'
import { updateItems } from '@/server/services/catalogue/update-items'

/** Changes many rows at once: all of them or none. */
export const POST = route({
  access: 'keepCrib',
  body: bulkRequestSchemas.cutter,
  answer: bulkResponseSchemas.cutter,
  handle: ({ actor, body }) => updateItems(actor, 'cutter', body),
})
