import { z } from 'zod'
import { cutterForms } from '@/core/tooling'
import { boreSchema } from './bore'

/** What tells an item from others of its kind at a glance, to be put in words where it has no description. */
export const itemSizeSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('cutter'),
    form: z.enum(cutterForms),
    cuttingDiameterMm: z.number(),
    cornerRadiusMm: z.number().nullable(),
    lengthOfCutMm: z.number().nullable(),
    overallLengthMm: z.number().nullable(),
  }),
  z.object({
    kind: z.literal('holder'),
    taper: z.string().nullable(),
    bore: boreSchema,
    gaugeLengthMm: z.number(),
  }),
  z.object({
    kind: z.literal('collet'),
    series: z.string(),
    minimumMm: z.number(),
    maximumMm: z.number(),
  }),
  z.object({ kind: z.literal('extension'), bore: boreSchema, projectionMm: z.number() }),
])
export type ItemSize = z.infer<typeof itemSizeSchema>
