import { CoreInputError } from '../core-input-error'
import { requireLength, shortestMm } from './checks'

/**
 * Diameter at which a cutter with corner radius cuts at a shallow depth, tool axis normal to the surface:
 * DC − 2·RE + 2·√(ap(2·RE − ap)). From the full radius on it is the cutting diameter.
 *
 * Units      Millimetres.
 * Result     More than 0, at most DC. With RE = DC/2 it is the ball's.
 * Errors     CoreInputError `not-finite`, `not-positive`, `too-large`, `corner-radius-too-large` (RE over DC/2).
 * Source     Printed as a formula by one maker; cases derived: test/reference/ball-end/ball-end.md, section 3.
 * Tolerance  Within 1e-9 mm.
 *
 * @example
 * cornerEffectiveDiameterMm({ cuttingDiameterMm: 20, cornerRadiusMm: 5, depthOfCutMm: 1 }) // => 16
 * cornerEffectiveDiameterMm({ cuttingDiameterMm: 20, cornerRadiusMm: 5, depthOfCutMm: 6 }) // => 20
 */
export function cornerEffectiveDiameterMm(cut: {
  cuttingDiameterMm: number
  cornerRadiusMm: number
  depthOfCutMm: number
}): number {
  const { cuttingDiameterMm, cornerRadiusMm, depthOfCutMm } = cut
  requireCorner(cuttingDiameterMm, cornerRadiusMm)
  requireLength(depthOfCutMm, 'depthOfCutMm', 'The depth of cut')
  if (depthOfCutMm >= cornerRadiusMm) return cuttingDiameterMm
  return (
    cuttingDiameterMm - 2 * cornerRadiusMm + 2 * Math.sqrt(depthOfCutMm * (2 * cornerRadiusMm - depthOfCutMm))
  )
}

/** A cutting diameter with a corner radius on it that can be. */
export function requireCorner(cuttingDiameterMm: number, cornerRadiusMm: number): void {
  requireLength(cuttingDiameterMm, 'cuttingDiameterMm', 'The cutting diameter')
  requireLength(cornerRadiusMm, 'cornerRadiusMm', 'The corner radius')
  if (cornerRadiusMm - cuttingDiameterMm / 2 > shortestMm) {
    throw new CoreInputError(
      'corner-radius-too-large',
      'cornerRadiusMm',
      'The corner radius is more than half the cutting diameter.',
    )
  }
}

/** Whether a corner radius, where one is given, makes the end a ball after all: it is half the cutting diameter. */
export function isBallEnd(cuttingDiameterMm: number, cornerRadiusMm: number | null | undefined): boolean {
  return cornerRadiusMm === null || cornerRadiusMm === undefined
    ? true
    : cuttingDiameterMm / 2 - cornerRadiusMm <= shortestMm
}
