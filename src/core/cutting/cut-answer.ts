import { cornerEffectiveDiameterMm } from '@/core/ball-end/corner-diameter'
import { chipThinningFactor, cuttingSpeedMPerMin, spindleRpmForSpeed } from '@/core/ball-end/cutting-speed'
import { CoreInputError } from '@/core/core-input-error'
import { positive } from '@/core/outline/checked-number'
import type { CutterForm, CutterGeometry } from '@/core/tooling'
import { drillingForce } from './drilling-force'
import { millingForce, powerAtTorqueKw } from './milling-force'
import { type SpindleDrive, type SpindlePoint, spindleDrive } from './spindle-curve'
import { type StickOutBand, type StickOutBands, stickOutBand } from './stick-out-caution'
import type { WorkMaterial } from './work-materials'

export interface CuttingSettings extends StickOutBands {
  /** Radial over cutting force; makers and papers give 0.15 to 0.5. */
  radialForceShare: number
}

export const defaultCuttingSettings: CuttingSettings = {
  radialForceShare: 0.4,
  stickOutCautionRatio: 4,
  stickOutLimitRatio: 8,
}

/** The spindle a cut is asked of. */
export interface SpindleOfMachine {
  points: readonly SpindlePoint[]
  maximumRpm: number
  minimumRpm?: number | null
  /** What of the motor's power comes to the cutter. */
  efficiency: number
}

export interface CutRequest {
  cutter: CutterGeometry
  material: WorkMaterial
  /** [vc] Of the diameter that cuts. */
  cuttingSpeedMPerMin: number
  /** A feed a tooth as at full engagement, a drill's feed a revolution. */
  feedMm: number
  /** [ap], [ae]: of milling. */
  depthOfCutMm?: number | null
  stepoverMm?: number | null
  /** What cutter and holder allow, besides the spindle. */
  limitsRpm?: readonly (number | null | undefined)[]
  spindle?: SpindleOfMachine | null
  complianceUmPerN: number
  stickOutToDiameter: number
  settings: CuttingSettings
}

export type CutAssumption =
  | 'estimate'
  | 'tip-load'
  | 'exponent-assumed'
  | 'point-angle-assumed'
  | 'spindle-unknown'
  | 'speed-limited'
  | 'speed-below-spindle'
  | 'speed-off-curve'

interface CutAnswerShared {
  diameterMm: number
  spindleRpm: number
  cuttingSpeedMPerMin: number
  feedMmPerMin: number
  chipMm: number
  specificForceNPerMm2: number
  torqueNm: number
  /** At the cutter; the motor gives this over its efficiency. */
  powerKw: number
  motorPowerKw: number | null
  /** Null without a curve, and above its last point. */
  drive: SpindleDrive | null
  stickOutBand: StickOutBand
  assumptions: CutAssumption[]
}

export interface MillingAnswer extends CutAnswerShared {
  kind: 'milling'
  feedPerToothMm: number
  chipThinningFactor: number
  cuttingForceN: number
  sideLoadN: number
  deflectionUm: number
}

export interface DrillingAnswer extends CutAnswerShared {
  kind: 'drilling'
  thrustN: number
}

export type CutAnswer = MillingAnswer | DrillingAnswer

const notEstimated: readonly CutterForm[] = ['reamer', 'tap', 'threadMill', 'chamfer']
const usualPointAngleDeg = 118

/**
 * What a cut asks of a mounted cutter and of the spindle: speed, feed, force, deflection, torque and power. All of it
 * an estimate, and named so; the maker's figures and the shop's experience go before it.
 *
 * Milling: speed and engagement at the diameter that cuts at this depth (a ball or corner at a shallow depth cuts on a
 * smaller one), the feed a tooth raised by radial chip thinning, the side load taken at the tip. Drilling: into the
 * solid. The least of spindle, holder and cutter holds the speed back.
 *
 * Shapes     Milling needs depth of cut, stepover and number of flutes; a drill none of these.
 * Units      Millimetres, m/min, revolutions a minute, newtons, newton metres, kilowatts, micrometres.
 * Errors     CoreInputError `not-given`, `not-positive`, `not-finite`, `stepover-over-diameter`, `not-estimated` for a
 *            reamer, tap, thread mill or chamfer tool.
 * Source     The functions it calls; test/reference/cutting.
 *
 * @example
 * cutAnswer({ cutter: { ...squareCutter, cuttingDiameterMm: 12, fluteCount: 4 }, material: findWorkMaterial(2), cuttingSpeedMPerMin: 180, feedMm: 0.06, depthOfCutMm: 6, stepoverMm: 6, complianceUmPerN: 0.1, stickOutToDiameter: 3, settings: defaultCuttingSettings }).spindleRpm.toFixed(1) // => '4774.6'
 */
export function cutAnswer(request: CutRequest): CutAnswer {
  const { form } = request.cutter
  if (notEstimated.includes(form)) {
    throw new CoreInputError(
      'not-estimated',
      'cutter.form',
      'Forces are estimated for mills and drills alone.',
    )
  }
  return form === 'drill' ? drillingAnswer(request) : millingAnswer(request)
}

