import { idParamsSchema } from '@/schemas/fields'
import { commitImportRequestSchema, importAcceptedResponseSchema } from '@/schemas/import'
import { route } from '@/server/http/route'
import { commitImport } from '@/server/services/imports/commit-import'

export const POST = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: commitImportRequestSchema,
  answer: importAcceptedResponseSchema,
  status: 202,
  handle: ({ params, body }) => commitImport(params.id, body.rejects),
})
