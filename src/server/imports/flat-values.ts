/** An item by the columns of its tables, as it is staged; `segments` is its outline. */
export type FlatRecord = Record<string, FlatValue>
export type FlatValue = string | number | boolean | null | FlatSegment[]

/** The text of a value, null where it is none. */
export function textOf(value: unknown): string | null {
  return typeof value === 'string' ? value : null
}

/** A piece of the outline as it is staged; an extension's has no part. */
export interface FlatSegment {
  part?: 'nut' | 'holder'
  length_mm: number
  nose_diameter_mm: number
  spindle_diameter_mm: number
}
