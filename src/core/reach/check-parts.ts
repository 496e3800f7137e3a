import { type CutterDimensions, cutterDimensions } from '@/core/outline/cutter-dimensions'
import { outlineOfDimensions } from '@/core/outline/cutter-outline'
import { extensionOutline, holderOutline } from '@/core/outline/holder-outline'
import type { OutlineArc, OutlinePart, OutlineStroke, ToolPart } from '@/core/outline/types'
import type { CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'

/** A stroke of the outline as the checks read it; `arc` where it is one. */
export interface CheckLine {
  z0: number
  r0: number
  z1: number
  r1: number
  arc: OutlineArc | null
}

/** What clearance a part keeps: `flute` none, `cutter` the shank's, `holder` the holder's. */
export type ClearanceKind = 'flute' | 'cutter' | 'holder'

export interface CheckPart {
  part: ToolPart
  clearance: ClearanceKind
  lines: CheckLine[]
}

/**
 * A cutter's parts ready to be checked; heights from the tip.
 *
 * Assumes all above the length of cut is one body with a lower face of its own, since its clearance makes it wider than
 * the flutes it stands on.
 *
 * Units      Millimetres.
 * Errors     As `cutterDimensions`.
 *
 * @example
 * cutterCheckParts({ form: 'square', cuttingDiameterMm: 6, lengthOfCutMm: 12, fluteLengthMm: 12, shankDiameterMm: 6, overallLengthMm: 60 }).map(part => part.part) // => ['flute', 'shank']
 */
export function cutterCheckParts(cutter: CutterGeometry): CheckPart[] {
  return checkPartsOfDimensions(cutterDimensions(cutter))
}

/**
 * As `cutterCheckParts`, from figures already checked.
 *
 * Units      Millimetres.
 *
 * @example
 * checkPartsOfDimensions(cutterDimensions(squareCutter))[1].lines[0] // => { z0: 12.7, r0: 0, z1: 12.7, r1: 1.5875, arc: null }
 */
export function checkPartsOfDimensions(cutter: CutterDimensions): CheckPart[] {
  const parts = outlineOfDimensions(cutter).map((part) =>
    checkPart(part, part.part === 'flute' ? 'flute' : 'cutter', 0),
  )
  const body = parts.find((part) => part.clearance === 'cutter')
  const first = body?.lines[0]
  if (body && first && first.r0 > 0)
    body.lines.unshift({ z0: first.z0, r0: 0, z1: first.z0, r1: first.r0, arc: null })
  return parts
}

/**
 * The parts behind the nose ready to be checked: extension, nut, holder, spindle; heights from the nose that holds the
 * cutter.
 *
 * Units      Millimetres.
 * Result     A part once, however often the outline comes back to it.
 * Errors     As `holderOutline` and `extensionOutline`.
 *
 * @example
 * holderCheckParts({ gaugeLengthMm: 80, segments: [{ part: 'holder', lengthMm: 80, noseDiameterMm: 20, spindleDiameterMm: 30 }] }, null).map(part => part.part) // => ['holder', 'spindle']
 */
export function holderCheckParts(
  holder: HolderGeometry,
  extension: ExtensionGeometry | null | undefined,
): CheckPart[] {
  const parts = extension ? extensionCheckParts(extension) : []
  for (const outline of holderOutline(holder)) {
    const next = checkPart(outline, 'holder', extension?.projectionMm ?? 0)
    const same = parts.find(({ part }) => part === next.part)
    if (same) same.lines.push(...next.lines)
    else parts.push(next)
  }
  return parts
}

/**
 * An extension's part ready to be checked; heights from its own nose.
 *
 * Units      Millimetres.
 * Errors     As `extensionOutline`.
 *
 * @example
 * extensionCheckParts({ projectionMm: 60, segments: [{ lengthMm: 60, noseDiameterMm: 16, spindleDiameterMm: 20 }] }).length // => 1
 */
export function extensionCheckParts(extension: ExtensionGeometry): CheckPart[] {
  return extensionOutline(extension).map((part) => checkPart(part, 'holder', 0))
}

function checkPart({ part, segments }: OutlinePart, clearance: ClearanceKind, byMm: number): CheckPart {
  return { part, clearance, lines: segments.map((stroke) => checkLine(stroke, byMm)) }
}

function checkLine(stroke: OutlineStroke, byMm: number): CheckLine {
  return {
    z0: stroke.fromZMm + byMm,
    r0: stroke.fromRadiusMm,
    z1: stroke.toZMm + byMm,
    r1: stroke.toRadiusMm,
    arc: stroke.kind === 'arc' ? stroke : null,
  }
}

/**
 * Radius at which a widened line begins. A face goes on from the axis; any other end moves out with the clearance.
 *
 * Units      Millimetres.
 *
 * @example
 * widenedStart({ z0: 0, r0: 0, z1: 0, r1: 14, arc: null }, 0.5) // => 0
 */
export function widenedStart(line: CheckLine, byMm: number): number {
  return line.r0 === 0 && line.z0 === line.z1 ? 0 : line.r0 + byMm
}
