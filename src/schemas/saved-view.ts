import { z } from 'zod'
import { catalogueKinds } from '@/core/stock/kinds'
import { lineSchema, versionSchema } from './fields'

const savedViewFields = {
  name: lineSchema('Give the view a name.', 100),
  isShared: z.boolean('Say whether everyone sees it.'),
  /** As the address of the list has it. What of it means nothing any more is left out when the view is opened. */
  query: z.string('Send the query of the list.').max(5000, 'This view is too long to keep.'),
}

export const savedViewListQuerySchema = z.strictObject({ kind: z.enum(catalogueKinds, 'Which list?') })

export const createSavedViewRequestSchema = z.object({
  kind: z.enum(catalogueKinds, 'Which list?'),
  ...savedViewFields,
})
export type CreateSavedViewRequest = z.output<typeof createSavedViewRequestSchema>

export const updateSavedViewRequestSchema = z
  .object(savedViewFields)
  .partial()
  .extend({ version: versionSchema })
export type UpdateSavedViewRequest = z.output<typeof updateSavedViewRequestSchema>

export const savedViewResponseSchema = z.object({
  id: z.string(),
  version: z.number(),
  kind: z.enum(catalogueKinds),
  name: z.string(),
  isShared: z.boolean(),
  query: z.string(),
  ownerName: z.string(),
  isMine: z.boolean(),
})
export type SavedViewResponse = z.infer<typeof savedViewResponseSchema>

export const savedViewListResponseSchema = z.object({ rows: z.array(savedViewResponseSchema) })
