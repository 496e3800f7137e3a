import { createLocationPatternRequestSchema, locationPatternResponseSchema } from '@/schemas/location'
import { route } from '@/server/http/route'
import { createLocationPattern } from '@/server/services/locations/create-location-pattern'

export const POST = route({
  access: 'keepCrib',
  body: createLocationPatternRequestSchema,
  answer: locationPatternResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createLocationPattern(actor, body),
})
