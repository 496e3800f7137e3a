import { memo } from 'react'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { AngleDimension } from '../drawing/angle-dimension'
import { DimensionLine } from '../drawing/dimension-line'
import { dimensionSpacing } from '../drawing/drafting-style'
import { LeaderLine } from '../drawing/leader-line'
import { OpenDimension } from '../drawing/open-dimension'
import { farWallMm, isNarrow, onSheet, type SectionLayout } from './section-layout'
import { type SectionScene, topFaceMm } from './section-scene'
import { toolTransform, toolY } from './section-tool'

export interface SectionDimensionsProps {
  scene: SectionScene
  layout: SectionLayout
  unit: LengthUnit
  /** null where it is without limit, or there is no answer. */
  reachMm: number | null
}

/** The figures of the part: depth and reach at its side, draft and tilt at their angles. */
export const PartDimensions = memo(function PartDimensions({
  scene,
  layout,
  unit,
  reachMm,
}: SectionDimensionsProps) {
  const { at, feature } = scene
  const said = (mm: number) => formatLength(mm, unit, { withUnit: false })
  const footMm = topFaceMm(at) - feature.depthMm
  const x = layout.right
  const leadMm = at.kind === 'wall' ? at.leadMm : 0
  const reachTop = reachMm === null ? null : onSheet(layout, 0, reachMm + leadMm).y
  const isReachSeen = reachTop !== null && reachTop > 14 && reachMm !== null && reachMm > 0
  const floor = onSheet(layout, 0, footMm).y
  return (
    <g>
      {isReachSeen && reachTop !== null && reachMm !== null ? (
        <DimensionLine
          axis="vertical"
          from={{ x, y: onSheet(layout, 0, leadMm).y }}
          to={{ x, y: reachTop }}
          at={x + 2 * dimensionSpacing}
          symbol="reach"
          text={said(reachMm)}
        />
      ) : null}
      <DimensionLine
        axis="vertical"
        from={{ x, y: floor }}
        to={{ x, y: onSheet(layout, 0, topFaceMm(at)).y }}
        at={x + dimensionSpacing}
        symbol="depth"
        text={said(feature.depthMm)}
        overflow={at.kind === 'wall' && at.obstacles.length > 0 ? 'start' : 'end'}
      />
      <FeatureWidths scene={scene} layout={layout} unit={unit} />
      <Setbacks scene={scene} layout={layout} unit={unit} />
      <InsideCorner scene={scene} layout={layout} unit={unit} />
      <Angles scene={scene} layout={layout} />
    </g>
  )
})

/** The width of an opening or a hole, and how far the tallest obstacle stands above the top face. */
function FeatureWidths({ scene, layout, unit }: Omit<SectionDimensionsProps, 'reachMm'>) {
  const { at, feature } = scene
  const said = (mm: number) => formatLength(mm, unit, { withUnit: false })
  const farMm = farWallMm(scene)
  const riseMm = at.kind === 'wall' ? Math.max(0, ...at.obstacles.map((obstacle) => obstacle.riseMm)) : 0
  const topMm = topFaceMm(at)
  return (
    <g>
      {farMm === null ? null : (
        <DimensionLine
          axis="horizontal"
          from={onSheet(layout, farMm, 0)}
          to={onSheet(layout, 0, 0)}
          at={onSheet(layout, 0, -at.leadMm).y + dimensionSpacing}
          symbol={feature.kind === 'hole' ? 'Ø' : 'opening'}
          text={said(-farMm)}
          overflow={insideCornerMm(scene) === null ? 'end' : 'start'}
        />
      )}
      {riseMm > 0 ? (
        <DimensionLine
          axis="vertical"
          from={{ x: layout.right, y: onSheet(layout, 0, topMm).y }}
          to={{ x: layout.right, y: onSheet(layout, 0, topMm + riseMm).y }}
          at={layout.right + dimensionSpacing}
          symbol="rises"
          text={said(riseMm)}
        />
      ) : null}
    </g>
  )
}

const setbacksAtMost = 3

/** How far behind the wall's top edge each obstacle stands, under the face it stands on, the nearest first. */
function Setbacks({ scene, layout, unit }: Omit<SectionDimensionsProps, 'reachMm'>) {
  const { at } = scene
  if (at.kind === 'hole') return null
  const topMm = topFaceMm(at)
  const edgeMm = topMm * at.tanDraft
  const top = onSheet(layout, 0, topMm).y
  // On a wide sheet the words of the first touch stand right under the face.
  const first = isNarrow(layout.sheet) ? dimensionSpacing : 2 * dimensionSpacing
  const setbacks = [...new Set(at.obstacles.map(({ setbackMm }) => setbackMm))]
    .filter((setbackMm) => setbackMm > 0)
    .sort((one, other) => one - other)
    .slice(0, setbacksAtMost)
  return (
    <g>
      {setbacks.map((setbackMm, index) => (
        <DimensionLine
          key={setbackMm}
          axis="horizontal"
          from={onSheet(layout, edgeMm, topMm)}
          to={onSheet(layout, edgeMm + setbackMm, topMm)}
          at={Math.min(top + first, layout.bottom - dimensionSpacing) + index * dimensionSpacing}
          symbol={isNarrow(layout.sheet) ? 'back' : 'set back'}
          text={formatLength(setbackMm, unit, { withUnit: false })}
        />
      ))}
    </g>
  )
}

