import { ballSpeedAnswer } from '@/core/ball-end/ball-speed-answer'
import { ballSpeedRequestSchema, ballSpeedResponseSchema } from '@/schemas/ball-speed'
import { route } from '@/server/http/route'

export const POST = route({
  access: 'see',
  body: ballSpeedRequestSchema,
  answer: ballSpeedResponseSchema,
  handle: async ({ body }) => ballSpeedAnswer(body),
})
