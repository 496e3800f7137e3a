import { idParamsSchema } from '@/schemas/fields'
import { importResponseSchema } from '@/schemas/import'
import { route } from '@/server/http/route'
import { cancelImport } from '@/server/services/imports/cancel-import'
import { getImport } from '@/server/services/imports/get-import'

export const GET = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: importResponseSchema,
  handle: ({ params }) => getImport(params.id),
})

export const DELETE = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: ({ params }) => cancelImport(params.id),
})
