import { createSessionRequestSchema, sessionResponseSchema } from '@/schemas/session'
import { beginSession, finishSession } from '@/server/auth/session'
import { remoteAddressOf } from '@/server/http/remote-address'
import { route } from '@/server/http/route'
import { signInUser } from '@/server/services/session/sign-in'

export const POST = route({
  access: 'public',
  body: createSessionRequestSchema,
  answer: sessionResponseSchema,
  handle: async ({ body, request }) => {
    const user = await signInUser(body, remoteAddressOf(request))
    await beginSession(user.id, request.headers.get('user-agent'))
    return { user }
  },
})

export const GET = route({
  access: 'signedIn',
  answer: sessionResponseSchema,
  handle: async ({ actor }) => ({ user: actor }),
})

export const DELETE = route({
  access: 'public',
  answer: null,
  handle: () => finishSession(),
})
