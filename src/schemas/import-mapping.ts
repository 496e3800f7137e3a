import { z } from 'zod'
import { lengthUnits } from '@/core/units/length-unit'

const fieldNameSchema = z.string().max(100)

/** A column's field, with the unit of its bare numbers where that is not the file's; null leaves the column out. */
const columnTargetSchema = z.union([
  fieldNameSchema,
  z.null(),
  z.object({ field: fieldNameSchema.nullable(), unit: z.enum(lengthUnits).nullable().optional() }),
])

/** What stands before the decimals of a file's numbers. */
export const decimalSigns = ['point', 'comma'] as const
export type DecimalSign = (typeof decimalSigns)[number]

/** How a file came to its decimal sign: the person set it, its numbers leave no doubt, the shop writes it so. */
export const decimalOrigins = ['set', 'guessed', 'shop'] as const
export type DecimalOrigin = (typeof decimalOrigins)[number]

/** Field to what is written for it in all rows that give nothing. */
export const importDefaultsSchema = z.record(
  z.string(),
  z.string('Write it as a text.').max(200, 'More than 200 characters.'),
  'Send an object: field to value.',
)
export type ImportDefaults = z.output<typeof importDefaultsSchema>

/** Column to field, as the person sets it. */
export const importMappingSchema = z.record(
  z.string(),
  columnTargetSchema,
  'Send an object: column to field.',
)
export type ImportMapping = z.output<typeof importMappingSchema>

export interface ColumnTarget {
  field: string | null
  unit: (typeof lengthUnits)[number] | null
}

/** The one form of the three a mapping's value may have; an empty name leaves the column out as null does. */
export function columnTarget(value: ImportMapping[string]): ColumnTarget {
  if (value === null || typeof value === 'string') return { field: value || null, unit: null }
  return { field: value.field || null, unit: value.unit ?? null }
}

/** How a column came to its field: the person set it, the shop kept it from last time, its heading is known. */
export const columnOrigins = ['set', 'kept', 'known'] as const

export const importColumnSchema = z.object({
  heading: z.string(),
  /** Up to three cells that are not blank. */
  samples: z.array(z.string()),
  field: z.string().nullable(),
  /** Of bare numbers in this column; null: the file's. */
  unit: z.enum(lengthUnits).nullable(),
  origin: z.enum(columnOrigins).nullable(),
  /** Why a heading that looks known was not taken. */
  note: z.string().nullable(),
})
export type ImportColumn = z.infer<typeof importColumnSchema>
