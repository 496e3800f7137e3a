import { CoreInputError } from '@/core/core-input-error'
import { assemblyOutline } from '@/core/outline/assembly-outline'
import { type CutterDimensions, cutterDimensions } from '@/core/outline/cutter-dimensions'
import { outlineOfDimensions } from '@/core/outline/cutter-outline'
import type { OutlinePart } from '@/core/outline/types'
import { type CheckPart, cutterCheckParts, holderCheckParts } from '@/core/reach/check-parts'
import { checkedFeature } from '@/core/reach/checked-feature'
import { type Placement, placement } from '@/core/reach/placement'
import type { Clearances, Feature, ReachAnswer, ReachSettings } from '@/core/reach/types'
import type { CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'

/** Everything a section drawing shows, in millimetres, before it is given a place on the sheet. */
export interface SectionScene {
  feature: Feature
  at: Placement
  cutter: CutterDimensions
  /** From the tip up, as far as it is seen; heights from the tip. */
  parts: OutlinePart[]
  /** The same bodies as they are checked, each lifted to where it stands. */
  checked: { part: CheckPart; liftMm: number }[]
  clearances: Clearances
  /** Heights above the tip; the last three only with a holder. */
  heights: {
    overallMm: number
    noseMm: number | null
    holderNoseMm: number | null
    gaugeLineMm: number | null
  }
}

export interface SceneParts {
  feature: Feature | null
  cutter: CutterGeometry | null
  holder: HolderGeometry | null
  extension: ExtensionGeometry | null
  stickOutMm: number | null
  clearances: Clearances
}

/** The scene of what is there so far; null while feature or cutter is missing, or is nothing that could be drawn. */
export function sectionScene(given: SceneParts): SectionScene | null {
  try {
    return given.feature && given.cutter ? scene(given, given.feature, given.cutter) : null
  } catch (error) {
    if (error instanceof CoreInputError) return null
    throw error
  }
}

/** The scene of a check: at the stick-out of the answer, or the one given while there is no answer. */
export function sceneOfCheck(
  check: Pick<SceneParts, 'feature' | 'cutter' | 'holder' | 'extension'> & CheckGiven,
  answer: ReachAnswer | null,
  settings: ReachSettings,
): SectionScene | null {
  return sectionScene({
    feature: check.feature,
    cutter: check.cutter,
    holder: check.holder,
    extension: check.extension,
    stickOutMm: answer?.stickOut.usedMm ?? check.stickOutMm,
    clearances: {
      shankMm: check.clearances.shankMm ?? settings.shankClearanceMm,
      holderMm: check.clearances.holderMm ?? settings.holderClearanceMm,
    },
  })
}

interface CheckGiven {
  stickOutMm: number | null
  clearances: { shankMm: number | null; holderMm: number | null }
}

function scene(given: SceneParts, feature: Feature, tool: CutterGeometry): SectionScene {
  const { holder, extension, clearances } = given
  const cutter = cutterDimensions(tool)
  const at = placement(checkedFeature(feature, cutter), cutter)
  const cutterParts = cutterCheckParts(tool).map((part) => ({ part, liftMm: 0 }))
  const stickOutMm = holder ? given.stickOutMm : null
  if (!holder || stickOutMm === null) {
    const heights = { overallMm: cutter.overallLengthMm, noseMm: null, holderNoseMm: null, gaugeLineMm: null }
    return {
      feature,
      at,
      cutter,
      parts: outlineOfDimensions(cutter),
      checked: cutterParts,
      clearances,
      heights,
    }
  }
  const holderNoseMm = stickOutMm + (extension?.projectionMm ?? 0)
  const holderParts = holderCheckParts(holder, extension).map((part) => ({ part, liftMm: stickOutMm }))
  return {
    feature,
    at,
    cutter,
    parts: assemblyOutline(tool, holder, extension, stickOutMm),
    checked: [...cutterParts, ...holderParts],
    clearances,
    heights: {
      overallMm: cutter.overallLengthMm,
      noseMm: stickOutMm,
      holderNoseMm,
      gaugeLineMm: holderNoseMm + holder.gaugeLengthMm,
    },
  }
}

/** What a part keeps from the part being cut: nothing for the length of cut. */
export function clearanceOfMm(part: CheckPart, clearances: Clearances): number {
  if (part.clearance === 'flute') return 0
  return part.clearance === 'holder' ? clearances.holderMm : clearances.shankMm
}

/** Height of the part's top face above the foot of its wall, in the part's own frame. */
export function topFaceMm(at: Placement): number {
  return at.kind === 'wall' ? at.tipDepthMm : at.tipDepthMm - at.leadMm
}
