import { z } from 'zod'
import { catalogueKinds, toolingKinds } from '@/core/stock/kinds'
import { cutterResponseSchema } from './cutter'
import { distanceMmSchema, lengthMmSchema } from './fields'
import { listQuerySchema, listResponseSchema, setFilter } from './paging'

export const fitsItemSchema = z.object({
  id: z.string(),
  kind: z.enum(catalogueKinds),
  code: z.string(),
  maker: z.string().nullable(),
  partNumber: z.string().nullable(),
  description: z.string(),
  /** What makes it fit: a shank, a fixed bore, a collet's range, a series. */
  shankDiameterMm: z.number().nullable(),
  boreDiameterMm: z.number().nullable(),
  minimumMm: z.number().nullable(),
  maximumMm: z.number().nullable(),
  series: z.string().nullable(),
  /** Where in the collet's range the shank sits: 0 at its smallest, which grips worst, 1 at its largest. */
  placeInRange: z.number().nullable(),
  onHand: z.number(),
})
export type FitsItem = z.infer<typeof fitsItemSchema>

export const fitsListResponseSchema = listResponseSchema(fitsItemSchema)

export const fitsListQuerySchema = listQuerySchema({ kind: setFilter(toolingKinds) })

/** A length in an address: plain decimal millimetres. */
function lengthTextSchema(length: z.ZodType<number, number>) {
  return z
    .string()
    .regex(/^\d{1,6}(\.\d{1,12})?$/, 'Only a plain decimal number of millimetres.')
    .transform(Number)
    .pipe(length)
}

/** What is asked about without an item: a shank, a fixed bore, or a series of collets. */
export const fitsQuerySchema = listQuerySchema({
  kind: setFilter(toolingKinds),
  shankDiameterMm: lengthTextSchema(lengthMmSchema()).optional(),
  boreDiameterMm: lengthTextSchema(lengthMmSchema()).optional(),
  series: z.string().trim().min(1, 'Name the series, such as ER20.').max(100).optional(),
}).superRefine(({ shankDiameterMm, boreDiameterMm, series }, context) => {
  const asked = [shankDiameterMm, boreDiameterMm, series].filter((value) => value !== undefined)
  if (asked.length === 1) return
  context.addIssue({
    code: 'custom',
    path: ['shankDiameterMm'],
    message: 'Ask about one of shankDiameterMm, boreDiameterMm and series.',
  })
})
export type FitsQuery = z.output<typeof fitsQuerySchema>

/** A pocket's inside corner and depth, and the radius its floor may have; `floorRadiusMm=0` asks for a square end. */
export const fittingCuttersQuerySchema = listQuerySchema({
  insideCornerRadiusMm: lengthTextSchema(lengthMmSchema()),
  depthMm: lengthTextSchema(lengthMmSchema()),
  floorRadiusMm: lengthTextSchema(distanceMmSchema()).optional(),
  inStock: z.enum(['yes', 'no'], 'Only yes or no.').default('no'),
})
export type FittingCuttersQuery = z.output<typeof fittingCuttersQuerySchema>

export const fittingCutterSchema = cutterResponseSchema.extend({
  /** Before something of the cutter itself rubs on a straight wall. */
  usableDepthMm: z.number(),
  usableDepthEndsWith: z.enum(['neck', 'lengthOfCut']),
})
export type FittingCutter = z.infer<typeof fittingCutterSchema>

export const fittingCuttersResponseSchema = listResponseSchema(fittingCutterSchema)
