import { z } from 'zod'

/** What can't be (a depth of nothing, a stepover over the diameter) is refused by the core, with its reason. */
export const ballSpeedRequestSchema = z.object({
  cuttingDiameterMm: z.number(),
  cornerRadiusMm: z.number().nullish(),
  depthOfCutMm: z.number(),
  tiltDeg: z.number(),
  leadDeg: z.number().nullish(),
  stepoverMm: z.number().nullish(),
  spindleRpm: z.number().nullish(),
  wantedSpeedMPerMin: z.number().nullish(),
  maximumRpm: z.number().nullish(),
})

const spanSchema = z.object({ largest: z.number(), smallest: z.number() })

export const ballSpeedResponseSchema = z.object({
  tiltDeg: z.number(),
  effectiveDiameterMm: spanSchema,
  tipInCut: z.boolean(),
  tiltToClearTipDeg: z.number().nullable(),
  speedMPerMin: spanSchema.nullable(),
  nominalSpeedMPerMin: z.number().nullable(),
  spindleRpm: z.number().nullable(),
  spindleLimited: z.boolean(),
  scallopHeightMm: z.number().nullable(),
  chipThinningFactor: z.number().nullable(),
})
