import { type CutterForm, type CutterGeometry, holeToolForms } from '../tooling'
import { fluteEndDiameterMm } from './flute-end-diameter'
import { type GeometryProblem, isMore, lengthToleranceMm } from './geometry-problem'

/**
 * What about a cutter cannot be, each with its field and a sentence; empty for one that can.
 *
 * Every number is taken to be in its own range already (lengths above 0, angles within theirs): this answers how they
 * stand to each other and to the form. The database's checks say the same.
 *
 * Shapes     One cutter as the catalogue keeps it; null and absent are alike.
 * Units      Millimetres, degrees.
 * Result     Problems in the order of the fields; never throws.
 * Source     reach.md, section 1; stock.md, Things.
 * Tolerance  1e-9 mm.
 *
 * @example
 * cutterProblems({ form: 'ball', cuttingDiameterMm: 6, cornerRadiusMm: 2, lengthOfCutMm: 12, shankDiameterMm: 6, overallLengthMm: 57 })[0]?.path // => ['cornerRadiusMm']
 */
export function cutterProblems(cutter: CutterGeometry): GeometryProblem[] {
  return [...formProblems(cutter), ...lengthProblems(cutter), ...neckProblems(cutter)]
}

const holeTools: readonly CutterForm[] = holeToolForms
const pointedForms: readonly CutterForm[] = [...holeToolForms, 'chamfer']

function formProblems(cutter: CutterGeometry): GeometryProblem[] {
  return [
    ...cornerProblems(cutter),
    ...taperProblems(cutter),
    ...pointProblems(cutter),
    ...tipProblems(cutter),
  ]
}

function cornerProblems(cutter: CutterGeometry): GeometryProblem[] {
  const corner = cutter.cornerRadiusMm ?? null
  const radius = cutter.cuttingDiameterMm / 2
  if (cutter.form === 'cornerRadius' && !corner) {
    return [problem('cornerRadiusMm', 'This form needs its corner radius.')]
  }
  if (corner === null) return []
  if (isMore(corner, radius)) {
    return [problem('cornerRadiusMm', 'The corner radius is more than half the cutting diameter.')]
  }
  if (cutter.form === 'ball' && Math.abs(corner - radius) > lengthToleranceMm) {
    return [
      problem(
        'cornerRadiusMm',
        "A ball's radius is half its cutting diameter: leave this empty or give that.",
      ),
    ]
  }
  if (cutter.form === 'square' && corner > 0) {
    return [problem('cornerRadiusMm', 'A square end has no corner radius: choose the corner radius form.')]
  }
  return []
}

function taperProblems(cutter: CutterGeometry): GeometryProblem[] {
  if (cutter.form === 'tapered') {
    return cutter.taperHalfAngleDeg
      ? []
      : [problem('taperHalfAngleDeg', 'A tapered form needs its half angle, more than 0.')]
  }
  return cutter.taperHalfAngleDeg
    ? [problem('taperHalfAngleDeg', 'Only a tapered form has a taper: choose that form or leave this empty.')]
    : []
}

function pointProblems(cutter: CutterGeometry): GeometryProblem[] {
  const angle = cutter.pointAngleDeg ?? null
  if (cutter.form === 'drill' && angle === null) {
    return [problem('pointAngleDeg', 'A drill needs its point angle.')]
  }
  if (cutter.form === 'chamfer' && (angle === null || angle >= 180)) {
    return [problem('pointAngleDeg', 'A chamfer needs its included angle, less than 180°.')]
  }
  if (isPointOverlong(cutter, angle)) {
    return [problem('pointAngleDeg', 'The point is longer than the length of cut.')]
  }
  if (angle !== null && angle < 180 && !pointedForms.includes(cutter.form)) {
    return [problem('pointAngleDeg', 'This form has no point: leave the point angle empty.')]
  }
  return []
}

/** A chamfer may cut with a part of its cone; a point is all there. */
function isPointOverlong(cutter: CutterGeometry, angleDeg: number | null): boolean {
  if (angleDeg === null || !holeTools.includes(cutter.form)) return false
  const pointLengthMm = cutter.cuttingDiameterMm / 2 / Math.tan((angleDeg * Math.PI) / 360)
  return isMore(pointLengthMm, cutter.lengthOfCutMm ?? cutter.fluteLengthMm)
}

function tipProblems(cutter: CutterGeometry): GeometryProblem[] {
  const tip = cutter.tipDiameterMm ?? null
  if (cutter.form !== 'chamfer') {
    return tip ? [problem('tipDiameterMm', 'Only a chamfer has a tip diameter: leave this empty.')] : []
  }
  if (tip === null) {
    return [problem('tipDiameterMm', 'A chamfer needs its tip diameter; 0 for a sharp point.')]
  }
  return isMore(tip, cutter.cuttingDiameterMm)
    ? [problem('tipDiameterMm', 'The tip diameter is more than the cutting diameter.')]
    : []
}

function lengthProblems(cutter: CutterGeometry): GeometryProblem[] {
  const problems: GeometryProblem[] = []
  if (cutter.lengthOfCutMm == null && cutter.fluteLengthMm == null) {
    problems.push(problem('lengthOfCutMm', 'Give the length of cut or the flute length.'))
  }
  if (isMore(cutter.lengthOfCutMm, cutter.fluteLengthMm)) {
    problems.push(problem('lengthOfCutMm', 'The length of cut is more than the flute length.'))
  }
  if (isMore(cutter.lengthOfCutMm, cutter.overallLengthMm)) {
    problems.push(problem('lengthOfCutMm', 'The length of cut is more than the overall length.'))
  }
  if (isMore(cutter.fluteLengthMm, cutter.overallLengthMm)) {
    problems.push(problem('fluteLengthMm', 'The flute length is more than the overall length.'))
  }
  if (isMore(cutter.reachLengthMm, cutter.overallLengthMm)) {
    problems.push(problem('reachLengthMm', 'The reach length is more than the overall length.'))
  }
  return problems
}

function neckProblems(cutter: CutterGeometry): GeometryProblem[] {
  const fluteLength = cutter.fluteLengthMm ?? cutter.lengthOfCutMm
  if (cutter.neckDiameterMm == null || fluteLength == null) return []
  if (cutter.reachLengthMm == null) {
    return [problem('reachLengthMm', 'A neck needs its reach length: where it ends, counted from the tip.')]
  }
  if (cutter.reachLengthMm <= fluteLength) {
    return [problem('reachLengthMm', 'With a neck, the reach length is more than the length of the flutes.')]
  }
  return isMore(cutter.neckDiameterMm, fluteEndDiameterMm(cutter))
    ? [problem('neckDiameterMm', 'The neck is thicker than the flutes where it begins.')]
    : []
}

function problem(field: keyof CutterGeometry, message: string): GeometryProblem {
  return { path: [field], message }
}
