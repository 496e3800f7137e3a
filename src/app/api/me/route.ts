import { meResponseSchema, updateMeRequestSchema } from '@/schemas/session'
import { route } from '@/server/http/route'
import { updateMe } from '@/server/services/session/update-me'

export const PATCH = route({
  access: 'signedIn',
  body: updateMeRequestSchema,
  answer: meResponseSchema,
  handle: ({ actor, body }) => updateMe(actor, body),
})
