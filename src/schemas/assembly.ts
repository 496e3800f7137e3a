import { z } from 'zod'
import {
  type AssemblyTools,
  assemblyPartKinds,
  assemblyStates,
  type FindingDetail,
} from '@/core/assemblies/types'
import type { Clearances, Feature, ReachAnswer } from '@/core/reach/types'
import { conditions, shopLocationKinds } from '@/core/stock/kinds'
import { lengthUnits } from '@/core/units/length-unit'
import {
  descriptionSchema,
  idSchema,
  lengthMmSchema,
  lineSchema,
  optionalLineSchema,
  versionSchema,
} from './fields'
import { archivedChoices, listQuerySchema, listResponseSchema, setFilter } from './paging'
import { reachRequestSchema } from './reach'

/** A number as controls and magazines count. */
const controlNumberSchema = z
  .number('Give a whole number.')
  .multipleOf(1, 'Only whole numbers.')
  .min(1, 'At least 1.')
  .max(99_999_999, 'At most 99,999,999.')

const nameSchema = optionalLineSchema(200).transform((name) => name ?? '')
const itemSchema = z.strictObject({ id: idSchema })

const offsetFields = {
  toolNumber: controlNumberSchema.nullish(),
  lengthOffsetNumber: controlNumberSchema.nullish(),
  diameterOffsetNumber: controlNumberSchema.nullish(),
}

/** A reach request whose tools are all of the crib: only what can be fetched can be put together. */
export const createAssemblyRequestSchema = z.strictObject({
  name: nameSchema.optional(),
  note: descriptionSchema.optional(),
  feature: reachRequestSchema.shape.feature,
  cutter: z.union([itemSchema, z.strictObject({ pieceId: idSchema })], 'Name a cutter of the crib.'),
  holder: itemSchema,
  collet: itemSchema.nullish(),
  extension: itemSchema.nullish(),
  /** Holds the extension's own shank, where the holder takes collets. */
  extensionCollet: itemSchema.nullish(),
  stickOutMm: lengthMmSchema().nullish(),
  clearances: reachRequestSchema.shape.clearances,
  ...offsetFields,
})
export type CreateAssemblyRequest = z.output<typeof createAssemblyRequestSchema>

/** Absent leaves alone, null clears. */
export const updateAssemblyRequestSchema = z.strictObject({
  version: versionSchema,
  name: nameSchema.optional(),
  note: descriptionSchema.optional(),
  stickOutMm: lengthMmSchema().optional(),
  ...offsetFields,
})
export type UpdateAssemblyRequest = z.output<typeof updateAssemblyRequestSchema>

const partKindSchema = z.enum(assemblyPartKinds, `Only ${assemblyPartKinds.join(', ')}.`)
const conditionSchema = z.enum(conditions, `Only ${conditions.join(', ')}.`)

export const buildAssemblyRequestSchema = z.strictObject({
  version: versionSchema,
  /** Where each part is taken from. */
  parts: z
    .array(
      z.strictObject({
        kind: partKindSchema,
        fromLocationId: idSchema,
        condition: conditionSchema.default('new'),
        pieceId: idSchema.nullish(),
      }),
    )
    .max(assemblyPartKinds.length),
  /** Straight to a machine, and into a pocket of it; else into the hands of whoever builds it. */
  machineId: idSchema.nullish(),
  pocket: controlNumberSchema.nullish(),
})
export type BuildAssemblyRequest = z.output<typeof buildAssemblyRequestSchema>

/** Without a machine it comes back into the hands of whoever takes it out. */
export const pocketAssemblyRequestSchema = z.strictObject({
  version: versionSchema,
  machineId: idSchema.nullable(),
  pocket: controlNumberSchema.nullish(),
  toolNumber: controlNumberSchema.nullish(),
  lengthOffsetNumber: controlNumberSchema.nullish(),
  diameterOffsetNumber: controlNumberSchema.nullish(),
})
export type PocketAssemblyRequest = z.output<typeof pocketAssemblyRequestSchema>

export const measureAssemblyRequestSchema = z.strictObject({
  version: versionSchema,
  gaugeLengthMm: lengthMmSchema('Give the gauge length.'),
  diameterMm: lengthMmSchema().nullish(),
})
export type MeasureAssemblyRequest = z.output<typeof measureAssemblyRequestSchema>

