import { idParamsSchema } from '@/schemas/fields'
import { setUpResponseSchema, updateSetUpRequestSchema } from '@/schemas/set-up'
import { route } from '@/server/http/route'
import { removeSetUp, updateSetUp } from '@/server/services/set-ups/change-set-up'
import { getSetUp } from '@/server/services/set-ups/get-set-up'
import { setUpAnswer } from '@/server/services/set-ups/set-up-answer'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  answer: setUpResponseSchema,
  handle: async ({ params }) => setUpAnswer(await getSetUp(params.id)),
})

export const PATCH = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: updateSetUpRequestSchema,
  answer: setUpResponseSchema,
  handle: ({ actor, params, body }) => updateSetUp(actor, params.id, body),
})

export const DELETE = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: ({ actor, params }) => removeSetUp(actor, params.id),
})
