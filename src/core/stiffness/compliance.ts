import type { CutterDimensions } from '@/core/outline/cutter-dimensions'
import { outlineOfDimensions } from '@/core/outline/cutter-outline'
import { extensionOutline, holderOutline } from '@/core/outline/holder-outline'
import { strokesBetween } from '@/core/outline/stroke-chain'
import type { OutlinePart } from '@/core/outline/types'
import type { ExtensionGeometry, HolderGeometry, Substrate } from '@/core/tooling'

/** A round bar, or a cone, between two distances from the tip. */
export interface BeamPiece {
  fromMm: number
  toMm: number
  fromDiameterMm: number
  toDiameterMm: number
  modulusGpa: number
}

export interface StiffnessSettings {
  fluteStiffnessRatio: number
  carbideModulusGpa: number
  steelModulusGpa: number
}

/**
 * How far the tip of a stepped cantilever gives for a side load at the tip.
 *
 * Assumes pieces follow one another from the tip to where the beam is built in; bending only. Cones by
 * (x2 - x1)(u1² + u1·u2 + u2²)/(3·d1·d2), u = x/d: the textbook difference of powers cancels away for slender cones.
 *
 * Units      Millimetres, gigapascals; micrometres per newton.
 * Result     0 or more for pieces behind the tip.
 * Errors     None; a diameter of 0 gives Infinity.
 * Source     Castigliano; cases in test/reference/deflection.md, section 5.
 * Tolerance  Those cases to the digits they print.
 *
 * @example
 * tipComplianceUmPerN([{ fromMm: 0, toMm: 40, fromDiameterMm: 10, toDiameterMm: 10, modulusGpa: 600 }]).toFixed(5) // => '0.07243'
 */
export function tipComplianceUmPerN(pieces: BeamPiece[]): number {
  return complianceByOffset(pieces).constant
}

/** Compliance at a tip that is `offset` further away than the pieces say: constant + offset·linear + offset²·quadratic. */
export interface OffsetCompliance {
  constant: number
  linear: number
  quadratic: number
}

/**
 * How much pieces of a cantilever add to the compliance of a tip that is moved away from them.
 *
 * Assumes what `tipComplianceUmPerN` assumes; its formula written out for u = (x + offset)/d.
 *
 * Units      Millimetres, gigapascals; micrometres per newton, per newton and millimetre, per newton and square millimetre.
 * Result     0 or more each; without pieces nothing.
 * Errors     None; a diameter of 0 gives Infinity.
 * Source     As `tipComplianceUmPerN`.
 *
 * @example
 * complianceByOffset([{ fromMm: 0, toMm: 10, fromDiameterMm: 10, toDiameterMm: 10, modulusGpa: 210 }]).linear.toFixed(9) // => '0.000970087'
 */
export function complianceByOffset(pieces: BeamPiece[]): OffsetCompliance {
  let constant = 0
  let linear = 0
  let quadratic = 0
  for (const { fromMm, toMm, fromDiameterMm, toDiameterMm, modulusGpa } of pieces) {
    const u1 = fromMm / fromDiameterMm
    const u2 = toMm / toDiameterMm
    const v1 = 1 / fromDiameterMm
    const v2 = 1 / toDiameterMm
    const lengthMm = toMm - fromMm
    const under = 3 * fromDiameterMm * toDiameterMm * modulusGpa
    constant += (lengthMm * (u1 * u1 + u1 * u2 + u2 * u2)) / under
    linear += (lengthMm * (2 * u1 * v1 + u1 * v2 + u2 * v1 + 2 * u2 * v2)) / under
    quadratic += (lengthMm * (v1 * v1 + v1 * v2 + v2 * v2)) / under
  }
  const scale = 64 / Math.PI
  return { constant: scale * constant, linear: scale * linear, quadratic: scale * quadratic }
}

/**
 * Compliance at the tip of a whole assembly, built in at the gauge line.
 *
 * Assumes spindle, taper and clamping rigid; length of cut and run-out bend like a cylinder of a share of their diameter
 * (a tapered flute like a cone; a ball, corner, point or chamfer like the cylinder where it ends); holder and extension
 * are solid steel. Carbide where the substrate is not known.
 *
 * Units      Millimetres, gigapascals; micrometres per newton.
 * Errors     As `extensionOutline`, `holderOutline`.
 * Source     Share 0.8: Kops and Vo, CIRP Annals 39 (1990); test/reference/deflection.md.
 *
 * @example
 * assemblyComplianceUmPerN(cutterDimensions(ballCutter), 'carbide', handHolder, null, 40, defaultReachSettings).toFixed(3) // => '0.742'
 */
