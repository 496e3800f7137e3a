import { idParamsSchema } from '@/schemas/fields'
import { fitsListQuerySchema, fitsListResponseSchema } from '@/schemas/fits'
import { route } from '@/server/http/route'
import { listFits } from '@/server/services/catalogue/list-fits'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  query: fitsListQuerySchema,
  answer: fitsListResponseSchema,
  handle: ({ params, query }) => listFits(params.id, query),
})
