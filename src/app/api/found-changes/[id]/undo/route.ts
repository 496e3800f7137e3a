import { idParamsSchema } from '@/schemas/fields'
import { foundChangeResponseSchema } from '@/schemas/found-change'
import { route } from '@/server/http/route'
import { undoFoundChange } from '@/server/services/catalogue/undo-found-change'

/** Takes a change of everything found back; done twice it is refused. */
export const POST = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: foundChangeResponseSchema,
  handle: ({ actor, params }) => undoFoundChange(actor, params.id),
})
