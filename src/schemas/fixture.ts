import { z } from 'zod'
import { lengthMmSchema } from './fields'
import { changeFields, itemFields, itemResponseFields } from './item'
import {
  itemListQueryFields,
  itemSortFields,
  listQuerySchema,
  listResponseSchema,
  numberFilters,
} from './paging'

export const createFixtureRequestSchema = z.object({
  ...itemFields,
  heightMm: lengthMmSchema('Give the height it stands on the table.'),
})
export type CreateFixtureRequest = z.output<typeof createFixtureRequestSchema>

/** Absent leaves alone, null clears. */
export const updateFixtureRequestSchema = createFixtureRequestSchema.partial().extend(changeFields)
export type UpdateFixtureRequest = z.output<typeof updateFixtureRequestSchema>

export const fixtureResponseSchema = z.object({
  ...itemResponseFields,
  kind: z.literal('fixture'),
  heightMm: z.number(),
})
export type FixtureResponse = z.infer<typeof fixtureResponseSchema>

export const fixtureListResponseSchema = listResponseSchema(fixtureResponseSchema)

export const fixtureListQuerySchema = listQuerySchema(
  { ...itemListQueryFields, ...numberFilters(['heightMm']) },
  [...itemSortFields, 'heightMm'],
)
