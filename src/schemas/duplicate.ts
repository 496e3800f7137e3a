import { z } from 'zod'
import { catalogueKinds, conditions, shopLocationKinds } from '@/core/stock/kinds'
import { idSchema } from './fields'
import { itemSizeSchema } from './item-size'

export const duplicatesQuerySchema = z.strictObject({ kind: z.enum(catalogueKinds, 'Say which kind.') })

export const duplicateItemSchema = z.object({
  id: z.string(),
  code: z.string(),
  maker: z.string().nullable(),
  partNumber: z.string().nullable(),
  description: z.string(),
  isTrackedByPiece: z.boolean(),
  onHand: z.number(),
  /** Cribs in which it has a reorder point. */
  reorderPoints: z.number(),
})
export type DuplicateItem = z.infer<typeof duplicateItemSchema>

/** Groups of items of one geometry, the one most worth keeping first; `total` counts all groups, of which the first stand here. */
export const duplicatesResponseSchema = z.object({
  groups: z.array(z.object({ size: itemSizeSchema, items: z.array(duplicateItemSchema) })),
  total: z.number(),
})
export type DuplicatesResponse = z.infer<typeof duplicatesResponseSchema>

/** Which item stays and which goes into it: asked about, then done. */
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

/** What a merge would do, or why it cannot be made, as things stand now. */
export const mergePreviewResponseSchema = z.object({
  /** A sentence where it would be refused. */
  refusal: z.string().nullable(),
  held: z.array(
    z.object({
      locationId: z.string(),
      locationKind: z.enum(shopLocationKinds),
      locationCode: z.string(),
      locationName: z.string(),
      cribCode: z.string().nullable(),
      condition: z.enum(conditions),
      quantity: z.number(),
      tags: z.array(z.string()),
    }),
  ),
  /** Tags of pieces that never came in or that a count missed: they become pieces of the kept item too. */
  tagsNowhere: z.array(z.string()),
  /** By crib where either item has a reorder point or an open alert. */
  cribs: z.array(
    z.object({
      cribCode: z.string(),
      kept: z.object({ reorderPoint: z.number(), orderUpTo: z.number() }).nullable(),
      merged: z.object({ reorderPoint: z.number(), orderUpTo: z.number() }).nullable(),
      /** Whether an alert of the item that goes is open, which the merge closes. */
      closesAlert: z.boolean(),
      /** The kept item's position once it has the pieces. */
      positionAfter: z.number(),
      isLowBefore: z.boolean(),
      isLowAfter: z.boolean(),
    }),
  ),
  /** Codes of items merged into the one that goes: whoever searches for them finds the kept one. */
  earlierCodes: z.array(z.string()),
})
export type MergePreview = z.infer<typeof mergePreviewResponseSchema>

const mergedWithSchema = z.object({ id: z.string(), kind: z.enum(catalogueKinds), code: z.string() })

/** What an item went into, and what went into it. */
export const itemMergesResponseSchema = z.object({
  into: mergedWithSchema.nullable(),
  from: z.array(mergedWithSchema),
})
export type ItemMerges = z.infer<typeof itemMergesResponseSchema>
