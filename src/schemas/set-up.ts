import { z } from 'zod'
import {
  descriptionSchema,
  distanceMmSchema,
  idSchema,
  lengthMmSchema,
  lineSchema,
  versionSchema,
} from './fields'
import { machineWindowResponseSchema } from './machine-window'

const offsetSchema = z
  .number('Give a length.')
  .min(-100_000, 'Longer than 100 m: check the unit.')
  .max(100_000, 'Longer than 100 m: check the unit.')

/** A part turned in a rotary axis, and what is to come of it. */
const rotaryStockSchema = z.strictObject({
  widthMm: lengthMmSchema('Give the width of the stock.'),
  heightMm: lengthMmSchema('Give the height of the stock.'),
  offsetXMm: offsetSchema.nullable().default(null),
  offsetYMm: offsetSchema.nullable().default(null),
  axisHeightMm: lengthMmSchema('Give the height of the axis above the table.'),
  chuckRadiusMm: distanceMmSchema().nullable().default(null),
  partDiameterMm: lengthMmSchema().nullable().default(null),
  centringErrorMm: distanceMmSchema().nullable().default(null),
})

const setUpFixtureSchema = z.strictObject({
  itemId: idSchema,
  /** Height above the table of what it stands on. */
  baseMm: distanceMmSchema().default(0),
})

const setUpFields = {
  name: lineSchema('Give the set-up a name.', 200),
  highestMm: distanceMmSchema(),
  lowestTipMm: distanceMmSchema(),
  retractClearanceMm: distanceMmSchema(),
  rotaryStock: rotaryStockSchema.nullable(),
  fixtures: z.array(setUpFixtureSchema, 'Give the fixtures as a list.').max(100, 'At most 100 fixtures.'),
  note: descriptionSchema,
}

export const createSetUpRequestSchema = z.strictObject({
  machineId: idSchema,
  ...setUpFields,
  rotaryStock: setUpFields.rotaryStock.default(null),
  fixtures: setUpFields.fixtures.default([]),
  note: setUpFields.note.default(''),
})
export type CreateSetUpRequest = z.output<typeof createSetUpRequestSchema>

/** Absent leaves alone; rotary stock and fixtures are given all together or not at all. */
export const updateSetUpRequestSchema = z.object(setUpFields).partial().extend({ version: versionSchema })
export type UpdateSetUpRequest = z.output<typeof updateSetUpRequestSchema>

export const setUpResponseSchema = z.object({
  id: z.string(),
  version: z.number(),
  machineId: z.string(),
  machineCode: z.string(),
  machineName: z.string(),
  name: z.string(),
  highestMm: z.number(),
  lowestTipMm: z.number(),
  retractClearanceMm: z.number(),
  rotaryStock: z
    .object({
      widthMm: z.number(),
      heightMm: z.number(),
      offsetXMm: z.number().nullable(),
      offsetYMm: z.number().nullable(),
      axisHeightMm: z.number(),
      chuckRadiusMm: z.number().nullable(),
      partDiameterMm: z.number().nullable(),
      centringErrorMm: z.number().nullable(),
    })
    .nullable(),
  fixtures: z.array(
    z.object({
      itemId: z.string(),
      code: z.string(),
      description: z.string(),
      heightMm: z.number(),
      baseMm: z.number(),
    }),
  ),
  note: z.string(),
  /** Null where the machine or a fixture was changed since so that there is none; `windowProblem` says why. */
  window: machineWindowResponseSchema.nullable(),
  windowProblem: z.string().nullable(),
  /** What is left on the thinnest side; null where no part diameter or no centring error is given. */
  centringMarginMm: z.number().nullable(),
})
export type SetUpResponse = z.infer<typeof setUpResponseSchema>

export const setUpListQuerySchema = z.strictObject({ machineId: idSchema.optional() })

/** They are few: all of them, by machine and name. */
export const setUpListResponseSchema = z.object({ rows: z.array(setUpResponseSchema) })

/** What is to be put into the spindle: everything from the gauge line to the tip. */
export const setUpAssemblyRequestSchema = z.strictObject({
  holderId: idSchema,
  extensionId: idSchema.nullish(),
  stickOutMm: lengthMmSchema('Give the stick-out.'),
})
export type SetUpAssemblyRequest = z.output<typeof setUpAssemblyRequestSchema>

export const setUpAssemblyResponseSchema = z.object({
  gaugeLengthMm: z.number(),
  window: machineWindowResponseSchema,
  verdict: z.enum(['fits', 'tooLong', 'tooShort']),
  byMm: z.number(),
  /** Null where the holder's taper is not known. */
  isTaperRight: z.boolean().nullable(),
  /**
   * Where it is outside: holders of the same bore and the machine's taper that are inside at the same stick-out, the
   * stubbiest first. Whether the tool reaches in them is asked elsewhere.
   */
  fittingHolders: z.array(
    z.object({
      id: z.string(),
      code: z.string(),
      description: z.string(),
      holderGaugeLengthMm: z.number(),
      gaugeLengthMm: z.number(),
      onHand: z.number(),
    }),
  ),
})
export type SetUpAssemblyResponse = z.infer<typeof setUpAssemblyResponseSchema>
