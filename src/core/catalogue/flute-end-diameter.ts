import type { CutterGeometry } from '../tooling'

/**
 * Diameter of the cutting form at the end of the flutes, the most a neck behind them may have.
 *
 * A taper carries on through the run-out; every other form keeps what it has at the end of its length of cut. Of the
 * length of cut and the flutes' length, the one given stands for both.
 *
 * Shapes     A cutter with at least one of `lengthOfCutMm` and `fluteLengthMm`.
 * Units      Millimetres, degrees; a diameter.
 * Result     Millimetres, more than 0 for a cutter that `cutterProblems` has nothing against.
 * Source     Plane geometry: reach.md, section 1, cutting form.
 * Tolerance  1e-9 mm.
 *
 * @example
 * fluteEndDiameterMm({ form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, shankDiameterMm: 6, overallLengthMm: 57 }) // => 6
 */
export function fluteEndDiameterMm(cutter: CutterGeometry): number {
  const radius = cutter.cuttingDiameterMm / 2
  const lengthOfCut = cutter.lengthOfCutMm ?? cutter.fluteLengthMm ?? 0
  const fluteLength = cutter.fluteLengthMm ?? lengthOfCut
  const point = tangentOfHalf(cutter.pointAngleDeg)
  switch (cutter.form) {
    case 'tapered':
      return 2 * taperedRadiusMm(cutter, fluteLength)
    case 'cornerRadius':
      return 2 * roundedRadiusMm(radius, cutter.cornerRadiusMm ?? 0, lengthOfCut)
    case 'ball':
      return 2 * roundedRadiusMm(radius, radius, lengthOfCut)
    case 'drill':
      return 2 * Math.min(radius, lengthOfCut * point)
    case 'chamfer':
      return 2 * Math.min(radius, (cutter.tipDiameterMm ?? 0) / 2 + lengthOfCut * point)
    default:
      return cutter.cuttingDiameterMm
  }
}

function tangentOfHalf(angleDeg: number | null | undefined): number {
  return angleDeg == null || angleDeg >= 180 ? Number.POSITIVE_INFINITY : Math.tan((angleDeg * Math.PI) / 360)
}

function roundedRadiusMm(radius: number, corner: number, height: number): number {
  return height >= corner ? radius : radius - corner + Math.sqrt(corner ** 2 - (corner - height) ** 2)
}

function taperedRadiusMm(cutter: CutterGeometry, height: number): number {
  const radius = cutter.cuttingDiameterMm / 2
  const corner = cutter.cornerRadiusMm ?? 0
  const taper = ((cutter.taperHalfAngleDeg ?? 0) * Math.PI) / 180
  const arcEnd = corner * (1 - Math.sin(taper))
  if (height < arcEnd) return roundedRadiusMm(radius, corner, height)
  return radius - corner * (1 - Math.cos(taper)) + (height - arcEnd) * Math.tan(taper)
}
