import { z } from 'zod'
import { assemblyResponseSchema, updateAssemblyRequestSchema } from '@/schemas/assembly'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { archiveAssembly, updateAssembly } from '@/server/services/assemblies/change-assembly'
import { getAssembly } from '@/server/services/assemblies/read-assembly'

const archiveQuerySchema = z.strictObject({
  version: z
    .string('Send the version you read.')
    .regex(/^\d{1,9}$/, 'Only whole numbers.')
    .transform(Number),
})

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  answer: assemblyResponseSchema,
  handle: ({ params }) => getAssembly(params.id),
})

export const PATCH = route({
  access: 'plan',
  params: idParamsSchema,
  body: updateAssemblyRequestSchema,
  answer: assemblyResponseSchema,
  handle: ({ actor, params, body }) => updateAssembly(actor, params.id, body),
})

export const DELETE = route({
  access: 'plan',
  params: idParamsSchema,
  query: archiveQuerySchema,
  answer: assemblyResponseSchema,
  handle: ({ actor, params, query }) => archiveAssembly(actor, params.id, query.version),
})
