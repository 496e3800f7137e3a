import {
  createSetUpRequestSchema,
  setUpListQuerySchema,
  setUpListResponseSchema,
  setUpResponseSchema,
} from '@/schemas/set-up'
import { route } from '@/server/http/route'
import { createSetUp } from '@/server/services/set-ups/change-set-up'
import { listSetUps } from '@/server/services/set-ups/list-set-ups'

export const GET = route({
  access: 'see',
  query: setUpListQuerySchema,
  answer: setUpListResponseSchema,
  handle: ({ query }) => listSetUps(query.machineId),
})

export const POST = route({
  access: 'keepCrib',
  body: createSetUpRequestSchema,
  answer: setUpResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createSetUp(actor, body),
})
