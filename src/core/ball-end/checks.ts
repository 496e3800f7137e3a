import { CoreInputError } from '../core-input-error'

/** A length, or an overlap of two, below this is none. */
export const shortestMm = 1e-9
/** Above this the unit was mistaken. */
const longestMm = 100_000
const largestAmount = 1e9

/** A length that is there: finite, more than 0, no longer than 100 m. */
export function requireLength(valueMm: number, path: string, name: string): void {
  requireFinite(valueMm, path, name)
  if (valueMm < shortestMm) throw new CoreInputError('not-positive', path, `${name} must be more than 0.`)
  if (valueMm > longestMm) throw new CoreInputError('too-large', path, `${name} is more than 100 m.`)
}

/** A spindle or cutting speed: finite, more than 0, at most 1e9. */
export function requireAmount(value: number, path: string, name: string): void {
  requireFinite(value, path, name)
  if (value < shortestMm) throw new CoreInputError('not-positive', path, `${name} must be more than 0.`)
  if (value > largestAmount) throw new CoreInputError('too-large', path, `${name} is too large.`)
}

export function requireBetween(value: number, low: number, high: number, path: string, name: string): void {
  requireFinite(value, path, name)
  if (value < low || value > high) {
    throw new CoreInputError('out-of-range', path, `${name} must be from ${low} to ${high}.`)
  }
}

export function requireNotNegative(value: number, path: string, name: string): void {
  requireFinite(value, path, name)
  if (value < 0) throw new CoreInputError('out-of-range', path, `${name} can't be below 0.`)
}

function requireFinite(value: number, path: string, name: string): void {
  if (!Number.isFinite(value)) throw new CoreInputError('not-finite', path, `${name} must be a number.`)
}
