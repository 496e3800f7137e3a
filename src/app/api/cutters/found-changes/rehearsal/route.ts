import { foundRehearsalRequestSchemas, foundRehearsalResponseSchema } from '@/schemas/found-change'
import { route } from '@/server/http/route'
import { rehearseFoundChange } from '@/server/services/catalogue/rehearse-found-change'

/** What changing one field of everything a filter finds would do. */
export const POST = route({
  access: 'keepCrib',
  body: foundRehearsalRequestSchemas.cutter,
  answer: foundRehearsalResponseSchema,
  handle: ({ actor, body }) => rehearseFoundChange(actor, 'cutter', body),
})