export function assemblyComplianceUmPerN(
  cutter: CutterDimensions,
  substrate: Substrate | null | undefined,
  holder: HolderGeometry,
  extension: ExtensionGeometry | null | undefined,
  stickOutMm: number,
  settings: StiffnessSettings,
): number {
  const holderNoseMm = stickOutMm + (extension?.projectionMm ?? 0)
  return tipComplianceUmPerN([
    ...cutterBeam(cutter, substrate, stickOutMm, settings),
    ...(extension ? extensionBeam(extension, stickOutMm, settings) : []),
    ...holderBeam(holder, holderNoseMm, settings),
  ])
}

/**
 * A holder as a beam of solid steel.
 *
 * Units      Millimetres, gigapascals; `noseMm` is its nose's distance from the tip.
 * Errors     As `holderOutline`.
 *
 * @example
 * holderBeam(handHolder, 40, defaultReachSettings)[0].toMm // => 58
 */
export function holderBeam(
  holder: HolderGeometry,
  noseMm: number,
  { steelModulusGpa }: StiffnessSettings,
): BeamPiece[] {
  return outlineBeam(holderOutline(holder), noseMm, steelModulusGpa, 1)
}

/**
 * An extension as a beam of solid steel.
 *
 * Units      Millimetres, gigapascals; `noseMm` is its nose's distance from the tip.
 * Errors     As `extensionOutline`.
 *
 * @example
 * extensionBeam({ projectionMm: 60, segments: [{ lengthMm: 60, noseDiameterMm: 16, spindleDiameterMm: 20 }] }, 40, defaultReachSettings)[0].fromMm // => 40
 */
export function extensionBeam(
  extension: ExtensionGeometry,
  noseMm: number,
  { steelModulusGpa }: StiffnessSettings,
): BeamPiece[] {
  return outlineBeam(extensionOutline(extension), noseMm, steelModulusGpa, 1)
}

/**
 * What of a cutter sticks out, as a beam.
 *
 * Assumes what `assemblyComplianceUmPerN` assumes.
 *
 * Units      Millimetres, gigapascals.
 *
 * @example
 * cutterBeam(cutterDimensions(ballCutter), 'carbide', 40, defaultReachSettings).at(-1).toMm // => 40
 */
export function cutterBeam(
  cutter: CutterDimensions,
  substrate: Substrate | null | undefined,
  stickOutMm: number,
  settings: StiffnessSettings,
): BeamPiece[] {
  const modulusGpa = cutterModulusGpa(substrate, settings)
  const parts = outlineOfDimensions(cutter).map(({ part, segments }) => ({
    part,
    segments: strokesBetween(segments, 0, stickOutMm),
  }))
  const isFluted = ({ part }: OutlinePart) => part === 'flute' || part === 'runOut'
  return [
    ...outlineBeam(parts.filter(isFluted), 0, modulusGpa, settings.fluteStiffnessRatio, tipEndZMm(cutter)),
    ...outlineBeam(
      parts.filter((part) => !isFluted(part)),
      0,
      modulusGpa,
      1,
    ),
  ]
}

/**
 * What a cutter is made of, as its modulus; carbide where it is not known.
 *
 * Units      Gigapascals.
 *
 * @example
 * cutterModulusGpa('hss', defaultReachSettings) // => 210
 */
export function cutterModulusGpa(
  substrate: Substrate | null | undefined,
  { carbideModulusGpa, steelModulusGpa }: StiffnessSettings,
): number {
  return substrate === 'hss' ? steelModulusGpa : carbideModulusGpa
}

/** Where the ball, corner, point or chamfer ends and the plain form begins. */
function tipEndZMm(cutter: CutterDimensions): number {
  const taperRad = (cutter.taperHalfAngleDeg * Math.PI) / 180
  return Math.max(cutter.pointLengthMm, cutter.cornerRadiusMm * (1 - Math.sin(taperRad)))
}

function outlineBeam(
  parts: OutlinePart[],
  raisedMm: number,
  modulusGpa: number,
  share: number,
  tipEndMm = 0,
): BeamPiece[] {
  const strokes = parts.flatMap((part) => part.segments).filter((stroke) => stroke.toZMm > stroke.fromZMm)
  const tipRadiusMm = strokes.findLast((stroke) => stroke.fromZMm < tipEndMm)?.toRadiusMm
  return strokes.map((stroke) => {
    const isTip = tipRadiusMm !== undefined && stroke.fromZMm < tipEndMm
    return {
      fromMm: stroke.fromZMm + raisedMm,
      toMm: stroke.toZMm + raisedMm,
      fromDiameterMm: 2 * share * (isTip ? tipRadiusMm : stroke.fromRadiusMm),
      toDiameterMm: 2 * share * (isTip ? tipRadiusMm : stroke.toRadiusMm),
      modulusGpa,
    }
  })
}
