import { idParamsSchema } from '@/schemas/fields'
import { locationContentsResponseSchema } from '@/schemas/location'
import { route } from '@/server/http/route'
import { getLocationContents } from '@/server/services/locations/get-location-contents'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  answer: locationContentsResponseSchema,
  handle: ({ params }) => getLocationContents(params.id),
})
