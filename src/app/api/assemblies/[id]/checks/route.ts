import { addAssemblyCheckRequestSchema, assemblyResponseSchema } from '@/schemas/assembly'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { addAssemblyCheck } from '@/server/services/assemblies/change-assembly'

export const POST = route({
  access: 'plan',
  params: idParamsSchema,
  body: addAssemblyCheckRequestSchema,
  answer: assemblyResponseSchema,
  status: 201,
  handle: ({ actor, params, body }) => addAssemblyCheck(actor, params.id, body),
})
