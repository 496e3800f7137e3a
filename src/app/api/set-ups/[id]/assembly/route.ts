import { idParamsSchema } from '@/schemas/fields'
import { setUpAssemblyRequestSchema, setUpAssemblyResponseSchema } from '@/schemas/set-up'
import { route } from '@/server/http/route'
import { checkSetUpAssembly } from '@/server/services/set-ups/check-set-up-assembly'

/** Whether an assembly fits what stands on the machine, and which holders would. */
export const POST = route({
  access: 'see',
  params: idParamsSchema,
  body: setUpAssemblyRequestSchema,
  answer: setUpAssemblyResponseSchema,
  handle: ({ params, body }) => checkSetUpAssembly(params.id, body),
})