/** What becomes of a part: back to a bin, to scrap, or it went before and the books know. */
export const partOutcomes = ['return', 'scrap', 'gone'] as const

export const breakDownAssemblyRequestSchema = z.strictObject({
  version: versionSchema,
  parts: z
    .array(
      z.strictObject({
        kind: partKindSchema,
        outcome: z.enum(partOutcomes, `Only ${partOutcomes.join(', ')}.`),
        toLocationId: idSchema.nullish(),
        condition: conditionSchema.nullish(),
      }),
    )
    .max(assemblyPartKinds.length),
})
export type BreakDownAssemblyRequest = z.output<typeof breakDownAssemblyRequestSchema>

/** Another feature the assembly is good for, as it is set. */
export const addAssemblyCheckRequestSchema = z.strictObject({
  version: versionSchema,
  feature: reachRequestSchema.shape.feature,
  clearances: reachRequestSchema.shape.clearances,
})
export type AddAssemblyCheckRequest = z.output<typeof addAssemblyCheckRequestSchema>

export const versionOnlyRequestSchema = z.strictObject({ version: versionSchema })

const booleanFilter = z.enum(['true', 'false'], 'Only true or false.').transform((text) => text === 'true')

export const assemblyListQuerySchema = listQuerySchema(
  {
    state: setFilter(assemblyStates),
    marked: booleanFilter.optional(),
    /** It is at this machine. */
    machineId: idSchema.optional(),
    /** It is at a machine, whichever. */
    inMachine: booleanFilter.optional(),
    /** It has this part. */
    itemId: idSchema.optional(),
    number: z
      .string()
      .regex(/^\d{1,9}$/, 'Only whole numbers.')
      .transform(Number)
      .optional(),
    archived: z.enum(archivedChoices, 'Only no, only or all.').default('no'),
  },
  ['number', 'name', 'toolNumber', 'state', 'cutter', 'gaugeLength', 'machine', 'pocket'],
)
export type AssemblyListQuery = z.output<typeof assemblyListQuerySchema>

const placeSchema = z.object({
  locationId: z.string(),
  kind: z.enum(shopLocationKinds),
  code: z.string(),
  name: z.string(),
  cribCode: z.string().nullable(),
})
export type AssemblyPlace = z.infer<typeof placeSchema>

const measurementSchema = z.object({
  id: z.string(),
  gaugeLengthMm: z.number(),
  diameterMm: z.number().nullable(),
  /** What was calculated when it was measured. */
  expectedGaugeLengthMm: z.number(),
  expectedDiameterMm: z.number(),
  source: z.enum(['byHand', 'presetter']),
  actorName: z.string(),
  measuredAt: z.iso.datetime(),
  /** Of the assembly as it is built now. */
  isCurrent: z.boolean(),
})
export type AssemblyMeasurement = z.infer<typeof measurementSchema>

export const assemblyRowSchema = z.object({
  id: z.string(),
  version: z.number(),
  number: z.number(),
  name: z.string(),
  state: z.enum(assemblyStates),
  stickOutMm: z.number(),
  gaugeLengthMm: z.number(),
  toolNumber: z.number().nullable(),
  lengthOffsetNumber: z.number().nullable(),
  diameterOffsetNumber: z.number().nullable(),
  archivedAt: z.iso.datetime().nullable(),
  /** In the order a person puts them together. */
  parts: z.array(z.object({ kind: partKindSchema, itemId: z.string(), code: z.string() })),
  /** Where it is while it is built. */
  place: placeSchema.nullable(),
  machine: z.object({ id: z.string(), code: z.string(), name: z.string() }).nullable(),
  pocket: z.number().nullable(),
  /** Something of it no longer holds. */
  isMarked: z.boolean(),
  /** Something of it changed and the worker has not looked yet. */
  isBeingRechecked: z.boolean(),
  /** The last measurement of it as it is built now. */
  measurement: measurementSchema.nullable(),
})
export type AssemblyRow = z.infer<typeof assemblyRowSchema>
export const assemblyListResponseSchema = listResponseSchema(assemblyRowSchema)

const balanceSchema = z.object({ place: placeSchema, condition: conditionSchema, quantity: z.number() })
const pieceSchema = z.object({
  id: z.string(),
  tag: z.string(),
  locationId: z.string().nullable(),
  condition: conditionSchema.nullable(),
})

