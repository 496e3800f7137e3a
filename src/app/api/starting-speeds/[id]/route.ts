import { idParamsSchema } from '@/schemas/fields'
import { startingSpeedResponseSchema, updateStartingSpeedRequestSchema } from '@/schemas/starting-speed'
import { route } from '@/server/http/route'
import {
  removeStartingSpeed,
  updateStartingSpeed,
} from '@/server/services/starting-speeds/change-starting-speed'

export const PUT = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: updateStartingSpeedRequestSchema,
  answer: startingSpeedResponseSchema,
  handle: ({ actor, params, body }) => updateStartingSpeed(actor, params.id, body),
})

export const DELETE = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: ({ actor, params }) => removeStartingSpeed(actor, params.id),
})
