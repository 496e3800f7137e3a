import { changePasswordRequestSchema } from '@/schemas/person'
import { currentTokenHash } from '@/server/auth/session'
import { route } from '@/server/http/route'
import { changePassword } from '@/server/services/session/change-password'

export const PUT = route({
  access: 'signedIn',
  body: changePasswordRequestSchema,
  answer: null,
  handle: async ({ actor, body }) => changePassword(actor, body, await currentTokenHash()),
})
