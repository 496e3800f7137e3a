import { z } from 'zod'
import type { GeometryProblem } from '@/core/catalogue/geometry-problem'
import { catalogueKinds } from '@/core/stock/kinds'
import {
  descriptionSchema,
  idSchema,
  lineSchema,
  minorUnitsSchema,
  optionalLineSchema,
  versionSchema,
} from './fields'

/** What every item has, whatever its kind. */
export const itemFields = {
  code: lineSchema('Give the item a code.', 100),
  maker: optionalLineSchema(200).optional(),
  partNumber: optionalLineSchema(200).optional(),
  description: descriptionSchema.optional(),
  unitCost: minorUnitsSchema.nullable().optional(),
}

/** Of a change: what is absent is left alone, what is null is cleared; `archivedAt: null` brings an item back. */
export const changeFields = { version: versionSchema, archivedAt: z.iso.datetime().nullable().optional() }

/** Where pieces on hand lie. */
export const stockPlaceSchema = z.object({
  locationId: z.string(),
  code: z.string(),
  cribId: z.string(),
  cribCode: z.string(),
  quantity: z.number(),
})

/** Over all cribs, or over the one asked for. */
export const stockSummarySchema = z.object({
  onHand: z.number(),
  available: z.number(),
  /** In one of these cribs the position is at or below the reorder point. */
  isLow: z.boolean(),
  /** Bins with pieces on hand, fullest first. */
  locations: z.array(stockPlaceSchema),
})
export type StockSummary = z.infer<typeof stockSummarySchema>

export const itemResponseFields = {
  id: z.string(),
  kind: z.enum(catalogueKinds),
  version: z.number(),
  code: z.string(),
  maker: z.string().nullable(),
  partNumber: z.string().nullable(),
  description: z.string(),
  /** Minor units of `currency`; both are absent for those who may not see costs. */
  unitCost: z.number().nullable().optional(),
  currency: z.string().optional(),
  archivedAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  stock: stockSummarySchema,
}

/** Turns what the core says of a geometry into issues of a schema, each at its field. */
export function addProblems(context: z.RefinementCtx, problems: GeometryProblem[]): void {
  for (const { path, message } of problems) context.addIssue({ code: 'custom', path, message })
}

/** Stock of one item is summed over all cribs unless one is asked for. */
export const itemQuerySchema = z.strictObject({ cribId: idSchema.optional() })

export const makerListQuerySchema = z.strictObject({ kind: z.enum(catalogueKinds).optional() })
export const makerListResponseSchema = z.object({ rows: z.array(z.string()) })
