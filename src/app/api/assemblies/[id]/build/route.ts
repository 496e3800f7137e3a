import { assemblyResponseSchema, buildAssemblyRequestSchema } from '@/schemas/assembly'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { buildAssembly } from '@/server/services/assemblies/build-assembly'

export const POST = route({
  access: 'move',
  params: idParamsSchema,
  body: buildAssemblyRequestSchema,
  answer: assemblyResponseSchema,
  needsIdempotencyKey: true,
  handle: ({ actor, params, body, idempotency }) => buildAssembly(actor, params.id, body, idempotency),
})
