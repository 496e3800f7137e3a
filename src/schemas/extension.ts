import { z } from 'zod'
import { extensionProblems } from '@/core/catalogue/holding-problems'
import {
  boreFilterFields,
  boreNumberFields,
  boreWordFields,
  clampingFields,
  clampingResponseFields,
  segmentFields,
  segmentsSchema,
} from './bore'
import { lengthMmSchema } from './fields'
import { addProblems, changeFields, itemFields, itemResponseFields } from './item'
import {
  itemListQueryFields,
  itemSortFields,
  listQuerySchema,
  listResponseSchema,
  numberFilters,
} from './paging'

export const extensionSegmentSchema = z.object(segmentFields)

const extensionFieldsSchema = z.object({
  ...itemFields,
  projectionMm: lengthMmSchema('Give the projection.'),
  shankDiameterMm: lengthMmSchema().nullable().optional(),
  ...clampingFields,
  segments: segmentsSchema(extensionSegmentSchema),
})

export const createExtensionRequestSchema = extensionFieldsSchema.superRefine((extension, context) =>
  addProblems(context, extensionProblems(extension)),
)
export type CreateExtensionRequest = z.output<typeof createExtensionRequestSchema>

/** Absent leaves alone, null clears; segments are given all together or not at all. */
export const updateExtensionRequestSchema = extensionFieldsSchema.partial().extend(changeFields)
export type UpdateExtensionRequest = z.output<typeof updateExtensionRequestSchema>

export const extensionResponseSchema = z.object({
  ...itemResponseFields,
  kind: z.literal('extension'),
  projectionMm: z.number(),
  /** What the holder takes; where it is not entered, nothing checks that one does. */
  shankDiameterMm: z.number().nullable(),
  ...clampingResponseFields,
  segments: z.array(extensionSegmentSchema),
})
export type ExtensionResponse = z.infer<typeof extensionResponseSchema>

export const extensionListResponseSchema = listResponseSchema(extensionResponseSchema)

const extensionNumberFields = ['projectionMm', 'shankDiameterMm', ...boreNumberFields] as const

export const extensionSortFields = [...itemSortFields, ...boreWordFields, ...extensionNumberFields] as const

export const extensionListQuerySchema = listQuerySchema(
  {
    ...itemListQueryFields,
    ...boreFilterFields,
    ...numberFilters(extensionNumberFields),
  },
  extensionSortFields,
)
