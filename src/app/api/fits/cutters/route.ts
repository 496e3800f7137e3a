import { fittingCuttersQuerySchema, fittingCuttersResponseSchema } from '@/schemas/fits'
import { route } from '@/server/http/route'
import { listPocketCutters } from '@/server/services/catalogue/list-pocket-cutters'

export const GET = route({
  access: 'see',
  query: fittingCuttersQuerySchema,
  answer: fittingCuttersResponseSchema,
  handle: ({ actor, query }) => listPocketCutters(actor, query),
})
