import {
  createPersonRequestSchema,
  personLinkResponseSchema,
  personListResponseSchema,
} from '@/schemas/person'
import { route } from '@/server/http/route'
import { createPerson } from '@/server/services/people/create-person'
import { listPeople } from '@/server/services/people/list-people'

export const GET = route({
  access: 'administer',
  answer: personListResponseSchema,
  handle: () => listPeople(),
})

export const POST = route({
  access: 'administer',
  body: createPersonRequestSchema,
  answer: personLinkResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createPerson(actor, body),
})
