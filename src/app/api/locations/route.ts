import {
  createLocationRequestSchema,
  locationListQuerySchema,
  locationListResponseSchema,
  locationResponseSchema,
} from '@/schemas/location'
import { route } from '@/server/http/route'
import { createLocation } from '@/server/services/locations/create-location'
import { listLocations } from '@/server/services/locations/list-locations'

export const GET = route({
  access: 'see',
  query: locationListQuerySchema,
  answer: locationListResponseSchema,
  handle: ({ query }) => listLocations(query),
})

export const POST = route({
  access: 'keepCrib',
  body: createLocationRequestSchema,
  answer: locationResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createLocation(actor, body),
})
