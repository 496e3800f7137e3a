import { spindleRpmForSpeed } from '../ball-end/cutting-speed'
import { CoreInputError } from '../core-input-error'

export interface SpeedRange {
  lowMPerMin: number
  highMPerMin: number
}

export interface SpindleRange {
  lowRpm: number
  highRpm: number
  /** None, the upper end, or all of the range is above what spindle, holder and cutter allow. */
  limited: 'no' | 'high' | 'all'
}

/**
 * The spindle speeds at which a diameter runs within a range of cutting speed, held to the limit given.
 *
 * Shapes     `limitRpm`: the least of what is known of spindle, holder and cutter; absent where nothing is.
 * Units      Millimetres and m/min in, revolutions a minute out.
 * Result     lowRpm <= highRpm; both the limit where even the low end is above it.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`, `out-of-range` where low is above high.
 * Source     n = 1000·vc/(π·D), as spindleRpmForSpeed.
 * Tolerance  As spindleRpmForSpeed.
 *
 * @example
 * spindleRange(10, { lowMPerMin: 31.41592653589793, highMPerMin: 62.83185307179586 }, 1500) // => { lowRpm: 1000, highRpm: 1500, limited: 'high' }
 */
export function spindleRange(
  diameterMm: number,
  range: SpeedRange,
  limitRpm = Number.POSITIVE_INFINITY,
): SpindleRange {
  if (range.lowMPerMin > range.highMPerMin) {
    throw new CoreInputError('out-of-range', 'lowMPerMin', 'The lower speed is above the higher.')
  }
  const lowRpm = spindleRpmForSpeed(diameterMm, range.lowMPerMin)
  const highRpm = spindleRpmForSpeed(diameterMm, range.highMPerMin)
  if (highRpm <= limitRpm) return { lowRpm, highRpm, limited: 'no' }
  return {
    lowRpm: Math.min(lowRpm, limitRpm),
    highRpm: limitRpm,
    limited: lowRpm > limitRpm ? 'all' : 'high',
  }
}
