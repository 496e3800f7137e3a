import { idParamsSchema } from '@/schemas/fields'
import { locationResponseSchema, updateLocationRequestSchema } from '@/schemas/location'
import { route } from '@/server/http/route'
import { archiveLocation } from '@/server/services/locations/archive-location'
import { updateLocation } from '@/server/services/locations/update-location'

export const PATCH = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: updateLocationRequestSchema,
  answer: locationResponseSchema,
  handle: ({ actor, params, body }) => updateLocation(actor, params.id, body),
})

export const DELETE = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: ({ actor, params }) => archiveLocation(actor, params.id),
})
