import { idParamsSchema } from '@/schemas/fields'
import { importRowListQuerySchema, importRowListResponseSchema } from '@/schemas/import'
import { route } from '@/server/http/route'
import { listImportRows } from '@/server/services/imports/list-imports'

export const GET = route({
  access: 'keepCrib',
  params: idParamsSchema,
  query: importRowListQuerySchema,
  answer: importRowListResponseSchema,
  handle: ({ params, query }) => listImportRows(params.id, query),
})
