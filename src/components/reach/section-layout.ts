import { strokesBetween } from '@/core/outline/stroke-chain'
import { toPartFrame } from '@/core/reach/placement'
import type { Point } from '../drawing/drafting-style'
import { type SectionScene, topFaceMm } from './section-scene'

/** `tip`: the cutter and the nose that holds it. `whole`: up to the spindle's face. */
export type SectionView = 'tip' | 'whole'

export interface Sheet {
  width: number
  height: number
}

/** Where the part's frame lies on the sheet, and how large. Held still while something is dragged. */
export interface SectionFrame {
  pxPerMm: number
  /** The foot of the wall on the sheet. */
  foot: Point
}

export interface SectionLayout extends SectionFrame {
  /** What its patterns and clips are called by: every drawing of a page has its own. */
  name: string
  sheet: Sheet
  /** Height above the tip at which the drawing of the tool ends. */
  cutZMm: number
  /** The room the part is drawn in, px. */
  left: number
  right: number
  bottom: number
  /** Where the tool's own frame turns: on the axis, so much above the tip. */
  turn: { uMm: number; hMm: number; zMm: number; tiltDeg: number }
  /** Half the width of the tool as drawn. */
  toolRadiusMm: number
}

const wideMargins = { left: 96, right: 92, top: 54, bottom: 58 }
const narrowMargins = { left: 66, right: 70, top: 34, bottom: 74 }
/** A phone's sheet ends in a line of words: what touches first. */
const captionPx = 28
const narrowSheetWidth = 560
/** A small drawing beside a line of a list: no figures, so no room for them. */
const smallMargins = { left: 6, right: 6, top: 8, bottom: 18 }
const smallSheetWidth = 220

/** A phone's width: figures stand closer and words are fewer. */
export function isNarrow(sheet: Pick<Sheet, 'width'>): boolean {
  return sheet.width < narrowSheetWidth
}

/** Material shown beyond the last edge, as a share of the height drawn. */
const materialShare = 0.16
/** Floor shown below the lowest place of the tool. */
const slabPx = 44
/** Room for two dimension lines outside a leaning chuck, as a share of its radius. */
const leaningRoom = 1.25
const spindleStubShare = 0.04

function marginsOf(sheet: Sheet): typeof wideMargins {
  if (sheet.width < smallSheetWidth) return smallMargins
  return isNarrow(sheet) ? narrowMargins : wideMargins
}

/** Where everything goes on a sheet of this size; `held` keeps the frame of before, or that of another drawing. */
export function sectionLayout(
  scene: SectionScene,
  view: SectionView,
  sheet: Sheet,
  held: SectionFrame | null,
  name = 'reach',
): SectionLayout {
  const margins = marginsOf(sheet)
  const cutZMm = cutHeightMm(scene, view)
  const extent = extentOf(scene, cutZMm)
  const frame = held ?? fittedFrame(extent, sheet, margins)
  return {
    ...frame,
    name,
    sheet,
    cutZMm,
    left: 12,
    right: sheet.width - margins.right,
    bottom: Math.min(
      sheet.height - (isNarrow(sheet) ? captionPx : 10),
      frame.foot.y - extent.toolLowMm * frame.pxPerMm + slabPx,
    ),
    turn: turnOf(scene),
    toolRadiusMm: extent.toolRadiusMm,
  }
}

/** Frames for several scenes side by side, each on a sheet of this size: one scale for all, their floors on one line. */
export function sharedFrames(
  scenes: readonly SectionScene[],
  view: SectionView,
  sheet: Sheet,
): SectionFrame[] {
  const margins = marginsOf(sheet)
  const extents = scenes.map((scene) => extentOf(scene, cutHeightMm(scene, view)))
  const room = roomOf(sheet, margins)
  const [hMin, hMax] = [
    Math.min(...extents.map((extent) => extent.hMin)),
    Math.max(...extents.map((extent) => extent.hMax)),
  ]
  const widestMm = Math.max(...extents.map(({ uMin, uMax }) => uMax - uMin))
  const pxPerMm = preferredScale(Math.min(room.width / widestMm, room.height / (hMax - hMin)))
  const spareHeight = room.height - (hMax - hMin) * pxPerMm
  return extents.map(({ uMin, uMax }) => ({
    pxPerMm,
    foot: {
      x: margins.left + (room.width - (uMax - uMin) * pxPerMm) / 2 - uMin * pxPerMm,
      y: sheet.height - margins.bottom - spareHeight / 2 + hMin * pxPerMm,
    },
  }))
}

function roomOf(sheet: Sheet, margins: typeof wideMargins): Sheet {
  return {
    width: sheet.width - margins.left - margins.right,
    height: sheet.height - margins.top - margins.bottom,
  }
}

/** A place of the part's frame on the sheet. */
export function onSheet(frame: SectionFrame, uMm: number, hMm: number): Point {
  return { x: frame.foot.x + uMm * frame.pxPerMm, y: frame.foot.y - hMm * frame.pxPerMm }
}

