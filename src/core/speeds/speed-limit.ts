import { CoreInputError } from '../core-input-error'

/** What may hold a spindle speed down. */
export const limitingParts = ['spindle', 'holder', 'cutter'] as const
export type LimitingPart = (typeof limitingParts)[number]

/** The highest speed of each part, where it is known. */
export type SpeedLimits = Readonly<Partial<Record<LimitingPart, number | null>>>

export interface SpeedLimit {
  part: LimitingPart
  rpm: number
}

/**
 * The part that caps the spindle speed: the least of what is known of spindle, holder and cutter [RPMX]; null where none
 * is known. Of equal ones the first of spindle, holder, cutter.
 *
 * Units      Revolutions a minute.
 * Errors     CoreInputError `not-positive` where a known limit is none.
 * Source     reach.md, section 6: capped at the least of spindle, holder and cutter [RPMX].
 *
 * @example
 * leastSpeedLimit({ spindle: 24000, holder: 18000 }) // => { part: 'holder', rpm: 18000 }
 */
export function leastSpeedLimit(limits: SpeedLimits): SpeedLimit | null {
  let least: SpeedLimit | null = null
  for (const part of limitingParts) {
    const rpm = limits[part] ?? null
    if (rpm === null) continue
    if (!(rpm > 0)) throw new CoreInputError('not-positive', part, `The ${part} must turn faster than 0.`)
    if (least === null || rpm < least.rpm) least = { part, rpm }
  }
  return least
}
