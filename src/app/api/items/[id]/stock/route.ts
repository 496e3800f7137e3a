import { idParamsSchema } from '@/schemas/fields'
import { itemStockResponseSchema } from '@/schemas/stock'
import { route } from '@/server/http/route'
import { getItemStock } from '@/server/services/stock/get-item-stock'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  answer: itemStockResponseSchema,
  handle: ({ params }) => getItemStock(params.id),
})
