import { currentTokenHash } from '@/server/auth/session'
import { route } from '@/server/http/route'
import { endOtherSessions } from '@/server/services/session/end-other-sessions'

export const DELETE = route({
  access: 'signedIn',
  answer: null,
  handle: async ({ actor }) => endOtherSessions(actor, await currentTokenHash()),
})
