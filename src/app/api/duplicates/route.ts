import { duplicatesQuerySchema, duplicatesResponseSchema } from '@/schemas/duplicate'
import { route } from '@/server/http/route'
import { listDuplicates } from '@/server/services/duplicates/list-duplicates'

export const GET = route({
  access: 'keepCrib',
  query: duplicatesQuerySchema,
  answer: duplicatesResponseSchema,
  handle: ({ query }) => listDuplicates(query.kind),
})
