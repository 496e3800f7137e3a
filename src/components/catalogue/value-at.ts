import type { FieldValues } from 'react-hook-form'

/**
 * Values by the path of their field, `bore.diameterMm` or `segments.0.lengthMm`. The library of the form has the same,
 * but a list that is only read would carry all of it for these two.
 */

/** Undefined where nothing stands there. */
export function valueAt(values: object, path: string): unknown {
  let value: unknown = values
  for (const name of path.split('.')) {
    if (!isHolder(value)) return undefined
    value = value[name]
  }
  return value
}

/** Makes what stands between where it is not there yet. */
export function putAt(values: FieldValues, path: string, value: unknown): void {
  const names = path.split('.')
  const last = names.pop() ?? ''
  let holder: Record<string, unknown> = values
  for (const name of names) {
    const inner = holder[name]
    const next = isHolder(inner) ? inner : {}
    holder[name] = next
    holder = next
  }
  holder[last] = value
}

function isHolder(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null
}
