import { fitsListResponseSchema, fitsQuerySchema } from '@/schemas/fits'
import { route } from '@/server/http/route'
import { listFitsOf } from '@/server/services/catalogue/list-fits'

export const GET = route({
  access: 'see',
  query: fitsQuerySchema,
  answer: fitsListResponseSchema,
  handle: ({ query }) => listFitsOf(query),
})
