import type { CutterDimensions } from '@/core/outline/cutter-dimensions'
import { type ToolPart, toolParts } from '@/core/outline/types'
import { type CheckLine, checkPartsOfDimensions } from '@/core/reach/check-parts'
import { isHoleTool } from '@/core/reach/checked-feature'
import { usableTipDepthMm } from '@/core/reach/reach-case'
import { fullShankBound } from '@/core/reach/stick-out-bounds'
import type { ReachSettings } from '@/core/reach/types'
import { cutterBeam, cutterModulusGpa, tipComplianceUmPerN } from '@/core/stiffness/compliance'
import type { CutterGeometry } from '@/core/tooling'
import { leadingLines, lineStarts, packLines } from './body-table'

/** A cutter whose figures hold. */
export interface AcceptedCutter {
  index: number
  geometry: CutterGeometry
  dimensions: CutterDimensions
  shankClass: number
}

/**
 * The crib's cutters packed flat, in an order that puts those that stand alike in any feature side by side: by tip, then
 * by what holds their shank, then by length. A place in this order is a `row`.
 */
export interface CutterTable {
  count: number
  /** Place in the crib's list. */
  index: Int32Array
  dimensions: CutterDimensions[]
  /** Which tip a row has; one of each stands in `tips`. */
  tipOf: Int32Array
  tips: CutterDimensions[]
  shankClass: Int32Array
  diameterMm: Float64Array
  overallMm: Float64Array
  /** The shortest stick-out that leaves only full shank behind the nose. */
  fullShankMm: Float64Array
  /** Infinity for a cutter that is no hole tool. */
  usableTipDepthMm: Float64Array
  /** The largest radius anywhere. */
  widestMm: Float64Array
  /** Compliance of the cutter sticking out to `fullShankMm`, and what each further cubic millimetre adds. */
  compliance: Float64Array
  compliancePerCubicMm: Float64Array
  /** Outline above the length of cut: where a row's lines begin, one more at the end. */
  lineStart: Int32Array
  z0: Float64Array
  r0: Float64Array
  z1: Float64Array
  r1: Float64Array
  isFromAxis: Uint8Array
  /** Place in `toolParts`. */
  part: Uint8Array
}

/**
 * Packs cutters.
 *
 * Units      Millimetres; micrometres per newton.
 *
 * @example
 * packCutters([{ index: 4, geometry: squareCutter, dimensions: cutterDimensions(squareCutter), shankClass: 0 }], defaultReachSettings).fullShankMm[0] // => 13.7
 */
export function packCutters(cutters: readonly AcceptedCutter[], settings: ReachSettings): CutterTable {
  const rows = [...cutters].sort(compareCutters)
  const { tipOf, tips } = tipsOf(rows)
  const column = (of: (cutter: AcceptedCutter) => number) => Float64Array.from(rows, of)
  return {
    count: rows.length,
    index: Int32Array.from(rows, ({ index }) => index),
    // Copied in the order they are read in: the search goes through all of them, one after another.
    dimensions: rows.map(({ dimensions }) => ({ ...dimensions })),
    tipOf,
    tips,
    shankClass: Int32Array.from(rows, ({ shankClass }) => shankClass),
    diameterMm: column(({ dimensions }) => 2 * dimensions.radiusMm),
    overallMm: column(({ dimensions }) => dimensions.overallLengthMm),
    fullShankMm: column(({ dimensions }) => fullShankBound(dimensions, settings).mm),
    usableTipDepthMm: column(({ geometry, dimensions }) =>
      isHoleTool(dimensions) ? usableTipDepthMm(geometry, dimensions, settings) : Number.POSITIVE_INFINITY,
    ),
    widestMm: column(({ dimensions }) => widestMm(dimensions)),
    compliance: column((cutter) => fullShankCompliance(cutter, settings)),
    compliancePerCubicMm: column((cutter) => shankCompliance(cutter, settings)),
    ...bodyLines(rows),
  }
}

function fullShankCompliance({ geometry, dimensions }: AcceptedCutter, settings: ReachSettings): number {
  const fullShankMm = fullShankBound(dimensions, settings).mm
  return tipComplianceUmPerN(cutterBeam(dimensions, geometry.substrate, fullShankMm, settings))
}

function widestMm(cutter: CutterDimensions): number {
  const lines = checkPartsOfDimensions(cutter).flatMap((part) => part.lines)
  return lines.reduce((most, { r0, r1 }) => Math.max(most, r0, r1), 0)
}

/** A cylinder from x₁ to x₂ adds (x₂³ − x₁³) of this. */
function shankCompliance({ geometry, dimensions }: AcceptedCutter, settings: ReachSettings): number {
  const diameterMm = 2 * dimensions.shankRadiusMm
  return 64 / Math.PI / (3 * diameterMm ** 4 * cutterModulusGpa(geometry.substrate, settings))
}

function compareCutters(a: AcceptedCutter, b: AcceptedCutter): number {
  return (
    compareTips(a.dimensions, b.dimensions) ||
    a.shankClass - b.shankClass ||
    a.dimensions.overallLengthMm - b.dimensions.overallLengthMm ||
    a.dimensions.fluteLengthMm - b.dimensions.fluteLengthMm ||
    a.index - b.index
  )
}

/** Tips alike stand alike in every feature: 0. */
function compareTips(a: CutterDimensions, b: CutterDimensions): number {
  return (
    Number(isHoleTool(a)) - Number(isHoleTool(b)) ||
    a.radiusMm - b.radiusMm ||
    a.pointLengthMm - b.pointLengthMm ||
    a.cornerRadiusMm - b.cornerRadiusMm
  )
}

function tipsOf(rows: readonly AcceptedCutter[]): Pick<CutterTable, 'tipOf' | 'tips'> {
  const tips: CutterDimensions[] = []
  const tipOf = Int32Array.from(rows, ({ dimensions }) => {
    const last = tips.at(-1)
    if (!last || compareTips(last, dimensions) !== 0) tips.push(dimensions)
    return tips.length - 1
  })
  return { tipOf, tips }
}

function bodyLines(rows: readonly AcceptedCutter[]) {
  const outlines = rows.map(({ dimensions }) => leadingBodyLines(dimensions))
  const lines = outlines.flat()
  return {
    lineStart: lineStarts(outlines),
    ...packLines(lines),
    part: Uint8Array.from(lines, ({ part }) => toolParts.indexOf(part)),
  }
}

/** What of a cutter keeps the shank's clearance and can be the first to touch. */
function leadingBodyLines(cutter: CutterDimensions): (CheckLine & { part: ToolPart })[] {
  const parts = checkPartsOfDimensions(cutter).filter(({ clearance }) => clearance === 'cutter')
  return leadingLines(parts).map((line) => ({
    ...line,
    part: parts.find(({ lines }) => lines.includes(line))?.part ?? 'shank',
  }))
}
