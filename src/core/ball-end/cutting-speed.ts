import { requireAmount, requireBetween, requireLength } from './checks'

/**
 * Cutting speed of a diameter that turns: vc = π·D·n/1000.
 *
 * Shapes     `diameterMm`: 0 (the dead tip) to 100 m.
 * Units      Millimetres and revolutions a minute in, m/min out.
 * Result     0 or more.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`, `out-of-range`.
 * Source     Tables printed with it: test/reference/ball-end/ball-end.md, section 6.
 * Tolerance  The printed tables to their last digit where they were printed with the full π.
 *
 * @example
 * cuttingSpeedMPerMin(0, 20000) // => 0
 * cuttingSpeedMPerMin(10, 1000) // => 31.41592653589793
 */
export function cuttingSpeedMPerMin(diameterMm: number, spindleRpm: number): number {
  requireBetween(diameterMm, 0, 100_000, 'diameterMm', 'The diameter')
  requireAmount(spindleRpm, 'spindleRpm', 'The spindle speed')
  return (Math.PI * diameterMm * spindleRpm) / 1000
}

/**
 * Spindle speed that gives a diameter a wanted cutting speed: n = 1000·vc/(π·D). Whether a spindle, a holder and a
 * cutter can turn so fast is asked elsewhere.
 *
 * Units      Millimetres and m/min in, revolutions a minute out.
 * Result     More than 0.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`.
 * Source     As cuttingSpeedMPerMin.
 * Tolerance  As cuttingSpeedMPerMin.
 *
 * @example
 * spindleRpmForSpeed(10, 100) // => 3183.098861837907
 */
export function spindleRpmForSpeed(diameterMm: number, speedMPerMin: number): number {
  requireLength(diameterMm, 'diameterMm', 'The diameter')
  requireAmount(speedMPerMin, 'wantedSpeedMPerMin', 'The wanted cutting speed')
  return (1000 * speedMPerMin) / (Math.PI * diameterMm)
}

/**
 * By how much the feed a tooth may be raised so that the thickest chip is as thick as at full engagement: fz/hex =
 * 1/(2·√(x(1 − x))) with x = ae/Deff below a half, 1 above.
 *
 * It is the largest chip thickness, not the mean one: makers who print feeds for hm mean another factor.
 *
 * Shapes     Both more than 0.
 * Units      Millimetres in, a plain factor out.
 * Result     1 or more.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`.
 * Source     Printed factors: test/reference/ball-end/ball-end.md, sections 3 and 5.
 * Tolerance  The printed factors to their one decimal.
 *
 * @example
 * chipThinningFactor(1, 2) // => 1
 * chipThinningFactor(1, 5) // => 1.25
 */
export function chipThinningFactor(stepoverMm: number, effectiveDiameterMm: number): number {
  requireLength(stepoverMm, 'stepoverMm', 'The stepover')
  requireLength(effectiveDiameterMm, 'effectiveDiameterMm', 'The effective diameter')
  const share = stepoverMm / effectiveDiameterMm
  return share < 0.5 ? 1 / (2 * Math.sqrt(share * (1 - share))) : 1
}
