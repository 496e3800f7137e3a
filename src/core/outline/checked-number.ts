import { CoreInputError } from '@/core/core-input-error'

type Given = number | null | undefined

/**
 * A number that has to be there, finite and above zero.
 *
 * Units      Whatever the caller's are; the number is passed through.
 * Result     The number itself.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive` at `path`.
 *
 * @example
 * positive(3.175, 'cutter.cuttingDiameterMm', 'The cutting diameter') // => 3.175
 */
export function positive(value: Given, path: string, name: string): number {
  const given = finite(value, path, name)
  if (given <= 0) throw new CoreInputError('not-positive', path, `${name} must be more than zero.`)
  return given
}

/**
 * A number that has to be there, finite and not below zero.
 *
 * Units      Whatever the caller's are.
 * Result     The number itself.
 * Errors     CoreInputError `not-given`, `not-finite`, `negative` at `path`.
 *
 * @example
 * notNegative(0, 'feature.draftDeg', 'The draft') // => 0
 */
export function notNegative(value: Given, path: string, name: string): number {
  const given = finite(value, path, name)
  if (given < 0) throw new CoreInputError('negative', path, `${name} can't be below zero.`)
  return given
}

/**
 * As `positive` where a number was given, else null.
 *
 * Units      Whatever the caller's are.
 * Result     The number, or null where it was null or absent.
 * Errors     CoreInputError `not-finite`, `not-positive` at `path`.
 *
 * @example
 * positiveOrNull(undefined, 'cutter.neckDiameterMm', 'The neck diameter') // => null
 */
export function positiveOrNull(value: Given, path: string, name: string): number | null {
  return value == null ? null : positive(value, path, name)
}

/**
 * As `notNegative` where a number was given, else the fallback.
 *
 * Units      Whatever the caller's are.
 * Result     The number, or the fallback where it was null or absent.
 * Errors     CoreInputError `not-finite`, `negative` at `path`.
 *
 * @example
 * notNegativeOr(null, 0, 'feature.throughMm', 'The allowance') // => 0
 */
export function notNegativeOr<Fallback>(
  value: Given,
  fallback: Fallback,
  path: string,
  name: string,
): number | Fallback {
  return value == null ? fallback : notNegative(value, path, name)
}

/**
 * A finite number where one was given, of either sign, else the fallback.
 *
 * Units      Whatever the caller's are.
 * Result     The number, or the fallback where it was null or absent.
 * Errors     CoreInputError `not-finite` at `path`.
 *
 * @example
 * finiteOr(-2, 0, 'rotaryStock.offsetXMm', 'The offset') // => -2
 */
export function finiteOr(value: Given, fallback: number, path: string, name: string): number {
  return value == null ? fallback : finite(value, path, name)
}

function finite(value: Given, path: string, name: string): number {
  if (value == null) throw new CoreInputError('not-given', path, `${name} is needed.`)
  if (!Number.isFinite(value)) throw new CoreInputError('not-finite', path, `${name} must be a number.`)
  return value
}

/**
 * Tangent of an angle in degrees, exact at 0 and infinite at 90.
 *
 * Units      Degrees.
 * Result     0 at 0, Infinity at 90 and beyond.
 *
 * @example
 * tangent(90) // => Infinity
 */
export function tangent(angleDeg: number): number {
  return angleDeg >= 90 ? Number.POSITIVE_INFINITY : Math.tan(radians(angleDeg))
}

/**
 * An angle in radians.
 *
 * Units      Degrees in, radians out.
 *
 * @example
 * radians(180) // => 3.141592653589793
 */
export function radians(angleDeg: number): number {
  return (angleDeg * Math.PI) / 180
}
