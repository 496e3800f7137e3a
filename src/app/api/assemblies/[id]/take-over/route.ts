import { assemblyResponseSchema, versionOnlyRequestSchema } from '@/schemas/assembly'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { takeOverSizes } from '@/server/services/assemblies/change-assembly'

export const POST = route({
  access: 'plan',
  params: idParamsSchema,
  body: versionOnlyRequestSchema,
  answer: assemblyResponseSchema,
  handle: ({ actor, params, body }) => takeOverSizes(actor, params.id, body.version),
})
