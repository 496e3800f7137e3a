import { itemMergesResponseSchema } from '@/schemas/duplicate'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { getItemMerges } from '@/server/services/duplicates/list-duplicates'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  answer: itemMergesResponseSchema,
  handle: ({ params }) => getItemMerges(params.id),
})
