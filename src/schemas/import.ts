import { z } from 'zod'
import { lengthUnits } from '@/core/units/length-unit'
import { importKinds } from './import-fields'
import {
  decimalOrigins,
  decimalSigns,
  importColumnSchema,
  importDefaultsSchema,
  importMappingSchema,
} from './import-mapping'
import { listQuerySchema, listResponseSchema } from './paging'

export const importStates = ['reading', 'checked', 'committing', 'committed', 'failed', 'cancelled'] as const
export type ImportState = (typeof importStates)[number]

const decimalsSchema = z.enum(decimalSigns, 'Only point or comma.')

export const rowOutcomes = ['added', 'changed', 'unchanged', 'rejected'] as const
export type RowOutcome = (typeof rowOutcomes)[number]

/** The fields of the upload's form beside the file. */
export const createImportRequestSchema = z.object({
  kind: z.enum(importKinds, `Say what the file holds: ${importKinds.join(', ')}.`),
  unit: z.enum(lengthUnits, 'Only mm or in.').optional(),
  /** Absent: as the file's numbers tell, else as the shop writes them. */
  decimals: decimalsSchema.optional(),
  mapping: importMappingSchema.default({}),
  defaults: importDefaultsSchema.default({}),
})
export type CreateImportRequest = z.output<typeof createImportRequestSchema>

/** Reads the file again, by these columns. What is absent stays as it was. */
export const recheckImportRequestSchema = z.object({
  unit: z.enum(lengthUnits, 'Only mm or in.').optional(),
  decimals: decimalsSchema.optional(),
  mapping: importMappingSchema.optional(),
  defaults: importDefaultsSchema.optional(),
})
export type RecheckImportRequest = z.output<typeof recheckImportRequestSchema>

export const rejectChoices = ['stop', 'skip'] as const
export const commitImportRequestSchema = z.object({
  /** Whether a row that cannot be taken stops the import or is left out. */
  rejects: z.enum(rejectChoices, 'Only stop or skip.').default('stop'),
})
export type RejectChoice = (typeof rejectChoices)[number]

export const importAcceptedResponseSchema = z.object({ id: z.string() })

/** What is wrong with a cell: the line of the file, its column's heading, what it holds, and why it is not taken. */
export const rowProblemSchema = z.object({
  line: z.number(),
  column: z.string(),
  value: z.string(),
  message: z.string(),
})
export type RowProblem = z.infer<typeof rowProblemSchema>

export const importResponseSchema = z.object({
  id: z.string(),
  kind: z.enum(importKinds),
  state: z.enum(importStates),
  fileName: z.string(),
  fileSizeBytes: z.number(),
  /** Of bare numbers, where neither cell, column nor row says. */
  unit: z.enum(lengthUnits),
  /** Null until the file has been looked at, unless they were set. */
  decimals: z.enum(decimalSigns).nullable(),
  decimalsOrigin: z.enum(decimalOrigins).nullable(),
  encoding: z.string().nullable(),
  delimiter: z.string().nullable(),
  columns: z.array(importColumnSchema),
  defaults: importDefaultsSchema,
  rowsRead: z.number(),
  /** Null until the file has been counted. */
  rows: z.number().nullable(),
  /** Items, or bins for opening stock: several rows may make one. */
  added: z.number(),
  changed: z.number(),
  unchanged: z.number(),
  rejectedCount: z.number(),
  /** One for each of the first rejected; `further` is what else is wrong there. */
  rejected: z.array(rowProblemSchema.extend({ further: z.array(rowProblemSchema) })),
  warningCount: z.number(),
  warnings: z.array(rowProblemSchema),
  /** Why it failed, or why a commit was turned back. */
  message: z.string().nullable(),
  createdByName: z.string(),
  createdAt: z.iso.datetime(),
  checkedAt: z.iso.datetime().nullable(),
  endedAt: z.iso.datetime().nullable(),
})
export type ImportResponse = z.infer<typeof importResponseSchema>

export const importListRowSchema = importResponseSchema.omit({
  columns: true,
  defaults: true,
  rejected: true,
  warnings: true,
})
export type ImportListRow = z.infer<typeof importListRowSchema>
export const importListResponseSchema = listResponseSchema(importListRowSchema)
export const importListQuerySchema = listQuerySchema({}, [])

/** A value before and after; lengths in mm, angles in degrees, money in minor units, an outline as its segments. */
export const fieldChangeSchema = z.object({
  field: z.string(),
  before: z.unknown(),
  after: z.unknown(),
})
export type FieldChange = z.infer<typeof fieldChangeSchema>

export const importRowSchema = z.object({
  line: z.number(),
  outcome: z.enum(rowOutcomes),
  itemId: z.string().nullable(),
  code: z.string().nullable(),
  description: z.string().nullable(),
  /** Of a new item, as they were read: mm, the form by its name. */
  sizes: z.array(z.object({ field: z.string(), value: z.union([z.string(), z.number()]) })),
  changes: z.array(fieldChangeSchema),
  problems: z.array(rowProblemSchema),
})
export type ImportRowResponse = z.infer<typeof importRowSchema>
export const importRowListResponseSchema = listResponseSchema(importRowSchema)
export const importRowListQuerySchema = listQuerySchema(
  { outcome: z.enum(rowOutcomes, `Only ${rowOutcomes.join(', ')}.`).optional() },
  [],
)

/** One row of opening stock: how many pieces of an item lie in a bin, in one condition. */
export const openingStockSchema = z.object({
  quantity: z
    .number('Give the quantity.')
    .min(0, 'Less than 0.')
    .max(1_000_000, 'More than a million pieces: check the number.'),
})
