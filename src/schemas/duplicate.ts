import { z } from 'zod'
import { catalogueKinds, conditions } from '@/core/stock/kinds'
import { idSchema } from './fields'

export const duplicatesQuerySchema = z.strictObject({ kind: z.enum(catalogueKinds, 'Say which kind.') })

export const duplicateItemSchema = z.object({
  id: z.string(),
  code: z.string(),
  maker: z.string().nullable(),
  partNumber: z.string().nullable(),
  description: z.string(),
  isTrackedByPiece: z.boolean(),
  onHand: z.number(),
})
export type DuplicateItem = z.infer<typeof duplicateItemSchema>

/** Groups of items of one geometry; `total` counts all groups, of which the first stand here. */
export const duplicatesResponseSchema = z.object({
  groups: z.array(z.array(duplicateItemSchema)),
  total: z.number(),
})
export type DuplicatesResponse = z.infer<typeof duplicatesResponseSchema>

export const mergeItemsRequestSchema = z
  .strictObject({ keptItemId: idSchema, mergedItemId: idSchema })
  .superRefine(({ keptItemId, mergedItemId }, context) => {
    if (keptItemId !== mergedItemId) return
    context.addIssue({
      code: 'custom',
      path: ['mergedItemId'],
      message: 'An item is not merged into itself.',
    })
  })
export type MergeItemsRequest = z.output<typeof mergeItemsRequestSchema>

export const mergeItemsResponseSchema = z.object({
  keptItemId: z.string(),
  mergedItemId: z.string(),
  moved: z.array(z.object({ locationId: z.string(), condition: z.enum(conditions), quantity: z.number() })),
})
export type MergeItemsResponse = z.infer<typeof mergeItemsResponseSchema>

const mergedWithSchema = z.object({ id: z.string(), kind: z.enum(catalogueKinds), code: z.string() })

/** What an item went into, and what went into it. */
export const itemMergesResponseSchema = z.object({
  into: mergedWithSchema.nullable(),
  from: z.array(mergedWithSchema),
})
export type ItemMerges = z.infer<typeof itemMergesResponseSchema>
