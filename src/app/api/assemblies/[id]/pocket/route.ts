import { assemblyResponseSchema, pocketAssemblyRequestSchema } from '@/schemas/assembly'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { pocketAssembly } from '@/server/services/assemblies/pocket-assembly'

export const POST = route({
  access: 'move',
  params: idParamsSchema,
  body: pocketAssemblyRequestSchema,
  answer: assemblyResponseSchema,
  needsIdempotencyKey: true,
  handle: ({ actor, params, body, idempotency }) => pocketAssembly(actor, params.id, body, idempotency),
})