/** The section runs past the corner, so its radius is a note at the foot of the wall. */
function InsideCorner({ scene, layout, unit }: Omit<SectionDimensionsProps, 'reachMm'>) {
  const radiusMm = insideCornerMm(scene)
  if (radiusMm === null) return null
  const foot = onSheet(layout, 0, 0)
  return (
    <LeaderLine
      target={{ x: foot.x, y: foot.y - cornerNoteRise }}
      shoulder={{ x: foot.x + cornerNoteOut, y: foot.y + cornerNoteDrop }}
      symbol={isNarrow(layout.sheet) ? 'corner' : 'inside corner'}
      text={`R${formatLength(radiusMm, unit, { withUnit: false })}`}
    />
  )
}

const cornerNoteRise = 10
const cornerNoteOut = 18
const cornerNoteDrop = 18

/** The radius of the wall's inside corner; null where there is none to be kept. */
function insideCornerMm({ feature }: SectionScene): number | null {
  return feature.kind === 'wall' && feature.insideCornerRadiusMm ? feature.insideCornerRadiusMm : null
}

function Angles({ scene, layout }: Pick<SectionDimensionsProps, 'scene' | 'layout'>) {
  const { at } = scene
  if (at.kind === 'hole') return null
  const heightPx = topFaceMm(at) * layout.pxPerMm
  const draftRadius = Math.max(44, heightPx * 0.74)
  const tiltRadius = Math.max(90, (layout.cutZMm * 0.62 - layout.turn.zMm) * layout.pxPerMm)
  const turn = onSheet(layout, layout.turn.uMm, layout.turn.hMm)
  return (
    <g>
      {at.draftDeg > 0 ? (
        <AngleDimension
          vertex={onSheet(layout, 0, 0)}
          radius={draftRadius}
          fromDeg={-90}
          toDeg={-90 + at.draftDeg}
          labelDeg={besideDeg(-90 + at.draftDeg, draftRadius)}
          symbol="draft"
          text={formatAngle(at.draftDeg)}
        />
      ) : null}
      {at.tiltDeg > 0 ? (
        <AngleDimension
          vertex={turn}
          radius={tiltRadius}
          fromDeg={-90 - at.tiltDeg}
          toDeg={-90}
          labelDeg={beforeDeg(-90, tiltRadius)}
          symbol="tilt"
          text={formatAngle(at.tiltDeg)}
        />
      ) : null}
    </g>
  )
}

const labelGap = 16
const firstLine = 24
const uprightTextDeg = 15

/** Past the end of an arc, clear of the tool that stands in its middle. */
function besideDeg(toDeg: number, radius: number): number {
  return toDeg + (labelGap / radius) * (180 / Math.PI)
}

const endGap = 4
/** Nearer to the top a figure beyond the end of its line would run into the scale. */
const roomAtTop = 96

/** Just before the end of an arc, over it: past the end the wall would run through the figure. */
function beforeDeg(toDeg: number, radius: number): number {
  return toDeg - (endGap / radius) * (180 / Math.PI)
}

/** The figures of the tool, along its own axis: stick-out beside the cutter, grip and gauge length outside the chuck. */
export const ToolDimensions = memo(function ToolDimensions({
  scene,
  layout,
  unit,
  isStickOutOutside = false,
}: Omit<SectionDimensionsProps, 'reachMm'> & {
  /** The stick-out stands outside the chuck too: where the whole is drawn, its figure would lie on the nut. */
  isStickOutOutside?: boolean
}) {
  const { noseMm, overallMm, gaugeLineMm } = scene.heights
  const said = (mm: number) => formatLength(mm, unit, { withUnit: false })
  // Figures are read from below or from the right: past a lean they are turned about to stay so.
  const turn = layout.turn.tiltDeg > uprightTextDeg ? -1 : 1
  const edge = -layout.toolRadiusMm * layout.pxPerMm
  const cutterEdge = -Math.max(scene.cutter.radiusMm, scene.cutter.shankRadiusMm) * layout.pxPerMm
  const outside = edge - firstLine
  const turnY = onSheet(layout, layout.turn.uMm, layout.turn.hMm).y
  const stickOutLine = isStickOutOutside ? outside - dimensionSpacing : cutterEdge - firstLine
  const gaugeLine = outside - (isStickOutOutside ? 2 : 1) * dimensionSpacing
  const place = (zMm: number, x: number) => ({ x: turn * x, y: turn * toolY(layout, zMm) })
  const dimension = (fromMm: number, toMm: number, line: number, symbol: string) => {
    const from = place(fromMm, fromMm === 0 ? cutterEdge : edge)
    const common = { from, at: turn * line, symbol, text: said(toMm - fromMm) }
    return toMm <= layout.cutZMm ? (
      <DimensionLine
        {...common}
        axis="vertical"
        to={place(toMm, toMm === noseMm ? line : edge)}
        overflow={turn > 0 && place(toMm, edge).y + turnY > roomAtTop ? 'end' : 'start'}
      />
    ) : (
      <OpenDimension {...common} toY={turn * toolY(layout, layout.cutZMm)} />
    )
  }
  return (
    <g transform={`${toolTransform(layout)}${turn < 0 ? ' rotate(180)' : ''}`}>
      {noseMm === null ? (
        dimension(0, overallMm, cutterEdge - firstLine, 'OAL')
      ) : (
        <>
          {dimension(0, noseMm, stickOutLine, 'stick-out')}
          {overallMm > noseMm ? dimension(noseMm, overallMm, outside, 'grip') : null}
        </>
      )}
      {gaugeLineMm === null ? null : dimension(0, gaugeLineMm, gaugeLine, 'gauge length')}
    </g>
  )
})
