import type { Point } from '@/components/drawing/drafting-style'
import { drawingScale } from '@/components/drawing/drawing-scale'
import type { GaugeLengthFit, MachineWindow } from '@/core/machine/machine-window'
import type { OutlinePart } from '@/core/outline/types'

export interface DaylightStock {
  widthMm: number
  heightMm: number
  offsetXMm: number | null
  offsetYMm: number | null
  axisHeightMm: number
  chuckRadiusMm: number | null
  partDiameterMm: number | null
}

/** What stands on a machine, with heights above the table. */
export interface DaylightScene {
  gaugeLineToTableMm: number
  zTravelMm: number
  spindleNoseDiameterMm: number | null
  highestMm: number
  lowestTipMm: number
  retractClearanceMm: number
  fixtures: readonly { key: string; code: string; baseMm: number; heightMm: number }[]
  rotaryStock: DaylightStock | null
  window: MachineWindow
}

/** What hangs from the spindle; z from the tip. */
export interface DaylightTool {
  parts: readonly OutlinePart[]
  gaugeLengthMm: number
  fit: GaugeLengthFit
}

export interface DaylightLayout {
  height: number
  scaleName: string
  pxPerMm: number
  /** Between the dimensions of either side. */
  left: number
  right: number
  /** The spindle's two places: at retract and at depth. */
  retractX: number
  depthX: number
  retractMm: number
  /** Gauge line as low as it goes. */
  lowestGaugeLineMm: number
  yOf: (heightMm: number) => number
}

const margins = { left: 66, right: 92, top: 62, bottom: 58 }
/** Enough for two tools side by side. */
const leastWidthMm = 190
const narrow = 520
/** A wider sheet leaves its sides free: the eye goes up and down here. */
const widestPx = 600

/** Places everything on a sheet of a width in px; heights are true, widths only where they are known. */
export function daylightLayout(scene: DaylightScene, width: number): DaylightLayout {
  const { window, gaugeLineToTableMm } = scene
  const span = Math.min(width - margins.left - margins.right, widestPx)
  const room = {
    width: span,
    height: width < narrow ? 430 : 540,
  }
  const sunkMm = Math.max(0, -(window.tableClearanceMm ?? 0))
  const { pxPerMm, name } = drawingScale(
    {
      widthMm: Math.max(leastWidthMm, 2.3 * (window.sweptRadiusMm ?? 0)),
      heightMm: gaugeLineToTableMm + sunkMm,
    },
    room,
  )
  const tableY = margins.top + gaugeLineToTableMm * pxPerMm
  const left = Math.round(margins.left + (width - margins.left - margins.right - span) / 2)
  const right = left + span
  return {
    height: tableY + sunkMm * pxPerMm + margins.bottom,
    scaleName: name,
    pxPerMm,
    left,
    right,
    retractX: left + 0.3 * (right - left),
    depthX: left + 0.68 * (right - left),
    retractMm: window.highestMm + scene.retractClearanceMm,
    lowestGaugeLineMm: gaugeLineToTableMm - scene.zTravelMm,
    yOf: (heightMm) => Math.round((tableY - heightMm * pxPerMm) * 100) / 100,
  }
}

/** Places an outline with its axis upright, its tip at a height. */
export function uprightFrame(
  { yOf, pxPerMm }: DaylightLayout,
  axisX: number,
  tipMm: number,
): (zMm: number, radiusMm: number) => Point {
  return (zMm, radiusMm) => ({
    x: Math.round((axisX + radiusMm * pxPerMm) * 100) / 100,
    y: yOf(tipMm + zMm),
  })
}

/** Where the tip is as low as the machine, or the feature, lets it. */
export function deepestTipMm(scene: DaylightScene, layout: DaylightLayout, gaugeLengthMm: number): number {
  return Math.max(scene.lowestTipMm, layout.lowestGaugeLineMm - gaugeLengthMm)
}

export function widestRadiusMm(tool: DaylightTool): number {
  return Math.max(...tool.parts.flatMap(({ segments }) => segments.map((stroke) => stroke.toRadiusMm)))
}
