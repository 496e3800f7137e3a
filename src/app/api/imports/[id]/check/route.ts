import { idParamsSchema } from '@/schemas/fields'
import { importAcceptedResponseSchema, recheckImportRequestSchema } from '@/schemas/import'
import { route } from '@/server/http/route'
import { recheckImport } from '@/server/services/imports/recheck-import'

/** Reads the file again, by other columns or another unit. */
export const POST = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: recheckImportRequestSchema,
  answer: importAcceptedResponseSchema,
  status: 202,
  handle: ({ params, body }) => recheckImport(params.id, body),
})