const partSchema = z.object({
  kind: partKindSchema,
  itemId: z.string(),
  code: z.string(),
  description: z.string(),
  isTrackedByPiece: z.boolean(),
  isArchived: z.boolean(),
  pieceId: z.string().nullable(),
  pieceTag: z.string().nullable(),
  /** Where it is, and in what condition, while the assembly is built. */
  place: placeSchema.nullable(),
  home: placeSchema.nullable(),
  condition: conditionSchema.nullable(),
  /** Bins it lies in, the fullest first. */
  bins: z.array(balanceSchema),
  /** Tagged pieces in bins, where it is tracked so. */
  pieces: z.array(pieceSchema),
})
export type AssemblyPart = z.infer<typeof partSchema>

const checkSchema = z.object({
  id: z.string(),
  feature: z.custom<Feature>(),
  clearances: z.custom<Partial<Clearances>>().nullable(),
  holds: z.boolean(),
  /** With messages as codes and figures: the reader's own unit says them. */
  keptAnswer: z.custom<ReachAnswer>(),
  answer: z.custom<ReachAnswer>().nullable(),
  checkedAt: z.iso.datetime(),
})
export type AssemblyCheck = z.infer<typeof checkSchema>

const findingSchema = z.object({
  id: z.string(),
  key: z.string(),
  isFault: z.boolean(),
  checkId: z.string().nullable(),
  detail: z.custom<FindingDetail>(),
  foundAt: z.iso.datetime(),
  /** The movement that took a part, where that is what happened. */
  movement: z
    .object({
      kind: z.string(),
      quantity: z.number(),
      actorName: z.string(),
      occurredAt: z.iso.datetime(),
      toName: z.string(),
    })
    .nullable(),
})
export type AssemblyFinding = z.infer<typeof findingSchema>

export const assemblyResponseSchema = assemblyRowSchema.extend({
  note: z.string(),
  builtAt: z.iso.datetime().nullable(),
  brokenDownAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  createdByName: z.string(),
  parts: z.array(partSchema),
  /** Of the nut that holds the cutter, where the maker's figure is known. */
  nutTorqueNm: z.number().nullable(),
  /** The sizes everything about it goes by. */
  tools: z.custom<AssemblyTools>(),
  checks: z.array(checkSchema),
  findings: z.array(findingSchema),
  /** The newest first. */
  measurements: z.array(measurementSchema),
})
export type AssemblyResponse = z.infer<typeof assemblyResponseSchema>

/** A presetter's file: small, so it comes as text; `commit` takes it over, otherwise it is only read. */
export const importMeasurementsRequestSchema = z.strictObject({
  text: lineFreeText(500_000),
  unit: z.enum(lengthUnits, `Only ${lengthUnits.join(' or ')}.`),
  /** Which heading holds what, where the file's own headings do not say. */
  columns: z
    .strictObject({
      number: lineSchema('Name a column.', 500).optional(),
      gaugeLength: lineSchema('Name a column.', 500).optional(),
      diameter: lineSchema('Name a column.', 500).nullish(),
    })
    .optional(),
  commit: z.boolean().default(false),
})
export type ImportMeasurementsRequest = z.output<typeof importMeasurementsRequestSchema>

function lineFreeText(most: number) {
  return z.string('Send the file as text.').min(1, 'The file is empty.').max(most, 'The file is too large.')
}

export const importMeasurementsResponseSchema = z.object({
  headings: z.array(z.string()),
  columns: z.object({
    number: z.string().nullable(),
    gaugeLength: z.string().nullable(),
    diameter: z.string().nullable(),
  }),
  rows: z.array(
    z.object({
      line: z.number(),
      number: z.number(),
      assemblyId: z.string(),
      gaugeLengthMm: z.number(),
      diameterMm: z.number().nullable(),
      expectedGaugeLengthMm: z.number(),
      expectedDiameterMm: z.number(),
    }),
  ),
  rejected: z.array(
    z.object({ line: z.number(), column: z.string().nullable(), value: z.string(), message: z.string() }),
  ),
  isCommitted: z.boolean(),
})
export type ImportMeasurementsResponse = z.infer<typeof importMeasurementsResponseSchema>
