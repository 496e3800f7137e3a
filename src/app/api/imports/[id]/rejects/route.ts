import { idParamsSchema } from '@/schemas/fields'
import { csvResponse } from '@/server/http/csv-response'
import { route } from '@/server/http/route'
import { downloadRejects } from '@/server/services/imports/download-rejects'

/** The rejected rows as CSV, the reason in the last column. */
export const GET = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: async ({ params }) => csvResponse(await downloadRejects(params.id)),
})
