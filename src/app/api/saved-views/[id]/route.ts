import { idParamsSchema } from '@/schemas/fields'
import { savedViewResponseSchema, updateSavedViewRequestSchema } from '@/schemas/saved-view'
import { route } from '@/server/http/route'
import { removeSavedView } from '@/server/services/views/remove-saved-view'
import { updateSavedView } from '@/server/services/views/update-saved-view'

export const PATCH = route({
  access: 'see',
  params: idParamsSchema,
  body: updateSavedViewRequestSchema,
  answer: savedViewResponseSchema,
  handle: ({ actor, params, body }) => updateSavedView(actor, params.id, body),
})

export const DELETE = route({
  access: 'see',
  params: idParamsSchema,
  answer: null,
  handle: ({ actor, params }) => removeSavedView(actor, params.id),
})
