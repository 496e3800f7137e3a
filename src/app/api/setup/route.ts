import { setupRequestSchema } from '@/schemas/person'
import { route } from '@/server/http/route'
import { setUpShop } from '@/server/services/people/set-up-shop'

export const POST = route({
  access: 'public',
  body: setupRequestSchema,
  answer: null,
  handle: ({ body }) => setUpShop(body),
})
