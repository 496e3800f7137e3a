import type { ToolPart } from '@/core/outline/types'
import type { Clearances, Feature, LowerBound, UpperBound } from '@/core/reach/types'
import type { Bore, ColletGeometry, CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'

/**
 * What the search of a crib asks and answers. Lengths in millimetres, angles in degrees, compliance in micrometres per
 * newton. An index is a place in the list of `CribTooling` it belongs to.
 *
 * Two functions do it: `searchTables(tooling: CribTooling, settings: ReachSettings): SearchTables` in search-tables.ts
 * packs a crib once, and `searchReach(tables: SearchTables, question: SearchQuestion): SearchAnswer` in search-reach.ts
 * answers a question from it. `SearchTables` carries `tooling`, `settings` and `refusals: SearchRefusal[]`; the rest of it
 * is theirs alone. A bad record is never thrown, a bad question is: CoreInputError with the path of the question's field.
 */

export interface SearchCutter {
  id: string
  geometry: CutterGeometry
  /** [RPMX] Carried along; the search does not look at it. */
  maximumRpm?: number | null
}

export interface SearchHolder {
  id: string
  geometry: HolderGeometry
  /** null where it is not known: nothing is offered in such a holder. */
  bore: Bore | null
  /** Carried along; which tapers fit a machine is a mask. */
  taper: string | null
}

export interface SearchCollet {
  id: string
  geometry: ColletGeometry
}

export interface SearchExtension {
  id: string
  geometry: ExtensionGeometry
  /** What takes the cutter; null where it is not known: nothing is offered in such an extension. */
  bore: Bore | null
  /** Its own shank. null where it was not entered: it is offered in any holder, and what holds it is not checked. */
  shankDiameterMm: number | null
}

/** Everything a crib could build with. Ids are unique within their list. */
export interface CribTooling {
  cutters: SearchCutter[]
  holders: SearchHolder[]
  collets: SearchCollet[]
  extensions: SearchExtension[]
}

export const searchTableNames = ['cutters', 'holders', 'collets', 'extensions'] as const
export type SearchTableName = (typeof searchTableNames)[number]

/** One entry for every record of the table. */
export type SearchMasks = Partial<Record<SearchTableName, Uint8Array | null>>
export type SearchPenalties = Partial<Record<SearchTableName, Float64Array | null>>

export const searchPurposes = ['roughing', 'finishing'] as const
export type SearchPurpose = (typeof searchPurposes)[number]

export interface ScallopLimit {
  stepoverMm: number
  maximumHeightMm: number
}

export interface GaugeLengthWindow {
  shortestMm: number
  longestMm: number
}

export interface SearchQuestion {
  feature: Feature
  /**
   * Absent: every limit given is checked. `roughing` leaves inside corner radius, floor radius and scallop to the
   * finishing cutter. `finishing` checks them.
   */
  purpose?: SearchPurpose | null
  scallop?: ScallopLimit | null
  /** The settings' clearances unless given. */
  clearances?: Partial<Clearances> | null
  /** 1 lets a record be offered, 0 does not; a table without a mask is offered whole. */
  masks?: SearchMasks | null
  longestStickOutToDiameter?: number | null
  /** Of the whole assembly, gauge line to tip. */
  gaugeLengthMm?: GaugeLengthWindow | null
  /** Of the machine, where it is known: stands in for every holder's own. */
  spindleNoseDiameterMm?: number | null
  /** Added up over the parts of an assembly; a lower sum ranks first, before compliance. Finite, not below 0. */
  penalties?: SearchPenalties | null
  /** The most options of one cutter; no limit unless given. */
  perCutter?: number | null
  limit: number
  nearMissLimit: number
}

/** The parts of an assembly, as indexes into the crib's lists. */
export interface AssemblyParts {
  cutterIndex: number
  holderIndex: number
  /** The collet that holds the cutter, in the extension where there is one. */
  colletIndex: number | null
  extensionIndex: number | null
  /** The collet that holds the extension in a collet chuck; null where a bore does, or where it is not checked. */
  extensionColletIndex: number | null
}

export interface SearchOption extends AssemblyParts {
  /** The least that keeps every rule, rounded up to the shop's step. */
  stickOutMm: number
  gaugeLengthMm: number
  complianceUmPerN: number
  penalty: number
}

/**
 * What keeps an assembly from the feature. A part of the tool: it touches too early. `grip`: too little shank is left to
 * hold, whatever the depth.
 */
export type StoppedBy =
  | ToolPart
  | 'floor'
  | 'grip'
  | 'sideLock'
  | 'opening'
  | 'cornerRadius'
  | 'floorRadius'
  | 'lengthOfCut'
  | 'usableLength'
  | 'scallop'
  | 'stickOutToDiameter'
  | 'gaugeLength'

export interface Shortfall {
  by: StoppedBy
  shortfallMm: number
}

/** What would make a near miss reach, each tried by the reach check before it is said. */
export type SearchChange =
  /** Another holder of the crib, without or with an extension, that the question's masks left out. */
  | { kind: 'holder'; option: SearchOption }
  | { kind: 'extension'; option: SearchOption }
  /** The same stick-out rules, set longer than the least: the assembly was too short for the machine. */
  | { kind: 'stickOut'; stickOutMm: number }
  /** A nut no wider than this, on the same chuck. */
  | { kind: 'nut'; nutDiameterMm: number; ofNutDiameterMm: number }
  /** So much draft on the wall instead of what was asked. */
  | { kind: 'draft'; draftDeg: number; moreDeg: number; stickOutMm: number }
  /** So much tilt of the tool instead of what was asked. */
  | { kind: 'tilt'; tiltDeg: number; moreDeg: number; stickOutMm: number }
  /** The longest stick-out to diameter, let out to this. */
  | { kind: 'stickOutToDiameter'; stickOutToDiameter: number; stickOutMm: number }

/**
 * A cutter that reaches in nothing the question lets it be built with, in the assembly that comes nearest. Its stick-out
 * is the one it would need where the shank allows it, else the longest allowed.
 */
export interface NearMiss extends SearchOption {
  /** The first of `shortfalls`. */
  stoppedBy: StoppedBy
  shortfallMm: number
  /** All that is short, the most first; every one has to be mended. */
  shortfalls: Shortfall[]
  /** What stick-out the feature asks of this assembly and what it allows: crossed where `neededMm` is more. */
  stickOut: {
    neededMm: number
    maximumMm: number
    neededBy: LowerBound
    maximumBy: UpperBound
    /** The part behind the nose that asks for it; null where no part does. */
    part: ToolPart | null
  }
  /** Depth it reaches at that stick-out; null without limit. */
  reachMm: number | null
  changes: SearchChange[]
}

/** Why records are left out before anything is compared; each is counted once, at the first reason that holds. */
export const sortedOutReasons = [
  'cutterMasked',
  /** Its own figures are refused: see `SearchTables.refusals`. */
  'cutterRefused',
  /** A hole tool for a wall, a chamfer, a tip that may not be tilted. */
  'cutterForm',
  'holeDiameter',
  'taperSteeperThanWall',
  'lengthOfCut',
  'opening',
  'cornerRadius',
  'floorRadius',
  'scallop',
  /** The cutter's own flutes, run-out, neck or shank touch before the depth. */
  'cutterTouches',
  'usableLength',
  'cutterInFloor',
  /** No bore and no collet of what is offered takes the shank. */
  'shankNotHeld',
  'holderMasked',
  'holderRefused',
  'holderBoreUnknown',
  'colletMasked',
  'colletRefused',
  'extensionMasked',
  'extensionRefused',
  'extensionBoreUnknown',
] as const
export type SortedOutReason = (typeof sortedOutReasons)[number]
export type SortedOut = Record<SortedOutReason, number>

export interface SearchAnswer {
  /** Penalty, then compliance, then the ids of cutter, holder, collet, extension. */
  options: SearchOption[]
  /** Least shortfall first, one of a cutter. */
  nearMisses: NearMiss[]
  /** Assemblies the crib could build out of what the question lets it use. */
  considered: number
  /** Of these, the ones that reach and keep every limit. */
  reachable: number
  /** Comparisons of a cutter with something that holds it that were made one by one. */
  comparedPairs: number
  sortedOut: SortedOut
}

/** A record the reach check refuses, and why. */
export interface SearchRefusal {
  table: SearchTableName
  index: number
  code: string
  path: string
  message: string
}
