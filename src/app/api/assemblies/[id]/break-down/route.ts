import { assemblyResponseSchema, breakDownAssemblyRequestSchema } from '@/schemas/assembly'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { breakDownAssembly } from '@/server/services/assemblies/break-down-assembly'

export const POST = route({
  access: 'move',
  params: idParamsSchema,
  body: breakDownAssemblyRequestSchema,
  answer: assemblyResponseSchema,
  needsIdempotencyKey: true,
  handle: ({ actor, params, body, idempotency }) => breakDownAssembly(actor, params.id, body, idempotency),
})
