import { z } from 'zod'
import { colletProblems } from '@/core/catalogue/holding-problems'
import { lengthMmSchema, lineSchema } from './fields'
import { addProblems, changeFields, itemFields, itemResponseFields } from './item'
import {
  itemListQueryFields,
  itemSortFields,
  listQuerySchema,
  listResponseSchema,
  numberFilters,
  valuesFilter,
} from './paging'

const colletFieldsSchema = z.object({
  ...itemFields,
  series: lineSchema('Give the series.', 100),
  minimumMm: lengthMmSchema('Give the smallest shank it takes.'),
  maximumMm: lengthMmSchema('Give the largest shank it takes.'),
  lengthMm: lengthMmSchema().nullable().optional(),
  minimumGripMm: lengthMmSchema().nullable().optional(),
})

export const createColletRequestSchema = colletFieldsSchema.superRefine((collet, context) =>
  addProblems(context, colletProblems(collet)),
)
export type CreateColletRequest = z.output<typeof createColletRequestSchema>

/** Absent leaves alone, null clears. */
export const updateColletRequestSchema = colletFieldsSchema.partial().extend(changeFields)
export type UpdateColletRequest = z.output<typeof updateColletRequestSchema>

export const colletResponseSchema = z.object({
  ...itemResponseFields,
  kind: z.literal('collet'),
  series: z.string(),
  minimumMm: z.number(),
  maximumMm: z.number(),
  lengthMm: z.number().nullable(),
  minimumGripMm: z.number().nullable(),
})
export type ColletResponse = z.infer<typeof colletResponseSchema>

export const colletListResponseSchema = listResponseSchema(colletResponseSchema)

const colletNumberFields = ['minimumMm', 'maximumMm', 'lengthMm', 'minimumGripMm'] as const

export const colletSortFields = [...itemSortFields, 'series', ...colletNumberFields] as const

export const colletListQuerySchema = listQuerySchema(
  {
    ...itemListQueryFields,
    series: valuesFilter,
    ...numberFilters(colletNumberFields),
  },
  colletSortFields,
)
