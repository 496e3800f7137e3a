import { cribListResponseSchema } from '@/schemas/location'
import { route } from '@/server/http/route'
import { listCribs } from '@/server/services/locations/list-cribs'

export const GET = route({ access: 'see', answer: cribListResponseSchema, handle: () => listCribs() })
