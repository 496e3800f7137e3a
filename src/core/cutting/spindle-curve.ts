import { CoreInputError } from '@/core/core-input-error'
import { positive, positiveOrNull } from '@/core/outline/checked-number'
import { torqueFactor } from './milling-force'

/** One speed of a spindle's printed curve; of power and torque at least one is given. */
export interface SpindlePoint {
  rpm: number
  powerKw?: number | null
  torqueNm?: number | null
}

export interface SpindleOutput {
  powerKw: number
  torqueNm: number
}

interface FullPoint extends SpindleOutput {
  rpm: number
}

/**
 * What a spindle gives at a speed, from the points of its curve.
 *
 * Between points power and torque both run straight, and each is held to what the other allows, so that a falling
 * torque is never read too high. Below the first point torque stays as it is there; above the last there is nothing.
 *
 * Shapes     One or more points, in any order, each with power, torque or both.
 * Units      Revolutions a minute, kilowatts, newton metres.
 * Result     0 or more; null above the last point, where the curve says nothing.
 * Errors     CoreInputError `curve-empty`, `point-without-output`, `point-twice` at `points`; `not-finite`,
 *            `not-positive`.
 * Source     P = M·n/9549.3; test/reference/cutting/cutting-force.md, section 4.
 * Tolerance  1e-9 of the value.
 *
 * @example
 * spindleOutputAt([{ rpm: 1500, torqueNm: 70 }, { rpm: 8000, powerKw: 11 }], 750)?.torqueNm // => 70
 * spindleOutputAt([{ rpm: 1500, torqueNm: 70 }], 1501) // => null
 */
export function spindleOutputAt(points: readonly SpindlePoint[], spindleRpm: number): SpindleOutput | null {
  const rpm = positive(spindleRpm, 'spindleRpm', 'The spindle speed')
  const curve = fullCurve(points)
  const after = curve.findIndex((point) => point.rpm >= rpm)
  const next = curve[after]
  if (!next) return null
  const before = curve[after - 1]
  if (!before) return { torqueNm: next.torqueNm, powerKw: (next.torqueNm * rpm) / torqueFactor }
  const share = (rpm - before.rpm) / (next.rpm - before.rpm)
  const powerKw = before.powerKw + share * (next.powerKw - before.powerKw)
  const torqueNm = before.torqueNm + share * (next.torqueNm - before.torqueNm)
  return {
    powerKw: Math.min(powerKw, (torqueNm * rpm) / torqueFactor),
    torqueNm: Math.min(torqueNm, (powerKw * torqueFactor) / rpm),
  }
}

export interface SpindleDrive extends SpindleOutput {
  /** Power and torque asked of it, over what it gives; above 1 it stalls. */
  powerShare: number
  torqueShare: number
  drives: boolean
}

/**
 * Whether a spindle drives a cut at a speed: motor power and torque asked for against what its curve gives there.
 *
 * Units      Kilowatts, newton metres, revolutions a minute.
 * Result     Null above the curve's last point.
 * Errors     As spindleOutputAt.
 * Source     Comparison; the curve is the maker's, continuous rating unless the shop entered another.
 *
 * @example
 * spindleDrive([{ rpm: 10000, powerKw: 5 }], 10000, { powerKw: 6, torqueNm: 1 })?.drives // => false
 */
export function spindleDrive(
  points: readonly SpindlePoint[],
  spindleRpm: number,
  asked: SpindleOutput,
): SpindleDrive | null {
  const output = spindleOutputAt(points, spindleRpm)
  if (!output) return null
  const powerShare = asked.powerKw / output.powerKw
  const torqueShare = asked.torqueNm / output.torqueNm
  return { ...output, powerShare, torqueShare, drives: powerShare <= 1 && torqueShare <= 1 }
}

function fullCurve(points: readonly SpindlePoint[]): FullPoint[] {
  if (points.length === 0)
    throw new CoreInputError('curve-empty', 'points', 'The spindle curve has no points.')
  const curve = points.map(fullPoint).sort((one, other) => one.rpm - other.rpm)
  if (curve.some((point, index) => point.rpm === curve[index - 1]?.rpm)) {
    throw new CoreInputError('point-twice', 'points', 'The spindle curve has two points at one speed.')
  }
  return curve
}

/** Where both are given and disagree, the lesser holds. */
function fullPoint({ rpm, powerKw, torqueNm }: SpindlePoint): FullPoint {
  const speed = positive(rpm, 'points.rpm', 'The speed of a point')
  const power = positiveOrNull(powerKw, 'points.powerKw', 'The power of a point')
  const torque = positiveOrNull(torqueNm, 'points.torqueNm', 'The torque of a point')
  if (power === null && torque === null) {
    throw new CoreInputError(
      'point-without-output',
      'points',
      'A point of the spindle curve has neither power nor torque.',
    )
  }
  const powerAtMost = Math.min(
    power ?? Infinity,
    torque === null ? Infinity : (torque * speed) / torqueFactor,
  )
  return { rpm: speed, powerKw: powerAtMost, torqueNm: (powerAtMost * torqueFactor) / speed }
}
