import { acceptInvitationRequestSchema } from '@/schemas/person'
import { route } from '@/server/http/route'
import { acceptInvitation } from '@/server/services/people/accept-invitation'

export const POST = route({
  access: 'public',
  body: acceptInvitationRequestSchema,
  answer: null,
  handle: ({ body }) => acceptInvitation(body),
})
