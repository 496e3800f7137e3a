import {
  createSupplierRequestSchema,
  supplierListQuerySchema,
  supplierListResponseSchema,
  supplierResponseSchema,
} from '@/schemas/supplier'
import { route } from '@/server/http/route'
import { createSupplier, listSuppliers } from '@/server/services/reordering/suppliers'

export const GET = route({
  access: 'see',
  query: supplierListQuerySchema,
  answer: supplierListResponseSchema,
  handle: ({ query }) => listSuppliers(query),
})

export const POST = route({
  access: 'keepCrib',
  body: createSupplierRequestSchema,
  answer: supplierResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createSupplier(actor, body),
})
