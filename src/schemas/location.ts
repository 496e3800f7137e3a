import { z } from 'zod'
import { catalogueKinds, conditions, shopLocationKinds } from '@/core/stock/kinds'
import { idSchema, lineSchema, versionSchema } from './fields'
import { archivedChoices, listQuerySchema, listResponseSchema, setFilter, textFilter } from './paging'

export const locationResponseSchema = z.object({
  id: z.string(),
  version: z.number(),
  code: z.string(),
  kind: z.enum(shopLocationKinds),
  cribId: z.string().nullable(),
  cribCode: z.string().nullable(),
  name: z.string(),
  /** What it stands in; null for a crib itself and for what is in no crib. */
  parentId: z.string().nullable(),
  archivedAt: z.iso.datetime().nullable(),
})
export type LocationResponse = z.infer<typeof locationResponseSchema>

export const locationListResponseSchema = listResponseSchema(locationResponseSchema)

export const locationListQuerySchema = listQuerySchema(
  {
    kind: setFilter(shopLocationKinds),
    cribId: idSchema.optional(),
    parentId: idSchema.optional(),
    code: textFilter,
    archived: z.enum(archivedChoices, 'Only no, only or all.').default('no'),
  },
  ['code', 'name', 'kind', 'cribCode'],
)

const code = lineSchema('Give the location a code.', 100)
const name = lineSchema('Give the location a name.', 200)

/** A crib needs its time zone; what is in it stands in something; the rest is in no crib. */
export const createLocationRequestSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('crib'),
    code,
    name,
    timeZone: lineSchema('Give the time zone, such as Europe/Vienna.', 100),
  }),
  z.object({ kind: z.enum(['cabinet', 'drawer', 'bin']), code, name, parentId: idSchema }),
  z.object({ kind: z.enum(['regrind', 'inTransit']), code, name }),
])
export type CreateLocationRequest = z.output<typeof createLocationRequestSchema>

/** A wall of bins from its first code to its last: `A1` to `F12`. */
export const createLocationPatternRequestSchema = z.strictObject({
  parentId: idSchema,
  first: lineSchema('Give the first code.', 100),
  last: lineSchema('Give the last code.', 100),
})
export type CreateLocationPatternRequest = z.output<typeof createLocationPatternRequestSchema>

export const locationPatternResponseSchema = z.object({ added: z.number(), codes: z.array(z.string()) })
export type LocationPatternResponse = z.infer<typeof locationPatternResponseSchema>

/** A location keeps its kind and its crib; within it, it may move. */
export const updateLocationRequestSchema = z.object({
  version: versionSchema,
  code: code.optional(),
  name: name.optional(),
  parentId: idSchema.optional(),
  /** Null brings an archived location back; only DELETE archives one. */
  archivedAt: z.iso.datetime().nullable().optional(),
})
export type UpdateLocationRequest = z.output<typeof updateLocationRequestSchema>

export const cribResponseSchema = z.object({
  id: z.string(),
  code: z.string(),
  name: z.string(),
  timeZone: z.string(),
  /** The crib's own root among the locations. */
  locationId: z.string(),
  /** Active ones; a crib without any writes to crib managers and admins. */
  members: z.number(),
})
export type CribResponse = z.infer<typeof cribResponseSchema>

/** Cribs are few: all of them, by code. */
export const cribListResponseSchema = z.object({ rows: z.array(cribResponseSchema) })

/** What lies in a location and in everything that stands in it. */
export const locationContentsResponseSchema = z.object({
  rows: z.array(
    z.object({
      itemId: z.string(),
      itemKind: z.enum(catalogueKinds),
      code: z.string(),
      description: z.string(),
      locationId: z.string(),
      locationCode: z.string(),
      condition: z.enum(conditions),
      quantity: z.number(),
    }),
  ),
})
export type LocationContents = z.infer<typeof locationContentsResponseSchema>
