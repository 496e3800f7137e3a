import { reachRequestSchema, reachResponseSchema } from '@/schemas/reach'
import { route } from '@/server/http/route'
import { answerReach } from '@/server/services/reach/answer-reach'

export const POST = route({
  access: 'see',
  body: reachRequestSchema,
  answer: reachResponseSchema,
  handle: ({ body }) => answerReach(body),
})