/** A place of the tool's own frame, radius to the right and height above the tip, on the sheet. */
export function toolOnSheet(layout: SectionLayout, radiusMm: number, zMm: number): Point {
  const { uMm, hMm, zMm: turnZMm, tiltDeg } = layout.turn
  const tilt = (tiltDeg * Math.PI) / 180
  const up = zMm - turnZMm
  return onSheet(
    layout,
    uMm - up * Math.sin(tilt) + radiusMm * Math.cos(tilt),
    hMm + up * Math.cos(tilt) + radiusMm * Math.sin(tilt),
  )
}

function cutHeightMm({ heights }: SectionScene, view: SectionView): number {
  const { overallMm, noseMm, gaugeLineMm } = heights
  if (noseMm === null || gaugeLineMm === null) return overallMm
  if (view === 'whole') return gaugeLineMm * (1 + spindleStubShare)
  const insideMm = Math.max(0, overallMm - noseMm)
  const shownMm = insideMm <= noseMm * 0.6 ? insideMm * 1.08 : noseMm * 0.3
  return Math.min(gaugeLineMm, noseMm + Math.max(shownMm, noseMm * 0.16))
}

interface Extent {
  uMin: number
  uMax: number
  hMin: number
  hMax: number
  /** How deep the tool itself goes. */
  toolLowMm: number
  toolRadiusMm: number
}

function extentOf(scene: SectionScene, cutZMm: number): Extent {
  const { at, parts } = scene
  const extent: Extent = { uMin: 0, uMax: 0, hMin: 0, hMax: 0, toolLowMm: 0, toolRadiusMm: 0 }
  const take = ({ uMm, hMm }: { uMm: number; hMm: number }) => {
    extent.uMin = Math.min(extent.uMin, uMm)
    extent.uMax = Math.max(extent.uMax, uMm)
    extent.hMin = Math.min(extent.hMin, hMm)
    extent.hMax = Math.max(extent.hMax, hMm)
  }
  for (const { segments } of parts)
    for (const stroke of strokesBetween(segments, 0, cutZMm))
      for (const [zMm, radiusMm] of [
        [stroke.fromZMm, stroke.fromRadiusMm],
        [stroke.toZMm, stroke.toRadiusMm],
      ] as const) {
        if (!Number.isFinite(radiusMm)) continue
        extent.toolRadiusMm = Math.max(extent.toolRadiusMm, radiusMm)
        take(toPartFrame(at, zMm, radiusMm))
        take(toPartFrame(at, zMm, -radiusMm))
      }
  take(toPartFrame(at, cutZMm, 0))
  extent.toolLowMm = extent.hMin
  // Leaning, the gauge length is measured from below the floor.
  if (at.kind === 'wall' && at.tiltDeg > 0 && scene.heights.noseMm !== null)
    take(toPartFrame(at, 0, -extent.toolRadiusMm * leaningRoom))
  const topMm = topFaceMm(at)
  const edgeMm = at.kind === 'wall' ? topMm * at.tanDraft : 0
  const obstacles = at.kind === 'wall' ? at.obstacles : []
  const riseMm = Math.max(0, ...obstacles.map((obstacle) => obstacle.riseMm))
  take({ uMm: edgeMm, hMm: (topMm + riseMm) * 1.04 })
  const shownMm = (extent.hMax - extent.hMin) * materialShare
  take({ uMm: edgeMm + Math.max(0, ...obstacles.map((obstacle) => obstacle.setbackMm)) + shownMm, hMm: 0 })
  const farMm = farWallMm(scene)
  if (farMm !== null) take({ uMm: farMm - edgeMm - shownMm, hMm: 0 })
  return extent
}

/** Where the far wall's foot is, from this wall's; null where the wall is open. */
export function farWallMm({ feature, at }: SectionScene): number | null {
  if (at.kind === 'hole') return -2 * at.roomRadiusMm
  if (feature.kind === 'hole') return -feature.diameterMm
  return feature.openingWidthMm == null ? null : -feature.openingWidthMm
}

function turnOf({ at }: SectionScene): SectionLayout['turn'] {
  if (at.kind === 'hole') return { uMm: -at.roomRadiusMm, hMm: 0, zMm: at.leadMm, tiltDeg: 0 }
  return { uMm: at.axisUMm, hMm: at.pivotMm, zMm: at.pivotMm, tiltDeg: at.tiltDeg }
}

const stepsPerTen = 20

/**
 * The largest px a millimetre of a series of preferred numbers (R 20 of ISO 3) that fits: a step of the stick-out
 * seldom changes it, so the drawing rests while the tool moves.
 */
function preferredScale(most: number): number {
  return 10 ** (Math.floor(Math.log10(most) * stepsPerTen) / stepsPerTen)
}

function fittedFrame(extent: Extent, sheet: Sheet, margins: typeof wideMargins): SectionFrame {
  const room = roomOf(sheet, margins)
  const size = { widthMm: extent.uMax - extent.uMin, heightMm: extent.hMax - extent.hMin }
  const pxPerMm = preferredScale(Math.min(room.width / size.widthMm, room.height / size.heightMm))
  const spare = {
    width: room.width - size.widthMm * pxPerMm,
    height: room.height - size.heightMm * pxPerMm,
  }
  return {
    pxPerMm,
    foot: {
      x: margins.left + spare.width / 2 - extent.uMin * pxPerMm,
      y: sheet.height - margins.bottom - spare.height / 2 + extent.hMin * pxPerMm,
    },
  }
}
