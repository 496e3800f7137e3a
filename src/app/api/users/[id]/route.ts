import { idParamsSchema } from '@/schemas/fields'
import { personResponseSchema, updatePersonRequestSchema } from '@/schemas/person'
import { route } from '@/server/http/route'
import { updatePerson } from '@/server/services/people/update-person'

export const PATCH = route({
  access: 'administer',
  params: idParamsSchema,
  body: updatePersonRequestSchema,
  answer: personResponseSchema,
  handle: ({ actor, params, body }) => updatePerson(actor, params.id, body),
})
