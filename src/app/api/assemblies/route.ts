import {
  assemblyListQuerySchema,
  assemblyListResponseSchema,
  assemblyResponseSchema,
  createAssemblyRequestSchema,
} from '@/schemas/assembly'
import { route } from '@/server/http/route'
import { keepAssembly } from '@/server/services/assemblies/keep-assembly'
import { listAssemblies } from '@/server/services/assemblies/list-assemblies'

export const GET = route({
  access: 'see',
  query: assemblyListQuerySchema,
  answer: assemblyListResponseSchema,
  handle: ({ query }) => listAssemblies(query),
})

export const POST = route({
  access: 'plan',
  body: createAssemblyRequestSchema,
  answer: assemblyResponseSchema,
  status: 201,
  handle: ({ actor, body }) => keepAssembly(actor, body),
})
