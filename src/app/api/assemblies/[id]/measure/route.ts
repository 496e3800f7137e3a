import { assemblyResponseSchema, measureAssemblyRequestSchema } from '@/schemas/assembly'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { measureAssembly } from '@/server/services/assemblies/measure-assembly'

export const POST = route({
  access: 'move',
  params: idParamsSchema,
  body: measureAssemblyRequestSchema,
  answer: assemblyResponseSchema,
  handle: ({ actor, params, body }) => measureAssembly(actor, params.id, body),
})
