import {
  importAcceptedResponseSchema,
  importListQuerySchema,
  importListResponseSchema,
} from '@/schemas/import'
import { route } from '@/server/http/route'
import { createImport } from '@/server/services/imports/create-import'
import { listImports } from '@/server/services/imports/list-imports'

export const GET = route({
  access: 'keepCrib',
  query: importListQuerySchema,
  answer: importListResponseSchema,
  handle: ({ query }) => listImports(query),
})

/** No `body` schema: the file streams to disk as it arrives. */
export const POST = route({
  access: 'keepCrib',
  answer: importAcceptedResponseSchema,
  status: 202,
  handle: ({ actor, request }) => createImport(actor, request),
})
