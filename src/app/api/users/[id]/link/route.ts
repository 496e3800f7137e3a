import { idParamsSchema } from '@/schemas/fields'
import { personLinkResponseSchema } from '@/schemas/person'
import { route } from '@/server/http/route'
import { renewPersonLink } from '@/server/services/people/renew-person-link'

export const POST = route({
  access: 'administer',
  params: idParamsSchema,
  answer: personLinkResponseSchema,
  handle: ({ actor, params }) => renewPersonLink(actor, params.id),
})
