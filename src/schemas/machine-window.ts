import { z } from 'zod'
import { optionalSizeSchema, sizeSchema } from './reach'

const rotaryStockSchema = z.strictObject({
  widthMm: sizeSchema,
  heightMm: sizeSchema,
  offsetXMm: optionalSizeSchema,
  offsetYMm: optionalSizeSchema,
  axisHeightMm: sizeSchema,
  chuckRadiusMm: optionalSizeSchema,
})

/**
 * Shapes alone: what a height may be is the core's to say. A member nobody knows is a wrong shape, because a misspelt
 * height that is left out would let a tool through that strikes.
 */
export const machineWindowRequestSchema = z.strictObject({
  gaugeLineToTableMm: sizeSchema,
  zTravelMm: sizeSchema,
  highestMm: sizeSchema,
  lowestTipMm: sizeSchema,
  retractClearanceMm: sizeSchema,
  longestToolMm: optionalSizeSchema,
  rotaryStock: rotaryStockSchema.nullish(),
})

export const machineWindowResponseSchema = z.object({
  gaugeLengthMm: z.object({ shortest: z.number(), longest: z.number() }),
  longestBoundBy: z.enum(['retract', 'changer']),
  sweptRadiusMm: z.number().nullable(),
  highestMm: z.number(),
  tableClearanceMm: z.number().nullable(),
  /** By how much the window is crossed, and by how much what turns is too near to the table; 0 where they are not. */
  shortfallMm: z.number(),
  tableStrikeMm: z.number(),
  possible: z.boolean(),
})