function millingAnswer(request: CutRequest): MillingAnswer {
  const { cutter, settings } = request
  const depthOfCutMm = positive(request.depthOfCutMm, 'depthOfCutMm', 'The depth of cut')
  const stepoverMm = positive(request.stepoverMm, 'stepoverMm', 'The stepover')
  const fluteCount = positive(cutter.fluteCount, 'cutter.fluteCount', 'The number of flutes')
  const diameterMm = diameterInCutMm(cutter, depthOfCutMm)
  const thinning = chipThinningFactor(stepoverMm, diameterMm)
  const feedPerToothMm = positive(request.feedMm, 'feedMm', 'The feed a tooth') * thinning
  const force = millingForce(
    { diameterMm, fluteCount, depthOfCutMm, stepoverMm, feedPerToothMm },
    request.material,
    settings.radialForceShare,
  )
  const speed = speedOf(request, diameterMm)
  return {
    kind: 'milling',
    diameterMm,
    ...speed.figures,
    feedPerToothMm,
    chipThinningFactor: thinning,
    feedMmPerMin: speed.figures.spindleRpm * fluteCount * feedPerToothMm,
    chipMm: force.meanChipMm,
    specificForceNPerMm2: force.specificForceNPerMm2,
    cuttingForceN: force.cuttingForceN,
    sideLoadN: force.sideLoadN,
    deflectionUm: force.sideLoadN * request.complianceUmPerN,
    ...spindleLoad(request, speed.figures.spindleRpm, force.torqueNm),
    stickOutBand: stickOutBand(request.stickOutToDiameter, settings),
    assumptions: ['estimate', 'tip-load', ...materialAssumptions(request), ...speed.assumptions],
  }
}

function drillingAnswer(request: CutRequest): DrillingAnswer {
  const { cutter } = request
  const diameterMm = cutter.cuttingDiameterMm
  const feedPerRevolutionMm = positive(request.feedMm, 'feedMm', 'The feed a revolution')
  const force = drillingForce(
    { diameterMm, feedPerRevolutionMm, pointAngleDeg: cutter.pointAngleDeg ?? usualPointAngleDeg },
    request.material,
  )
  const speed = speedOf(request, diameterMm)
  return {
    kind: 'drilling',
    diameterMm,
    ...speed.figures,
    feedMmPerMin: speed.figures.spindleRpm * feedPerRevolutionMm,
    chipMm: force.chipMm,
    specificForceNPerMm2: force.specificForceNPerMm2,
    thrustN: force.thrustN,
    ...spindleLoad(request, speed.figures.spindleRpm, force.torqueNm),
    stickOutBand: stickOutBand(request.stickOutToDiameter, request.settings),
    assumptions: [
      'estimate',
      ...(cutter.pointAngleDeg == null ? (['point-angle-assumed'] as const) : []),
      ...materialAssumptions(request),
      ...speed.assumptions,
    ],
  }
}

/** A ball or corner shallower than its radius cuts on a smaller circle; a taper is read at its tip. */
function diameterInCutMm(cutter: CutterGeometry, depthOfCutMm: number): number {
  const { form, cuttingDiameterMm } = cutter
  const rounded = form === 'ball' ? cuttingDiameterMm / 2 : (cutter.cornerRadiusMm ?? 0)
  const isRounded = form === 'ball' || form === 'cornerRadius' || form === 'tapered'
  if (!isRounded || rounded <= 0) return cuttingDiameterMm
  return cornerEffectiveDiameterMm({ cuttingDiameterMm, cornerRadiusMm: rounded, depthOfCutMm })
}

interface SpeedOfCut {
  figures: { spindleRpm: number; cuttingSpeedMPerMin: number }
  assumptions: CutAssumption[]
}

function speedOf(request: CutRequest, diameterMm: number): SpeedOfCut {
  const wantedRpm = spindleRpmForSpeed(diameterMm, request.cuttingSpeedMPerMin)
  const limits = [request.spindle?.maximumRpm, ...(request.limitsRpm ?? [])].filter((limit) => limit != null)
  const spindleRpm = Math.min(wantedRpm, ...limits)
  const leastRpm = request.spindle?.minimumRpm ?? 0
  const points = request.spindle?.points ?? []
  const isOffCurve = points.length > 0 && points.every((point) => point.rpm < spindleRpm)
  const assumptions: CutAssumption[] = []
  if (spindleRpm < wantedRpm) assumptions.push('speed-limited')
  if (spindleRpm < leastRpm) assumptions.push('speed-below-spindle')
  if (points.length === 0) assumptions.push('spindle-unknown')
  if (isOffCurve) assumptions.push('speed-off-curve')
  return {
    figures: { spindleRpm, cuttingSpeedMPerMin: cuttingSpeedMPerMin(diameterMm, spindleRpm) },
    assumptions,
  }
}

function materialAssumptions({ material }: CutRequest): CutAssumption[] {
  return material.isExponentAssumed ? ['exponent-assumed'] : []
}

type SpindleLoad = Pick<CutAnswerShared, 'torqueNm' | 'powerKw' | 'motorPowerKw' | 'drive'>

function spindleLoad({ spindle }: CutRequest, spindleRpm: number, torqueNm: number): SpindleLoad {
  const powerKw = powerAtTorqueKw(torqueNm, spindleRpm)
  if (!spindle) return { torqueNm, powerKw, motorPowerKw: null, drive: null }
  const motorPowerKw = powerKw / positive(spindle.efficiency, 'spindle.efficiency', 'The efficiency')
  const drive =
    spindle.points.length === 0
      ? null
      : spindleDrive(spindle.points, spindleRpm, { powerKw: motorPowerKw, torqueNm })
  return { torqueNm, powerKw, motorPowerKw, drive }
}
