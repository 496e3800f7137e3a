import { idParamsSchema } from '@/schemas/fields'
import { supplierResponseSchema, updateSupplierRequestSchema } from '@/schemas/supplier'
import { route } from '@/server/http/route'
import { updateSupplier } from '@/server/services/reordering/suppliers'

export const PATCH = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: updateSupplierRequestSchema,
  answer: supplierResponseSchema,
  handle: ({ actor, params, body }) => updateSupplier(actor, params.id, body),
})
