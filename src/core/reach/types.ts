import type { ToolPart } from '@/core/outline/types'
import type { Bore, ColletGeometry, CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'
import type { LowerBound, UpperBound } from './bound-names'
import type { ReachMessage } from './message-codes'

export type { LowerBound, UpperBound }

/** A boss, clamp or jaw: an upright face behind the wall's top edge, standing above the top face. */
export interface Obstacle {
  setbackMm: number
  riseMm: number
}

/** A limit that is null or absent is not checked. */
export interface WallFeature {
  kind: 'wall'
  depthMm: number
  /** How far the wall leans back from its foot; 0 unless given. */
  draftDeg?: number | null
  /** How far the tool leans away from the wall; 0 unless given. */
  tiltDeg?: number | null
  /** What a through cut goes below the floor; 0 unless given. */
  throughMm?: number | null
  openingWidthMm?: number | null
  insideCornerRadiusMm?: number | null
  /** 0 asks for a square end. */
  floorRadiusMm?: number | null
  obstacles?: Obstacle[] | null
}

export interface HoleFeature {
  kind: 'hole'
  /** At full diameter. */
  depthMm: number
  diameterMm: number
  breakThroughMm?: number | null
}

export type Feature = WallFeature | HoleFeature

/** What the tool keeps from the part: the cutter's neck and shank, and everything behind the nose. */
export interface Clearances {
  shankMm: number
  holderMm: number
}

/** What a shop may set. */
export interface ReachSettings {
  shankClearanceMm: number
  holderClearanceMm: number
  /** Stick-outs are rounded up to this. */
  stickOutStepMm: number
  /** Full shank between the end of the flutes, or the neck, and the nose. */
  fluteToGripMm: number
  /** A hole tool may differ this much from the hole. */
  holeToleranceMm: number
  /** Room for chips in a drill's flutes, in diameters; common practice. */
  drillChipRoomDiameters: number
  /** A fluted length bends like a cylinder of this share of its diameter. Kops and Vo, CIRP Annals 39, 1990. */
  fluteStiffnessRatio: number
  carbideModulusGpa: number
  steelModulusGpa: number
}

export const defaultReachSettings: ReachSettings = {
  shankClearanceMm: 0.025,
  holderClearanceMm: 0.5,
  stickOutStepMm: 0.5,
  fluteToGripMm: 1,
  holeToleranceMm: 0.1,
  drillChipRoomDiameters: 1.5,
  fluteStiffnessRatio: 0.8,
  carbideModulusGpa: 580,
  steelModulusGpa: 210,
}

export interface ReachRequest {
  feature: Feature
  cutter: CutterGeometry
  holder: HolderGeometry
  collet?: ColletGeometry | null
  extension?: ExtensionGeometry | null
  /** What the holder, or the extension where there is one, offers the shank; not checked where it is not known. */
  bore?: Bore | null
  stickOutMm?: number | null
  /** The settings' clearances unless given. */
  clearances?: Partial<Clearances> | null
  sideLoadN?: number | null
  settings: ReachSettings
}

export type ReachVerdict = 'reaches' | 'short' | 'impossible'
export type ReachLimit = ToolPart | 'usableLength' | 'floor'

export interface FirstTouch {
  part: ToolPart
  /** null where the part never touches. */
  depthMm: number | null
}

export interface StickOutAnswer {
  /** null where no stick-out helps. */
  requiredMm: number | null
  /** The largest lower bound, unrounded. */
  minimumMm: number
  /** The upper bound. */
  maximumMm: number
  usedMm: number
  /** The length that has to be clamped; a side-lock's insertion where it names none. */
  gripMm: number
  boundBy: LowerBound
  upperBoundBy: UpperBound
}

export interface StiffnessAnswer {
  complianceUmPerN: number
  stickOutToDiameter: number
  deflectionUm: number | null
}

/** Where a depth is null it is without limit. */
export interface ReachAnswer {
  verdict: ReachVerdict
  shortfallMm: number
  reachMm: number | null
  limitedBy: ReachLimit | null
  firstTouch: FirstTouch[]
  reachAtBestMm: number | null
  stickOut: StickOutAnswer
  gaugeLengthMm: number
  maximumAxialStepMm: number
  stiffness: StiffnessAnswer
  /** What a taper steeper than the wall leaves at its foot; null where the tip is rounded, 0 where nothing is left. */
  uncutAtFootMm: number | null
  messages: ReachMessage[]
}
