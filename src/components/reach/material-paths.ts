import { breakPath } from './break-path'
import { farWallMm, onSheet, type SectionLayout } from './section-layout'
import { type SectionScene, topFaceMm } from './section-scene'

/** A piece of the part in section: what is hatched, and the edges of it that are real. */
export interface MaterialPath {
  area: string
  edges: string
  /** Where it goes on beyond the drawing. */
  breaks: string[]
}

type Place = (uMm: number, hMm: number) => string
type Upright = (uMm: number, fromMm: number, toMm: number) => string

/** The part being cut, with its far wall where it has one. */
export function materialPaths(scene: SectionScene, layout: SectionLayout): MaterialPath[] {
  const place = placer(layout)
  const wall = wallOf(scene, layout)
  const upright = (uMm: number, fromMm: number, toMm: number) =>
    breakPath(onSheet(layout, uMm, fromMm), onSheet(layout, uMm, toMm))
  return wall.isThrough ? throughPaths(wall, place, upright) : [blindPath(wall, place, upright)]
}

/** What stands on the part, each behind its own upright face. */
export function obstaclePaths({ at }: SectionScene, layout: SectionLayout): MaterialPath[] {
  if (at.kind === 'hole') return []
  const place = placer(layout)
  const { rightMm } = bounds(layout)
  const topMm = topFaceMm(at)
  return at.obstacles.map(({ setbackMm, riseMm }) => {
    const faceMm = topMm * at.tanDraft + setbackMm
    const edges = `M${place(faceMm, topMm)}L${place(faceMm, topMm + riseMm)}L${place(rightMm, topMm + riseMm)}`
    const breaks = [breakPath(onSheet(layout, rightMm, topMm), onSheet(layout, rightMm, topMm + riseMm))]
    return { edges, area: `${edges}L${place(rightMm, topMm)}Z`, breaks }
  })
}

function placer(layout: SectionLayout): Place {
  return (uMm, hMm) => {
    const { x, y } = onSheet(layout, uMm, hMm)
    return `${Math.round(x * 100) / 100} ${Math.round(y * 100) / 100}`
  }
}

function bounds({ foot, left, right, bottom, pxPerMm }: SectionLayout) {
  return {
    leftMm: (left - foot.x) / pxPerMm,
    rightMm: (right - foot.x) / pxPerMm,
    bottomMm: (foot.y - bottom) / pxPerMm,
  }
}

interface Wall {
  depthMm: number
  tanDraft: number
  farMm: number | null
  isThrough: boolean
  /** The underside of a part that is cut through. */
  undersideMm: number
  foot: FootShape
  leftMm: number
  rightMm: number
  bottomMm: number
  pxPerMm: number
}

/** How floor and wall meet: on the floor `inMm` before the foot, on the wall at (`uMm`, `hMm`), an arc between. */
interface FootShape {
  inMm: number
  uMm: number
  hMm: number
  arcMm: number
  /** What a point leaves below the floor, on the axis. */
  pointMm: number
}

function wallOf(scene: SectionScene, layout: SectionLayout): Wall {
  const { at, feature, cutter } = scene
  const throughMm = feature.kind === 'wall' ? (feature.throughMm ?? 0) : (feature.breakThroughMm ?? 0)
  const common = {
    farMm: farWallMm(scene),
    isThrough: throughMm > 0,
    pxPerMm: layout.pxPerMm,
    ...bounds(layout),
  }
  if (at.kind === 'hole') {
    const foot = { inMm: 0, uMm: 0, hMm: 0, arcMm: 0, pointMm: cutter.pointLengthMm }
    return { ...common, depthMm: topFaceMm(at), tanDraft: 0, undersideMm: 0, foot }
  }
  return {
    ...common,
    depthMm: topFaceMm(at),
    tanDraft: at.tanDraft,
    undersideMm: throughMm,
    foot: roundedFoot(cutter.cornerRadiusMm, at.draftDeg, topFaceMm(at)),
  }
}

/** The corner the tool leaves: tangent to floor and wall, cut off where the wall is lower than it. */
function roundedFoot(arcMm: number, draftDeg: number, depthMm: number): FootShape {
  const draft = (draftDeg * Math.PI) / 180
  const inMm = (arcMm * (1 - Math.sin(draft))) / Math.cos(draft)
  const hMm = Math.min(depthMm, arcMm * (1 - Math.sin(draft)))
  const uMm = -inMm + Math.sqrt(Math.max(0, arcMm ** 2 - (arcMm - hMm) ** 2))
  return { inMm, uMm, hMm, arcMm, pointMm: 0 }
}

function blindPath(wall: Wall, place: Place, upright: Upright): MaterialPath {
  const { depthMm, tanDraft, foot, farMm, leftMm, rightMm, bottomMm } = wall
  const arc = (sweep: 0 | 1) => {
    const px = Math.round(foot.arcMm * wall.pxPerMm * 100) / 100
    return foot.arcMm > 0 ? `A${px} ${px} 0 0 ${sweep} ` : 'L'
  }
  const near = [
    `M${place(rightMm, depthMm)}L${place(Math.max(depthMm * tanDraft, foot.uMm), depthMm)}`,
    `L${place(foot.uMm, foot.hMm)}${arc(1)}${place(-foot.inMm, 0)}`,
  ].join('')
  const far =
    farMm === null
      ? `L${place(leftMm, 0)}`
      : [
          foot.pointMm > 0 ? `L${place(farMm / 2, -foot.pointMm)}` : '',
          `L${place(farMm + foot.inMm, 0)}${arc(1)}${place(farMm - foot.uMm, foot.hMm)}`,
          `L${place(farMm - Math.max(depthMm * tanDraft, foot.uMm), depthMm)}L${place(leftMm, depthMm)}`,
        ].join('')
  const edges = near + far
  return {
    edges,
    area: `${edges}L${place(leftMm, bottomMm)}L${place(rightMm, bottomMm)}Z`,
    breaks: [upright(rightMm, depthMm, bottomMm), upright(leftMm, farMm === null ? 0 : depthMm, bottomMm)],
  }
}

function throughPaths(wall: Wall, place: Place, upright: Upright): MaterialPath[] {
  const { depthMm, tanDraft, undersideMm, farMm, leftMm, rightMm } = wall
  const side = (outerMm: number, at: (hMm: number) => number): MaterialPath => {
    const edges = `M${place(outerMm, depthMm)}L${place(at(depthMm), depthMm)}L${place(at(undersideMm), undersideMm)}L${place(outerMm, undersideMm)}`
    return { edges, area: `${edges}Z`, breaks: [upright(outerMm, depthMm, undersideMm)] }
  }
  const near = side(rightMm, (hMm) => hMm * tanDraft)
  return farMm === null ? [near] : [near, side(leftMm, (hMm) => farMm - hMm * tanDraft)]
}
