import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { downloadRejects } from '@/server/services/imports/download-rejects'

/** The rejected rows as CSV, the reason in the last column. */
export const GET = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: async ({ params }) => {
    const { fileName, body } = await downloadRejects(params.id)
    return new Response(body, {
      headers: {
        'content-type': 'text/csv; charset=utf-8',
        'content-disposition': `attachment; filename="${fileName}"`,
        'cache-control': 'no-store',
        'x-content-type-options': 'nosniff',
      },
    })
  },
})
