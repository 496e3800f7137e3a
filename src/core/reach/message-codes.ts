import type { ToolPart } from '@/core/outline/types'
import type { LowerBound, UpperBound } from './bound-names'

/** Every message a reach answer may carry, with the figures its sentence needs. Sentences are made at the edge. */
export interface ReachMessageValues {
  /** Only the fluted length was given and is read as the length of cut [APMX]. */
  'length-of-cut-assumed': { lengthOfCutMm: number }
  /** The fluted length [LCF] was not given; a run-out is assumed, or none where a neck follows. */
  'flute-length-assumed': { fluteLengthMm: number; runOutMm: number }
  /** The angle between neck and shank was not given. */
  'transition-angle-assumed': { transitionAngleDeg: number }
  /** A neck diameter without a reach length: the neck is left out, the shank begins at the flutes. */
  'neck-without-length': { neckDiameterMm: number }
  /** A corner radius on a form that is read as square: a face mill, slotting cutter, thread mill or hole tool. */
  'corner-radius-not-used': { cornerRadiusMm: number }
  /** The substrate was not given; carbide is assumed for stiffness. */
  'substrate-assumed': Record<string, never>
  /** The width of the spindle nose is not known; it is taken as without end. */
  'spindle-width-unknown': Record<string, never>
  /** The chuck's collet was not given: nothing checks that one holds the shank. */
  'collet-not-given': Record<string, never>
  /** No side load was given, so no deflection was worked out. */
  'deflection-not-asked': Record<string, never>
  /** Spindle, taper and clamping are taken as rigid: the tip gives more than this. */
  'spindle-taken-as-rigid': { fluteStiffnessRatio: number }
  /** Where in its collet's range the shank sits: 0 at the small end, which grips worst, 1 at the large. */
  'collet-range-position': {
    minimumMm: number
    maximumMm: number
    shankDiameterMm: number
    positionRatio: number
  }

  /** The opening at the floor is narrower than the tool. */
  'opening-too-narrow': { openingWidthMm: number; neededMm: number; shortfallMm: number }
  /** A tool that circles in a hole is wider than the hole. */
  'hole-too-narrow': { holeDiameterMm: number; neededMm: number; shortfallMm: number }
  /** The inside corner is tighter than the tool's radius. */
  'corner-too-tight': { insideCornerRadiusMm: number; toolRadiusMm: number; shortfallMm: number }
  /** The floor's radius is smaller than the tool's corner radius. */
  'floor-radius-too-small': { floorRadiusMm: number; cornerRadiusMm: number; shortfallMm: number }
  /** The hole tool's diameter is not the hole's. */
  'hole-diameter-mismatch': { holeDiameterMm: number; cuttingDiameterMm: number; toleranceMm: number }
  /** The cutter leans more than the wall: it would leave material at the foot. */
  'taper-steeper-than-wall': { taperHalfAngleDeg: number; wallDeg: number; uncutAtFootMm: number | null }
  /** The length of cut ends below where the rounded tip would touch the wall. */
  'length-of-cut-below-contact': { lengthOfCutMm: number; contactHeightMm: number }
  /** The length of cut strikes an obstacle before it is at depth. */
  'flutes-strike-obstacle': { depthMm: number }
  /** The collet's range does not take the shank. */
  'collet-range-misses-shank': { minimumMm: number; maximumMm: number; shankDiameterMm: number }
  /** The collet is of another series than the chuck, or the bore takes no collet. */
  'collet-of-other-series': { colletSeries: string; boreSeries: string | null }
  /** The fixed bore is not the shank's diameter. */
  'bore-misses-shank': { boreDiameterMm: number; shankDiameterMm: number; toleranceMm: number }
  /** No stick-out is allowed: a lower bound lies above the upper. */
  'bounds-crossed': {
    lowerBound: LowerBound
    lowerMm: number
    upperBound: UpperBound
    upperMm: number
    overlapMm: number
  }
  /** The stick-out given is beyond one of its bounds. */
  'stick-out-breaks-bound': {
    stickOutMm: number
    bound: LowerBound | UpperBound
    boundMm: number
    overlapMm: number
  }

  /** Part of the cutter itself, with its clearance, stops at this depth (a shank rubs): no stick-out helps. */
  'cutter-rubs': { part: ToolPart; depthMm: number; shortfallMm: number }
  /** The far side of the tilted cutter itself stands in the floor: less tilt or another cutter. */
  'cutter-strikes-floor': { part: ToolPart }
  /** The far side of the tilted holder stands in the floor at this stick-out. */
  'holder-strikes-floor': { neededStickOutMm: number }
  /** The flutes, or the reach length, of the hole tool end. */
  'usable-length-too-short': { usableDepthMm: number; shortfallMm: number }
  /** The stick-out the depth asks for is more than the grip leaves. */
  'needed-stick-out-over-maximum': {
    lowerBound: LowerBound
    neededMm: number
    maximumMm: number
    shortfallMm: number
  }
  /** At the stick-out given it falls short; this one would do. */
  'longer-stick-out-reaches': { stickOutMm: number; requiredMm: number }

  /** The depth is more than one axial step: it goes in steps. */
  'depth-in-steps': { depthMm: number; maximumAxialStepMm: number; steps: number }
  /** The wall ends below where the rounded tip touches: this much stays at its top edge, measured into the wall. */
  'wall-lower-than-corner': { contactHeightMm: number; leftAtTopMm: number }
  /** Without a neck the shank begins at the end of the flutes as a square step. */
  'thicker-shank-taken-as-step': { shankDiameterMm: number }
}

export type ReachMessageCode = keyof ReachMessageValues

export type ReachMessage = {
  [Code in ReachMessageCode]: { code: Code; values: ReachMessageValues[Code] }
}[ReachMessageCode]
