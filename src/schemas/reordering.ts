import { z } from 'zod'
import { catalogueKinds } from '@/core/stock/kinds'
import { idSchema, lineSchema, optionalLineSchema, versionSchema } from './fields'
import { listQuerySchema, listResponseSchema, setFilter } from './paging'

const mostPieces = 1_000_000
const tooMany = 'More than a million pieces: check the number.'

function piecesSchema(least: number, missing: string) {
  return z
    .number(missing)
    .multipleOf(1, 'Only whole pieces.')
    .min(least, least === 0 ? 'Less than 0.' : `At least ${least}.`)
    .max(mostPieces, tooMany)
}

const leadTimeDaysSchema = z
  .number('Give the days as a number.')
  .multipleOf(1, 'Only whole days.')
  .min(0, 'Less than 0.')
  .max(3650, 'More than ten years: check the number.')

export const reorderPointParamsSchema = z.object({ itemId: idSchema, cribId: idSchema })

/** What is absent stays as it was. With a version, only that version is changed. */
export const putReorderPointRequestSchema = z
  .object({
    reorderPoint: piecesSchema(0, 'Give the reorder point.'),
    orderUpTo: piecesSchema(0, 'Give the order-up-to level.'),
    packSize: piecesSchema(1, 'Give the pack as a number.').optional(),
    minimumOrder: piecesSchema(1, 'Give the smallest order as a number.').optional(),
    supplierId: idSchema.nullable().optional(),
    supplierPartNumber: optionalLineSchema(200).optional(),
    leadTimeDays: leadTimeDaysSchema.nullable().optional(),
    version: versionSchema.optional(),
  })
  .refine(({ reorderPoint, orderUpTo }) => reorderPoint <= orderUpTo, {
    path: ['reorderPoint'],
    message: 'The reorder point is above the order-up-to level.',
  })
export type PutReorderPointRequest = z.output<typeof putReorderPointRequestSchema>

export const reorderPointResponseSchema = z.object({
  itemId: z.string(),
  cribId: z.string(),
  version: z.number(),
  reorderPoint: z.number(),
  orderUpTo: z.number(),
  packSize: z.number(),
  minimumOrder: z.number(),
  supplierId: z.string().nullable(),
  supplierName: z.string().nullable(),
  supplierPartNumber: z.string().nullable(),
  leadTimeDays: z.number().nullable(),
})
export type ReorderPointResponse = z.infer<typeof reorderPointResponseSchema>

/** An item in a crib that has a reorder point; the id is both of theirs. */
export const reorderPointRowSchema = reorderPointResponseSchema.extend({
  id: z.string(),
  itemCode: z.string(),
  itemKind: z.enum(catalogueKinds).nullable(),
  description: z.string(),
  cribCode: z.string(),
  onHand: z.number(),
  position: z.number(),
})
export type ReorderPointRow = z.infer<typeof reorderPointRowSchema>

export const reorderPointListQuerySchema = listQuerySchema(
  { cribId: idSchema.optional(), itemId: idSchema.optional(), supplierId: idSchema.optional() },
  [],
)
export const reorderPointListResponseSchema = listResponseSchema(reorderPointRowSchema)

export const alertStates = ['open', 'closed'] as const

export const alertListQuerySchema = listQuerySchema(
  { state: setFilter(alertStates), cribId: idSchema.optional(), itemId: idSchema.optional() },
  [],
)

/** An alert with what is so now; the reorder point and what follows from it are null where it was taken away. */
export const alertResponseSchema = z.object({
  id: z.string(),
  itemId: z.string(),
  cribId: z.string(),
  openedAt: z.iso.datetime(),
  closedAt: z.iso.datetime().nullable(),
  itemCode: z.string(),
  itemKind: z.enum(catalogueKinds).nullable(),
  description: z.string(),
  cribCode: z.string(),
  /** Bins of the crib that hold the item, or held it last. */
  places: z.array(z.string()),
  onHand: z.number(),
  position: z.number(),
  reorderPoint: z.number().nullable(),
  orderUpTo: z.number().nullable(),
  suggestedQuantity: z.number().nullable(),
  supplierName: z.string().nullable(),
  supplierPartNumber: z.string().nullable(),
  leadTimeDays: z.number().nullable(),
})
export type AlertResponse = z.infer<typeof alertResponseSchema>
export const alertListResponseSchema = listResponseSchema(alertResponseSchema)

export const createSupplierRequestSchema = z.object({
  name: lineSchema('Give the supplier a name.', 200),
  email: z
    .union([z.literal(''), z.email('This is no e-mail address.').max(254, 'At most 254 characters.')])
    .transform((text) => (text === '' ? null : text))
    .nullable()
    .default(null),
  leadTimeDays: leadTimeDaysSchema.nullable().default(null),
})
export type CreateSupplierRequest = z.output<typeof createSupplierRequestSchema>

export const supplierResponseSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string().nullable(),
  leadTimeDays: z.number().nullable(),
})
export type SupplierResponse = z.infer<typeof supplierResponseSchema>
export const supplierListResponseSchema = z.object({ rows: z.array(supplierResponseSchema) })
