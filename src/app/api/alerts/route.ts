import { alertListQuerySchema, alertListResponseSchema } from '@/schemas/reordering'
import { route } from '@/server/http/route'
import { listAlerts } from '@/server/services/reordering/list-alerts'

export const GET = route({
  access: 'see',
  query: alertListQuerySchema,
  answer: alertListResponseSchema,
  handle: ({ query }) => listAlerts(query),
})
