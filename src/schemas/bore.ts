import { z } from 'zod'
import { countSchema, distanceMmSchema, lengthMmSchema, lineSchema } from './fields'
import { setFilter, valuesFilter } from './paging'

/** What takes a shank, in a holder as in an extension. */
export const boreSchema = z.discriminatedUnion(
  'kind',
  [
    z.object({ kind: z.literal('collet'), series: lineSchema('Give the collet series.', 100) }),
    z.object({ kind: z.literal('fixed'), diameterMm: lengthMmSchema('Give the bore diameter.') }),
  ],
  'Choose a collet or a fixed bore.',
)

export const clampingFields = {
  bore: boreSchema,
  boreDepthMm: lengthMmSchema().nullable().optional(),
  minimumGripMm: lengthMmSchema().nullable().optional(),
  gripStartMm: distanceMmSchema().nullable().optional(),
  /** What the maker says the nut is tightened to. */
  nutTorqueNm: countSchema(2000, 'Give whole newton metres.').nullable().optional(),
}

export const clampingResponseFields = {
  bore: boreSchema,
  boreDepthMm: z.number().nullable(),
  minimumGripMm: z.number().nullable(),
  gripStartMm: z.number().nullable(),
  nutTorqueNm: z.number().nullable(),
}

export const segmentFields = {
  lengthMm: lengthMmSchema('Give the length of the segment.'),
  noseDiameterMm: lengthMmSchema('Give the diameter at the nose end.'),
  spindleDiameterMm: lengthMmSchema('Give the diameter at the spindle end.'),
}

/** From the nose face towards the spindle. */
export function segmentsSchema<Segment extends z.ZodType>(segment: Segment) {
  return z
    .array(segment, 'Give the segments.')
    .min(1, 'Give at least one segment.')
    .max(100, 'At most 100 segments.')
}

export const boreKinds = ['collet', 'fixed'] as const

/** What a list of holders or extensions is sorted and filtered by of their bores. */
export const boreNumberFields = [
  'boreDiameterMm',
  'boreDepthMm',
  'minimumGripMm',
  'gripStartMm',
  'nutTorqueNm',
] as const
export const boreWordFields = ['series', 'boreKind'] as const
export const boreFilterFields = { series: valuesFilter, boreKind: setFilter(boreKinds) }
