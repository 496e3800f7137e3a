/** Enums are snake_case in the database and camelCase everywhere else; this is the one place that turns them. */

/** `in_transit` becomes `inTransit`. */
export function enumFromDb(value: string): string {
  return value.replace(/_([a-z])/g, (_, letter: string) => letter.toUpperCase())
}

/** `inTransit` becomes `in_transit`. */
export function enumToDb(value: string): string {
  return value.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)
}
