import { z } from 'zod'
import { catalogueKinds } from '@/core/stock/kinds'
import { bulkLimit } from './catalogue-bulk'
import { idSchema, optionalLineSchema, versionSchema } from './fields'
import { itemSizeSchema } from './item-size'
import { listQuerySchema, listResponseSchema, setFilter } from './paging'
import { leadTimeDaysSchema } from './supplier'

const mostPieces = 1_000_000
const tooMany = 'More than a million pieces: check the number.'

function piecesSchema(least: number, missing: string) {
  return z
    .number(missing)
    .multipleOf(1, 'Only whole pieces.')
    .min(least, least === 0 ? 'Less than 0.' : `At least ${least}.`)
    .max(mostPieces, tooMany)
}

export const reorderPointParamsSchema = z.object({ itemId: idSchema, cribId: idSchema })

const reorderPointFields = {
  reorderPoint: piecesSchema(0, 'Give the reorder point.'),
  orderUpTo: piecesSchema(0, 'Give the order-up-to level.'),
  packSize: piecesSchema(1, 'Give the pack as a number.').optional(),
  minimumOrder: piecesSchema(1, 'Give the smallest order as a number.').optional(),
  supplierId: idSchema.nullable().optional(),
  supplierPartNumber: optionalLineSchema(200).optional(),
  leadTimeDays: leadTimeDaysSchema.nullable().optional(),
  version: versionSchema.optional(),
}

const isWithinOrderUpTo = ({ reorderPoint, orderUpTo }: { reorderPoint: number; orderUpTo: number }) =>
  reorderPoint <= orderUpTo
const aboveOrderUpTo = {
  path: ['reorderPoint'],
  message: 'The reorder point is above the order-up-to level.',
}

/** What is absent stays as it was. With a version, only that version is changed. */
export const putReorderPointRequestSchema = z
  .object(reorderPointFields)
  .refine(isWithinOrderUpTo, aboveOrderUpTo)
export type PutReorderPointRequest = z.output<typeof putReorderPointRequestSchema>

/** Many at once, each as its own PUT would be: all of them or none. */
export const putReorderPointsRequestSchema = z.object({
  rows: z
    .array(
      z
        .object({ itemId: idSchema, cribId: idSchema, ...reorderPointFields })
        .refine(isWithinOrderUpTo, aboveOrderUpTo),
    )
    .min(1, 'Name the rows to set.')
    .max(bulkLimit, `At most ${bulkLimit} rows at once.`)
    .refine(
      (rows) => new Set(rows.map(({ itemId, cribId }) => `${itemId}-${cribId}`)).size === rows.length,
      'A row stands here twice.',
    ),
})
export type PutReorderPointsRequest = z.output<typeof putReorderPointsRequestSchema>

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
  /** What may be wrong with it, in a sentence; it is kept all the same. */
  caution: z.string().nullable(),
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

/** The rows as they are now, in the order they were sent. */
export const putReorderPointsResponseSchema = z.object({ rows: z.array(reorderPointResponseSchema) })

/** `low` at or below the reorder point, `above` it, `out` with nothing on hand. */
export const reorderStockStates = ['low', 'above', 'out'] as const

/** As a filter, no supplier at all. */
export const noSupplier = 'none'

const reorderPointFilters = {
  cribId: idSchema.optional(),
  itemId: idSchema.optional(),
  supplierId: z.union([z.literal(noSupplier), idSchema]).optional(),
  stockState: setFilter(reorderStockStates),
}

export const reorderPointSortFields = [
  'itemCode',
  'description',
  'cribCode',
  'onHand',
  'position',
  'reorderPoint',
  'orderUpTo',
  'packSize',
  'minimumOrder',
  'supplierId',
  'supplierPartNumber',
  'leadTimeDays',
] as const

export const reorderPointListQuerySchema = listQuerySchema(reorderPointFilters, reorderPointSortFields)
export type ReorderPointListQuery = z.output<typeof reorderPointListQuerySchema>

const paging = { limit: true, offset: true, cursor: true } as const
export const reorderPointExportQuerySchema = reorderPointListQuerySchema.omit(paging)
export const reorderPointCountsQuerySchema = reorderPointListQuerySchema.omit({ ...paging, sort: true })
export type ReorderPointSelection = Omit<ReorderPointListQuery, keyof typeof paging>

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
  /** What it measures, to say what it is where it has no description; null where it carries no geometry. */
  size: itemSizeSchema.nullable(),
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
