import { z } from 'zod'

/** Control characters have no place in a line; PostgreSQL cannot even keep the first of them. */
const lineCharacters = /^[^\p{Cc}]*$/u
const textCharacters = /^[^\p{Cc}]*(?:[\n\r\t][^\p{Cc}]*)*$/u
const controlMessage = 'This has a character that cannot be shown.'

const longestMm = 100_000

/** Ids are opaque outside; inside they are positive bigints. */
export const idSchema = z.string('This is no id.').regex(/^[1-9]\d{0,17}$/, 'This is no id.')

export const idParamsSchema = z.object({ id: idSchema })

export const versionSchema = z.number('Send the version you read.').int().min(1)

/** Text in one line that must be there. */
export function lineSchema(missing: string, most: number) {
  return z
    .string(missing)
    .trim()
    .min(1, missing)
    .max(most, `At most ${most} characters.`)
    .regex(lineCharacters, controlMessage)
}

/** Text in one line that may be left empty; empty and null are one. */
export function optionalLineSchema(most: number) {
  return z
    .string('This is a text.')
    .trim()
    .max(most, `At most ${most} characters.`)
    .regex(lineCharacters, controlMessage)
    .transform((text) => (text === '' ? null : text))
    .nullable()
}

export const descriptionSchema = z
  .string('This is a text.')
  .trim()
  .max(10_000, 'At most 10,000 characters.')
  .regex(textCharacters, controlMessage)

/** A length in mm that is more than nothing. */
export function lengthMmSchema(missing = 'Give a length.') {
  return z
    .number(missing)
    .positive('A length is more than 0.')
    .max(longestMm, 'Longer than 100 m: check the unit.')
}

/** A length in mm that may be 0. */
export function distanceMmSchema() {
  return z
    .number('Give a length.')
    .min(0, 'Less than 0.')
    .max(longestMm, 'Longer than 100 m: check the unit.')
}

/** A count that is at least 1. */
export function countSchema(most: number, missing = 'Give a whole number.') {
  return z
    .number(missing)
    .multipleOf(1, 'Only whole numbers.')
    .min(1, 'At least 1.')
    .max(most, `At most ${most.toLocaleString('en')}.`)
}

/** Money in minor units. */
export const minorUnitsSchema = z
  .number('Give an amount.')
  .multipleOf(1, 'Only whole minor units.')
  .min(0, 'Less than 0.')
  .max(Number.MAX_SAFE_INTEGER, 'Too large.')
