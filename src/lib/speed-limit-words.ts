import { leastSpeedLimit, limitingParts, type SpeedLimit, type SpeedLimits } from '@/core/speeds/speed-limit'
import { formatRpm } from './format-speed'

/** `the holder’s limit`. */
export function limitName({ part }: SpeedLimit): string {
  return `the ${part}’s limit`
}

/**
 * What caps the speed and what nothing is known of, as a sentence or two.
 *
 * @example
 * speedLimitSentence({ spindle: 24000, holder: 18000, cutter: null }) // => 'Capped by the holder, at 18\u00a0000 rpm. No highest speed is known of the cutter.'
 */
export function speedLimitSentence(limits: SpeedLimits): string {
  const least = leastSpeedLimit(limits)
  const unknown = limitingParts.filter((part) => (limits[part] ?? null) === null)
  if (least === null) return 'No highest speed is known of spindle, holder or cutter, so nothing is capped.'
  const capped = `Capped by the ${least.part}, at ${formatRpm(least.rpm)}.`
  return unknown.length === 0
    ? capped
    : `${capped} No highest speed is known of the ${unknown.join(' or the ')}.`
}
