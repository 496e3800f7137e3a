import { z } from 'zod'
import { findWorkMaterial } from '@/core/cutting/work-materials'
import { sizeSchema } from './reach'

const moreThanZeroSchema = sizeSchema.positive('More than 0.')

/** One cut asked of every assembly of a search. */
export const searchCutSchema = z.strictObject({
  /** Its number in the table of specific cutting forces, after VDI 3323. */
  materialNumber: z
    .number('Give the number of a material.')
    .refine((number) => findWorkMaterial(number) !== null, 'No material of the table has this number.'),
  /** A feed a tooth as at full engagement, of a drill a feed a revolution. */
  feedMm: moreThanZeroSchema,
  /** Of milling; a drill needs neither. */
  depthOfCutMm: moreThanZeroSchema.nullish(),
  stepoverMm: moreThanZeroSchema.nullish(),
  /** Absent: the slow end of the shop's starting speeds for the material's group and what the cutter is made of. */
  cuttingSpeedMPerMin: moreThanZeroSchema.nullish(),
})
export type SearchCut = z.output<typeof searchCutSchema>

const cutAssumptionSchema = z.enum([
  'estimate',
  'tip-load',
  'exponent-assumed',
  'point-angle-assumed',
  'spindle-unknown',
  'speed-limited',
  'speed-below-spindle',
  'speed-off-curve',
])

const sharedFields = {
  diameterMm: z.number(),
  spindleRpm: z.number(),
  cuttingSpeedMPerMin: z.number(),
  feedMmPerMin: z.number(),
  chipMm: z.number(),
  specificForceNPerMm2: z.number(),
  torqueNm: z.number(),
  /** At the cutter; the motor gives it over the machine's efficiency. */
  powerKw: z.number(),
  motorPowerKw: z.number().nullable(),
  /** What the spindle gives at this speed, and the share of it asked for; null where its curve does not say. */
  drive: z
    .object({
      powerKw: z.number(),
      torqueNm: z.number(),
      powerShare: z.number(),
      torqueShare: z.number(),
      drives: z.boolean(),
    })
    .nullable(),
  stickOutBand: z.enum(['plain', 'caution', 'over']),
  /** Always with `estimate`: none of these figures is a setting to run by. */
  assumptions: z.array(cutAssumptionSchema),
}

const cutAnswerSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('milling'),
    ...sharedFields,
    feedPerToothMm: z.number(),
    chipThinningFactor: z.number(),
    cuttingForceN: z.number(),
    sideLoadN: z.number(),
    deflectionUm: z.number(),
  }),
  z.object({ kind: z.literal('drilling'), ...sharedFields, thrustN: z.number() }),
])

/** The cut as estimated for one assembly, or the sentence of what keeps it from being estimated. */
export const cutEstimateSchema = z.union([
  z.object({ answer: cutAnswerSchema, sentence: z.null() }),
  z.object({ answer: z.null(), sentence: z.string() }),
])
