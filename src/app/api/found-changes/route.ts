import { foundChangeListQuerySchema, foundChangeListResponseSchema } from '@/schemas/found-change'
import { route } from '@/server/http/route'
import { listFoundChanges } from '@/server/services/catalogue/list-found-changes'

export const GET = route({
  access: 'keepCrib',
  query: foundChangeListQuerySchema,
  answer: foundChangeListResponseSchema,
  handle: ({ actor, query }) => listFoundChanges(actor, query.kind),
})
