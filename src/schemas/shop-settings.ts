import { z } from 'zod'
import { lengthUnits } from '@/core/units/length-unit'

const notNegative = (most: number) =>
  z.number('A number is needed.').min(0, 'This cannot be negative.').max(most, `This is more than ${most}.`)
const positive = (most: number) =>
  z
    .number('A number is needed.')
    .gt(0, 'This must be more than nothing.')
    .max(most, `This is more than ${most}.`)

/** What reach is worked out with, where a request does not say. Lengths in mm, moduli in GPa. */
export const reachSettingsSchema = z.object({
  shankClearanceMm: notNegative(10),
  holderClearanceMm: notNegative(50),
  stickOutStepMm: positive(25.4),
  fluteToGripMm: notNegative(50),
  holeToleranceMm: notNegative(5),
  drillChipRoomDiameters: notNegative(10),
  fluteStiffnessRatio: positive(1),
  carbideModulusGpa: positive(1000),
  steelModulusGpa: positive(1000),
})

/** What estimates of cutting are worked out with, and how a long stick-out is spoken of. Plain ratios. */
export const cuttingSettingsSchema = z.object({
  radialForceShare: notNegative(2),
  stickOutCautionRatio: positive(100),
  stickOutLimitRatio: positive(100),
})

export const shopSettingsSchema = z.object({
  shopName: z.string().trim().min(1, 'The shop needs a name.').max(200),
  currency: z
    .string()
    .trim()
    .toUpperCase()
    .regex(/^[A-Z]{3}$/, 'A currency is three letters, such as EUR or USD.'),
  lengthUnit: z.enum(lengthUnits),
  decimalComma: z.boolean(),
  reach: reachSettingsSchema,
  cutting: cuttingSettingsSchema,
  /** How far a measured gauge length or diameter may be from the calculated one. */
  measuringToleranceMm: notNegative(5),
})

export const updateShopSettingsRequestSchema = shopSettingsSchema.partial().extend({
  version: z.number().int(),
  reach: reachSettingsSchema.partial().optional(),
  cutting: cuttingSettingsSchema.partial().optional(),
})
export type UpdateShopSettingsRequest = z.output<typeof updateShopSettingsRequestSchema>

/** The name is empty until the shop is set up. */
export const shopSettingsResponseSchema = shopSettingsSchema.extend({
  version: z.number(),
  shopName: z.string(),
})
export type ShopSettingsResponse = z.infer<typeof shopSettingsResponseSchema>
