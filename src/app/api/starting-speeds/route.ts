import {
  createStartingSpeedRequestSchema,
  startingSpeedListResponseSchema,
  startingSpeedResponseSchema,
} from '@/schemas/starting-speed'
import { route } from '@/server/http/route'
import { createStartingSpeed } from '@/server/services/starting-speeds/change-starting-speed'
import { listStartingSpeeds } from '@/server/services/starting-speeds/list-starting-speeds'

export const GET = route({
  access: 'see',
  answer: startingSpeedListResponseSchema,
  handle: () => listStartingSpeeds(),
})

export const POST = route({
  access: 'keepCrib',
  body: createStartingSpeedRequestSchema,
  answer: startingSpeedResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createStartingSpeed(actor, body),
})
