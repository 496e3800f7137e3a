import { z } from 'zod'
import { holderProblems } from '@/core/catalogue/holding-problems'
import { holderSegmentParts } from '@/core/tooling'
import { boreKinds, clampingFields, clampingResponseFields, segmentFields, segmentsSchema } from './bore'
import { countSchema, lengthMmSchema, optionalLineSchema } from './fields'
import { addProblems, changeFields, itemFields, itemResponseFields } from './item'
import {
  itemListQueryFields,
  itemSortFields,
  listQuerySchema,
  listResponseSchema,
  numberFilters,
  setFilter,
  valuesFilter,
} from './paging'

export const holderSegmentSchema = z.object({
  part: z.enum(holderSegmentParts, 'Choose nut or holder.'),
  ...segmentFields,
})

const holderFieldsSchema = z.object({
  ...itemFields,
  taper: optionalLineSchema(100).optional(),
  gaugeLengthMm: lengthMmSchema('Give the gauge length.'),
  ...clampingFields,
  sideLockInsertionMm: lengthMmSchema().nullable().optional(),
  maximumRpm: countSchema(2_000_000_000).nullable().optional(),
  segments: segmentsSchema(holderSegmentSchema),
})

export const createHolderRequestSchema = holderFieldsSchema.superRefine((holder, context) =>
  addProblems(context, holderProblems(holder)),
)
export type CreateHolderRequest = z.output<typeof createHolderRequestSchema>

/** Absent leaves alone, null clears; segments are given all together or not at all. */
export const updateHolderRequestSchema = holderFieldsSchema.partial().extend(changeFields)
export type UpdateHolderRequest = z.output<typeof updateHolderRequestSchema>

export const holderResponseSchema = z.object({
  ...itemResponseFields,
  kind: z.literal('holder'),
  taper: z.string().nullable(),
  gaugeLengthMm: z.number(),
  ...clampingResponseFields,
  sideLockInsertionMm: z.number().nullable(),
  maximumRpm: z.number().nullable(),
  segments: z.array(holderSegmentSchema),
})
export type HolderResponse = z.infer<typeof holderResponseSchema>

export const holderListResponseSchema = listResponseSchema(holderResponseSchema)

const holderNumberFields = [
  'gaugeLengthMm',
  'boreDiameterMm',
  'boreDepthMm',
  'minimumGripMm',
  'gripStartMm',
  'nutTorqueNm',
  'sideLockInsertionMm',
  'maximumRpm',
] as const

export const holderSortFields = [
  ...itemSortFields,
  'taper',
  'series',
  'boreKind',
  ...holderNumberFields,
] as const

export const holderListQuerySchema = listQuerySchema(
  {
    ...itemListQueryFields,
    taper: valuesFilter,
    series: valuesFilter,
    boreKind: setFilter(boreKinds),
    ...numberFilters(holderNumberFields),
  },
  holderSortFields,
)
