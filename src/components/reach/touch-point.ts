import type { ToolPart } from '@/core/outline/types'
import { widenedStart } from '@/core/reach/check-parts'
import { type PartPoint, toPartFrame } from '@/core/reach/placement'
import type { ReachLimit } from '@/core/reach/types'
import { clearanceOfMm, type SectionScene, topFaceMm } from './section-scene'

/** Two figures that agree this well speak of the same place. */
const sameMm = 1e-6

/**
 * Where on the part's frame a part of the tool first touches, given the depth the core says it does; null where that
 * place is not on the drawing.
 */
export function touchPoint(scene: SectionScene, part: ToolPart, depthMm: number): PartPoint | null {
  const { at } = scene
  const tipDepthMm = depthMm + at.leadMm
  const heightMm = at.kind === 'wall' ? tipDepthMm : depthMm
  const wallMm = at.kind === 'wall' ? heightMm * at.tanDraft : 0
  const candidates = widenedLines(scene, part).flatMap(([from, to]) => {
    const ends = [from, to].filter((end) => Number.isFinite(end.uMm))
    const isBetween = (from.hMm - heightMm) * (to.hMm - heightMm) <= sameMm ** 2
    const crosses =
      isBetween && Math.min(from.uMm, to.uMm) <= wallMm + sameMm && Math.max(from.uMm, to.uMm) >= wallMm
    const at = ends.filter(({ uMm, hMm }) => Math.abs(hMm - heightMm) < sameMm && uMm >= wallMm - sameMm)
    return crosses ? [{ uMm: wallMm, hMm: heightMm }, ...at] : at
  })
  return leftmost(candidates) ?? obstaclePoint(scene, part, tipDepthMm)
}

/** Where the far side of a tilted holder comes lowest. */
function lowestPoint(scene: SectionScene): PartPoint | null {
  const points = scene.checked
    .filter(({ part }) => part.clearance === 'holder')
    .flatMap(({ part }) => widenedLines(scene, part.part, -1).flat())
    .filter(({ hMm }) => Number.isFinite(hMm))
  return points.length === 0 ? null : points.reduce((low, point) => (point.hMm < low.hMm ? point : low))
}

/** The point of the cutter a reach limit stands for, where it is a part of the tool. */
export function limitPoint(
  scene: SectionScene,
  limit: ReachLimit | null,
  reachMm: number | null,
): PartPoint | null {
  if (limit === null || limit === 'usableLength' || reachMm === null) return null
  return limit === 'floor' ? lowestPoint(scene) : touchPoint(scene, limit, reachMm)
}

function leftmost(points: PartPoint[]): PartPoint | null {
  return points.length === 0 ? null : points.reduce((left, point) => (point.uMm < left.uMm ? point : left))
}

function widenedLines(scene: SectionScene, part: ToolPart, side: 1 | -1 = 1): [PartPoint, PartPoint][] {
  return scene.checked
    .filter((checked) => checked.part.part === part)
    .flatMap(({ part: { lines, clearance }, liftMm }) => {
      const outMm = clearanceOfMm({ part, lines, clearance }, scene.clearances)
      const upMm = clearance === 'holder' ? liftMm - outMm : liftMm
      return lines.map((line): [PartPoint, PartPoint] => [
        toPartFrame(scene.at, line.z0 + upMm, side * widenedStart(line, outMm)),
        toPartFrame(scene.at, line.z1 + upMm, side * (line.r1 + outMm)),
      ])
    })
}

/** What strikes an obstacle may do so on the way down: the place is shown at that obstacle's own edge. */
function obstaclePoint(scene: SectionScene, part: ToolPart, tipDepthMm: number): PartPoint | null {
  const { at } = scene
  if (at.kind === 'hole') return null
  const lines = checkedLines(scene, part, scene.clearances.holderMm)
  const struck = at.obstacles.filter(({ setbackMm, riseMm }) => {
    const zMm = tipDepthMm + riseMm
    const clearMm = at.standOffMm + setbackMm + tipDepthMm * at.tanDraft
    return lines.some((line) => radiusAt(line, zMm) >= clearMm - sameMm)
  })
  const topMm = topFaceMm(at)
  return leftmost(
    struck.map(({ setbackMm, riseMm }) => ({ uMm: topMm * at.tanDraft + setbackMm, hMm: topMm + riseMm })),
  )
}

interface WidenedLine {
  z0: number
  r0: number
  z1: number
  r1: number
}

function checkedLines(scene: SectionScene, name: ToolPart, outMm: number): WidenedLine[] {
  return scene.checked
    .filter(({ part }) => part.part === name)
    .flatMap(({ part, liftMm }) =>
      part.lines.map((line) => ({
        z0: line.z0 + liftMm - outMm,
        r0: widenedStart(line, outMm),
        z1: line.z1 + liftMm - outMm,
        r1: line.r1 + outMm,
      })),
    )
}

/** The widest of a line at a height; less than nothing where it isn't there. */
function radiusAt({ z0, r0, z1, r1 }: WidenedLine, zMm: number): number {
  if (zMm < z0 - sameMm || zMm > z1 + sameMm) return -1
  if (z1 - z0 < sameMm) return Math.max(r0, r1)
  return r0 + ((zMm - z0) / (z1 - z0)) * (r1 - r0)
}
