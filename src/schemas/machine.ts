import { z } from 'zod'
import { descriptionSchema, lengthMmSchema, lineSchema, versionSchema } from './fields'
import { archivedChoices } from './paging'

const rpmSchema = z
  .number('Give a speed in rpm.')
  .multipleOf(1, 'Only whole revolutions a minute.')
  .min(1, 'At least 1.')
  .max(1_000_000, 'More than 1,000,000 rpm.')

const amountSchema = (most: number) =>
  z
    .number('Give a number.')
    .gt(0, 'This must be more than nothing.')
    .max(most, `More than ${most.toLocaleString('en')}.`)

/** One speed of the spindle's curve, as its maker prints it: power, torque or both. */
export const spindlePointSchema = z
  .object({
    rpm: rpmSchema,
    powerKw: amountSchema(10_000).nullable().default(null),
    torqueNm: amountSchema(1_000_000).nullable().default(null),
  })
  .refine((point) => point.powerKw !== null || point.torqueNm !== null, {
    path: ['powerKw'],
    error: 'Give the power, the torque or both.',
  })

const spindlePointsSchema = z
  .array(spindlePointSchema, 'Give the points as a list.')
  .max(50, 'At most 50 points.')
  .superRefine((points, context) => {
    for (const [index, { rpm }] of points.entries()) {
      if (points.findIndex((point) => point.rpm === rpm) === index) continue
      const message = 'The curve has this speed already.'
      context.addIssue({ code: 'custom', path: [index, 'rpm'], message })
    }
  })

const optionalLength = lengthMmSchema().nullable().optional()

const machineFields = {
  code: lineSchema('Give the machine a code.', 100),
  name: lineSchema('Give the machine a name.', 200),
  taper: lineSchema('Name the taper of the spindle.', 100),
  gaugeLineToTableMm: lengthMmSchema('Give the height of the gauge line above the table, Z at the top.'),
  xTravelMm: optionalLength,
  yTravelMm: optionalLength,
  zTravelMm: lengthMmSchema('Give the Z travel.'),
  spindleNoseDiameterMm: optionalLength,
  longestToolMm: optionalLength,
  widestToolMm: optionalLength,
  heaviestToolKg: amountSchema(10_000).nullable().optional(),
  pocketCount: z
    .number('Give a whole number.')
    .multipleOf(1, 'Only whole numbers.')
    .min(1, 'At least 1.')
    .max(10_000, 'At most 10,000.')
    .nullable()
    .optional(),
  minimumRpm: rpmSchema.nullable().optional(),
  maximumRpm: rpmSchema,
  efficiency: z.number('Give a share.').gt(0, 'More than 0.').max(1, 'At most 1.').optional(),
  note: descriptionSchema.optional(),
  spindlePoints: spindlePointsSchema.optional(),
}

export const createMachineRequestSchema = z
  .object(machineFields)
  .superRefine(({ minimumRpm, maximumRpm }, context) => {
    for (const { path, message } of machineProblems({ minimumRpm, maximumRpm })) {
      context.addIssue({ code: 'custom', path: [path], message })
    }
  })
export type CreateMachineRequest = z.output<typeof createMachineRequestSchema>

/** Absent leaves alone, null clears; the points of the curve are given all together or not at all. */
export const updateMachineRequestSchema = z
  .object(machineFields)
  .partial()
  .extend({ version: versionSchema, archivedAt: z.null().optional() })
export type UpdateMachineRequest = z.output<typeof updateMachineRequestSchema>

/** What about a whole machine cannot be, beyond each field's own range. */
export function machineProblems(machine: {
  minimumRpm?: number | null | undefined
  maximumRpm: number
}): { path: string; message: string }[] {
  return machine.minimumRpm != null && machine.minimumRpm > machine.maximumRpm
    ? [{ path: 'minimumRpm', message: 'The slowest speed is above the fastest.' }]
    : []
}

export const machineResponseSchema = z.object({
  id: z.string(),
  version: z.number(),
  code: z.string(),
  name: z.string(),
  /** Where its stock is counted. */
  locationId: z.string(),
  taper: z.string(),
  gaugeLineToTableMm: z.number(),
  xTravelMm: z.number().nullable(),
  yTravelMm: z.number().nullable(),
  zTravelMm: z.number(),
  spindleNoseDiameterMm: z.number().nullable(),
  longestToolMm: z.number().nullable(),
  widestToolMm: z.number().nullable(),
  heaviestToolKg: z.number().nullable(),
  pocketCount: z.number().nullable(),
  minimumRpm: z.number().nullable(),
  maximumRpm: z.number(),
  efficiency: z.number(),
  note: z.string(),
  spindlePoints: z.array(
    z.object({ rpm: z.number(), powerKw: z.number().nullable(), torqueNm: z.number().nullable() }),
  ),
  archivedAt: z.iso.datetime().nullable(),
})
export type MachineResponse = z.infer<typeof machineResponseSchema>

export const machineListQuerySchema = z.strictObject({
  archived: z.enum(archivedChoices, 'Only no, only or all.').default('no'),
})

/** They are few: all of them, by code. */
export const machineListResponseSchema = z.object({ rows: z.array(machineResponseSchema) })
