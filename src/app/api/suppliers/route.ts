import {
  createSupplierRequestSchema,
  supplierListResponseSchema,
  supplierResponseSchema,
} from '@/schemas/reordering'
import { route } from '@/server/http/route'
import { createSupplier, listSuppliers } from '@/server/services/reordering/suppliers'

export const GET = route({
  access: 'see',
  answer: supplierListResponseSchema,
  handle: () => listSuppliers(),
})

export const POST = route({
  access: 'keepCrib',
  body: createSupplierRequestSchema,
  answer: supplierResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createSupplier(actor, body),
})
