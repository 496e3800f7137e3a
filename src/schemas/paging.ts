import { z } from 'zod'
import { conditions } from '@/core/stock/kinds'
import { idSchema } from './fields'

/** What every list is asked for, whatever it lists. */
export interface PageQuery {
  q?: string | undefined
  sort?: SortTerm[] | undefined
  limit: number
  offset?: number | undefined
  cursor?: string | undefined
}

/** Rows a list answers at once, at most. */
export const pageLimit = 500
const defaultLimit = 100
const deepestOffset = 10_000_000

export const archivedChoices = ['no', 'only', 'all'] as const
export const stockStates = ['inStock', 'low', 'out'] as const

/** Which way a list is sorted by one field; the id always comes last. */
export interface SortTerm {
  field: string
  isDescending: boolean
}

function wholeNumberSchema(least: number, most: number) {
  return z
    .string()
    .regex(/^\d{1,9}$/, 'Only whole numbers.')
    .transform(Number)
    .pipe(
      z
        .number()
        .min(least, `At least ${least}.`)
        .max(most, `At most ${most.toLocaleString('en')}.`),
    )
}

const decimalSchema = z
  .string()
  .regex(/^-?(\d{1,12})(\.\d{1,15})?$/, 'Only a plain decimal number.')
  .transform(Number)

/** `sort=field,-field`, each of the fields named here. */
function sortSchema(fields: readonly string[]) {
  return z
    .string()
    .max(500)
    .transform((text) =>
      text
        .split(',')
        .filter((term) => term !== '')
        .map((term): SortTerm => ({ field: term.replace(/^-/, ''), isDescending: term.startsWith('-') })),
    )
    .refine(
      (terms) => terms.every(({ field }) => fields.includes(field)),
      fields.length > 0 ? `Sorted only by ${fields.join(', ')}.` : 'This list has one order.',
    )
}

const searchedText = z.string().trim().max(200, 'At most 200 characters.')

export const pageFields = {
  q: searchedText.optional(),
  limit: wholeNumberSchema(1, pageLimit).default(defaultLimit),
  /** For grids, which jump. */
  offset: wholeNumberSchema(0, deepestOffset).optional(),
  /** For scripts, which walk: the `nextCursor` of the answer before. */
  cursor: z.string().max(5000).optional(),
}

/** One or several of a set: `form=ball,tapered`. */
export function setFilter<const Value extends string>(values: readonly Value[]) {
  return z
    .string()
    .transform((text) => text.split(','))
    .pipe(z.array(z.enum(values, `Only ${values.join(', ')}.`)))
    .optional()
}

/** Holds what is typed, capitals or not. */
export const textFilter = searchedText.optional()

/** One or several whole values, capitals or not: `series=ER16,ER20`. */
export const valuesFilter = searchedText
  .transform((text) =>
    text
      .split(',')
      .map((value) => value.trim())
      .filter((value) => value !== ''),
  )
  .optional()

type NumberFilterFields<Field extends string> = Record<
  Field | `${Field}.min` | `${Field}.max`,
  z.ZodOptional<typeof decimalSchema>
>

/** For each field three members: `field` equal to, `field.min` at least, `field.max` at most. */
export function numberFilters<const Field extends string>(
  fields: readonly Field[],
): NumberFilterFields<Field> {
  const names = fields.flatMap((field) => [field, `${field}.min`, `${field}.max`])
  return Object.fromEntries(
    names.map((name) => [name, decimalSchema.optional()]),
  ) as NumberFilterFields<Field>
}

/** What a list of any kind of item may be sorted by, beside its geometry. */
export const itemSortFields = [
  'code',
  'maker',
  'partNumber',
  'description',
  'unitCost',
  'onHand',
  'available',
] as const

export const itemListQueryFields = {
  code: textFilter,
  maker: textFilter,
  partNumber: textFilter,
  description: textFilter,
  archived: z.enum(archivedChoices, 'Only no, only or all.').default('no'),
  stockState: setFilter(stockStates),
  /** Stock is counted in this crib alone. */
  cribId: idSchema.optional(),
  /** Pieces in such a condition lie in a bin. */
  condition: setFilter(conditions),
  /** Pieces lie in a bin of this place: a crib, a cabinet, a drawer or the bin itself. */
  locationId: idSchema.optional(),
  ...numberFilters(['unitCost']),
}

/** The query of a list: a member it does not know is refused, since a filter left out would answer too much. */
export function listQuerySchema<Fields extends z.ZodRawShape>(
  fields: Fields,
  sortFields: readonly string[] = [],
) {
  return z.strictObject({ ...pageFields, sort: sortSchema(sortFields).optional(), ...fields })
}

/** `total` stands on the first block alone. */
export function listResponseSchema<Row extends z.ZodType>(row: Row) {
  return z.object({
    rows: z.array(row),
    nextCursor: z.string().nullable(),
    total: z.number().optional(),
  })
}
