/**
 * The plain records every calculation works on. Lengths in millimetres, angles in degrees, symbols in brackets are
 * ISO 13399's. A field that is null or absent was not given; nothing here assumes a value for it.
 */

export const cutterForms = [
  'square',
  'cornerRadius',
  'ball',
  'tapered',
  'drill',
  'reamer',
  'tap',
  'faceMill',
  'slotting',
  'threadMill',
  'chamfer',
] as const
export type CutterForm = (typeof cutterForms)[number]

/** Forms that make their own hole on its axis; every other form circles in it. */
export const holeToolForms = ['drill', 'reamer', 'tap'] as const satisfies readonly CutterForm[]

export const substrates = ['carbide', 'hss'] as const
export type Substrate = (typeof substrates)[number]

export interface CutterGeometry {
  form: CutterForm
  /** [DC] */
  cuttingDiameterMm: number
  /** [RE] */
  cornerRadiusMm?: number | null
  /** Half the taper, a side. */
  taperHalfAngleDeg?: number | null
  /** [SIG] Included angle of the point, or of the chamfer. */
  pointAngleDeg?: number | null
  /** Diameter at the tip of a chamfer form. */
  tipDiameterMm?: number | null
  /** [APMX] */
  lengthOfCutMm?: number | null
  /** [LCF] */
  fluteLengthMm?: number | null
  /** [DN] */
  neckDiameterMm?: number | null
  /** [BHTA] a side */
  neckTaperHalfAngleDeg?: number | null
  /** [LU] */
  reachLengthMm?: number | null
  /** Between neck and shank, a side; 45 unless given. */
  neckTransitionAngleDeg?: number | null
  /** [DMM, DCONMS] */
  shankDiameterMm: number
  /** [OAL] */
  overallLengthMm: number
  /** [NOF] */
  fluteCount?: number | null
  substrate?: Substrate | null
}

export const holderSegmentParts = ['nut', 'holder'] as const
export type HolderSegmentPart = (typeof holderSegmentParts)[number]

/** A straight piece of the outline; segments run from the nose face towards the spindle. */
export interface OutlineSegment {
  lengthMm: number
  noseDiameterMm: number
  spindleDiameterMm: number
}

export interface HolderSegment extends OutlineSegment {
  part: HolderSegmentPart
}

/** What decides how far a shank goes in and how much of it must be held. */
export interface Clamping {
  boreDepthMm?: number | null
  /** [LSCN] */
  minimumGripMm?: number | null
  /** Where gripping begins, behind the nose face; 0 unless given. */
  gripStartMm?: number | null
}

export interface HolderGeometry extends Clamping {
  /** [A] Gauge line to nose face. */
  gaugeLengthMm: number
  /** A side-lock: the flat decides the insertion. */
  sideLockInsertionMm?: number | null
  /** Diameter of the machine's spindle nose, where known; without end otherwise. */
  spindleNoseDiameterMm?: number | null
  segments: HolderSegment[]
}

export interface ExtensionGeometry extends Clamping {
  /** [E] From the holder's nose face to the extension's own. */
  projectionMm: number
  segments: OutlineSegment[]
}

export interface ColletGeometry {
  series: string
  minimumMm: number
  maximumMm: number
  lengthMm?: number | null
  /** [LSCN] Two thirds of the length unless given. */
  minimumGripMm?: number | null
}

/** What a holder or an extension offers a shank. */
export type Bore = { kind: 'collet'; series: string } | { kind: 'fixed'; diameterMm: number }
