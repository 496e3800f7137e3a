import { z } from 'zod'
import { cutterProblems } from '@/core/catalogue/cutter-problems'
import { withPrintedBallRadius } from '@/core/catalogue/printed-ball-radius'
import { cutterForms, substrates } from '@/core/tooling'
import { countSchema, distanceMmSchema, lengthMmSchema } from './fields'
import { addProblems, changeFields, itemFields, itemResponseFields } from './item'
import {
  itemListQueryFields,
  itemSortFields,
  listQuerySchema,
  listResponseSchema,
  numberFilters,
  setFilter,
} from './paging'

const maximumAngle = 'More than 90°.'
const halfAngleSchema = z
  .number('Give an angle.')
  .min(0, 'Less than 0°.')
  .lt(90, 'A half angle is less than 90°.')

const cutterGeometryFields = {
  form: z.enum(cutterForms, 'Choose a form.'),
  cuttingDiameterMm: lengthMmSchema('Give the cutting diameter.'),
  cornerRadiusMm: distanceMmSchema().nullable().optional(),
  taperHalfAngleDeg: halfAngleSchema.nullable().optional(),
  pointAngleDeg: z
    .number('Give an angle.')
    .positive('An angle is more than 0°.')
    .max(180, 'More than 180°.')
    .nullable()
    .optional(),
  tipDiameterMm: distanceMmSchema().nullable().optional(),
  lengthOfCutMm: lengthMmSchema().nullable().optional(),
  fluteLengthMm: lengthMmSchema().nullable().optional(),
  neckDiameterMm: lengthMmSchema().nullable().optional(),
  neckTaperHalfAngleDeg: halfAngleSchema.nullable().optional(),
  reachLengthMm: lengthMmSchema().nullable().optional(),
  neckTransitionAngleDeg: z
    .number('Give an angle.')
    .positive('An angle is more than 0°.')
    .max(90, maximumAngle)
    .nullable()
    .optional(),
  shankDiameterMm: lengthMmSchema('Give the shank diameter.'),
  overallLengthMm: lengthMmSchema('Give the overall length.'),
  fluteCount: countSchema(1000).nullable().optional(),
  substrate: z.enum(substrates, 'Choose carbide or high-speed steel.').nullable().optional(),
  maximumRpm: countSchema(2_000_000_000).nullable().optional(),
}

const cutterFieldsSchema = z.object({ ...itemFields, ...cutterGeometryFields })

/** Members it does not know are ignored, so a row as read may be sent back; so for every kind of item. */
export const createCutterRequestSchema = cutterFieldsSchema
  .transform(withPrintedBallRadius)
  .superRefine((cutter, context) => addProblems(context, cutterProblems(cutter)))
export type CreateCutterRequest = z.output<typeof createCutterRequestSchema>

/** Absent leaves alone, null clears; how the numbers stand to each other is asked of the changed row as a whole. */
export const updateCutterRequestSchema = cutterFieldsSchema.partial().extend(changeFields)
export type UpdateCutterRequest = z.output<typeof updateCutterRequestSchema>

export const cutterResponseSchema = z.object({
  ...itemResponseFields,
  kind: z.literal('cutter'),
  form: z.enum(cutterForms),
  cuttingDiameterMm: z.number(),
  cornerRadiusMm: z.number().nullable(),
  taperHalfAngleDeg: z.number().nullable(),
  pointAngleDeg: z.number().nullable(),
  tipDiameterMm: z.number().nullable(),
  lengthOfCutMm: z.number().nullable(),
  fluteLengthMm: z.number().nullable(),
  neckDiameterMm: z.number().nullable(),
  neckTaperHalfAngleDeg: z.number().nullable(),
  reachLengthMm: z.number().nullable(),
  neckTransitionAngleDeg: z.number().nullable(),
  shankDiameterMm: z.number(),
  overallLengthMm: z.number(),
  fluteCount: z.number().nullable(),
  substrate: z.enum(substrates).nullable(),
  maximumRpm: z.number().nullable(),
})
export type CutterResponse = z.infer<typeof cutterResponseSchema>

export const cutterListResponseSchema = listResponseSchema(cutterResponseSchema)

const cutterNumberFields = [
  'cuttingDiameterMm',
  'cornerRadiusMm',
  'taperHalfAngleDeg',
  'pointAngleDeg',
  'tipDiameterMm',
  'lengthOfCutMm',
  'fluteLengthMm',
  'neckDiameterMm',
  'neckTaperHalfAngleDeg',
  'reachLengthMm',
  'neckTransitionAngleDeg',
  'shankDiameterMm',
  'overallLengthMm',
  'fluteCount',
  'maximumRpm',
] as const

/** Worked out for forms that work a straight wall; the list is filtered by them as What fits is. */
const pocketFigures = ['usableDepthMm', 'endRadiusMm'] as const

export const cutterSortFields = [...itemSortFields, 'form', 'substrate', ...cutterNumberFields] as const

export const cutterListQuerySchema = listQuerySchema(
  {
    ...itemListQueryFields,
    form: setFilter(cutterForms),
    substrate: setFilter(substrates),
    ...numberFilters([...cutterNumberFields, ...pocketFigures]),
  },
  cutterSortFields,
)
