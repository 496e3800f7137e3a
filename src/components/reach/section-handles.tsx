'use client'

import type { LengthUnit } from '@/core/units/length-unit'
import { mmPerInch } from '@/core/units/length-unit'
import { formatAngle } from '@/lib/format-angle'
import { sentenceLength } from '@/lib/reach-sentences'
import { DragHandle } from './drag-handle'
import { onSheet, type SectionLayout, toolOnSheet } from './section-layout'
import { type SectionScene, topFaceMm } from './section-scene'

export interface SectionChanges {
  onStickOut: (mm: number) => void
  onDepth: (mm: number) => void
  onDraft: (deg: number) => void
  onTilt: (deg: number) => void
}

export interface SectionHandlesProps extends SectionChanges {
  scene: SectionScene
  layout: SectionLayout
  unit: LengthUnit
  stickOutStepMm: number
  onHold: (isHeld: boolean) => void
}

const angleStepDeg = 0.5
const draftLimitDeg = 59.5
const tiltLimitDeg = 85
const leverPx = 60
const deepestMm = 1000

/** Depths are stepped by half a millimetre or two hundredths of an inch. */
function depthStepMm(unit: LengthUnit): number {
  return unit === 'mm' ? 0.5 : 0.02 * mmPerInch
}

function degrees(rad: number): number {
  return (rad * 180) / Math.PI
}

/** What of the drawing can be taken hold of: the nose, the top face, the wall and the axis. */
export function SectionHandles(props: SectionHandlesProps) {
  const { scene, layout } = props
  const { at, feature } = scene
  const isOpenWall =
    feature.kind === 'wall' &&
    at.kind === 'wall' &&
    at.obstacles.length === 0 &&
    feature.openingWidthMm == null &&
    feature.insideCornerRadiusMm == null
  return (
    <>
      {scene.heights.noseMm === null || scene.heights.noseMm > layout.cutZMm ? null : (
        <StickOutHandle {...props} noseMm={scene.heights.noseMm} />
      )}
      <DepthHandle {...props} />
      {feature.kind === 'wall' && at.kind === 'wall' ? (
        <DraftHandle {...props} draftDeg={at.draftDeg} />
      ) : null}
      {isOpenWall && scene.cutter.hasSphericalTip && at.kind === 'wall' ? (
        <TiltHandle {...props} tiltDeg={at.tiltDeg} />
      ) : null}
    </>
  )
}

function StickOutHandle({
  scene,
  layout,
  unit,
  stickOutStepMm,
  onStickOut,
  onHold,
  noseMm,
}: SectionHandlesProps & { noseMm: number }) {
  const nose = scene.parts.find(({ part }) => part === 'extension' || part === 'nut' || part === 'holder')
  const radiusMm = nose?.segments.find(({ toRadiusMm }) => toRadiusMm > 0)?.toRadiusMm ?? 0
  const tilt = (layout.turn.tiltDeg * Math.PI) / 180
  return (
    <DragHandle
      label="Stick-out"
      at={toolOnSheet(layout, -Math.max(radiusMm * 0.6, scene.cutter.shankRadiusMm * 1.4), noseMm)}
      directionDeg={-90 - layout.turn.tiltDeg}
      value={noseMm}
      valueText={sentenceLength(noseMm, unit)}
      minimum={stickOutStepMm}
      maximum={scene.cutter.overallLengthMm}
      step={stickOutStepMm}
      valueAfter={({ x, y }) => noseMm + (-y * Math.cos(tilt) - x * Math.sin(tilt)) / layout.pxPerMm}
      onChange={onStickOut}
      onHold={onHold}
    />
  )
}

function DepthHandle({ scene, layout, unit, onDepth, onHold }: SectionHandlesProps) {
  const { depthMm } = scene.feature
  const topMm = topFaceMm(scene.at)
  const step = depthStepMm(unit)
  return (
    <DragHandle
      label="Depth"
      at={{ x: layout.right - 14, y: onSheet(layout, 0, topMm).y }}
      directionDeg={-90}
      value={depthMm}
      valueText={sentenceLength(depthMm, unit)}
      minimum={step}
      maximum={Math.max(deepestMm, depthMm)}
      step={step}
      valueAfter={({ y }) => depthMm - y / layout.pxPerMm}
      onChange={onDepth}
      onHold={onHold}
    />
  )
}

function DraftHandle({
  scene,
  layout,
  onDraft,
  onHold,
  draftDeg,
}: SectionHandlesProps & { draftDeg: number }) {
  const atMm = topFaceMm(scene.at) * 0.45
  const draft = (draftDeg * Math.PI) / 180
  const leverHeight = Math.max(leverPx, atMm * layout.pxPerMm)
  return (
    <DragHandle
      label="Draft"
      at={onSheet(layout, atMm * Math.tan(draft), atMm)}
      directionDeg={0}
      value={draftDeg}
      valueText={formatAngle(draftDeg)}
      minimum={0}
      maximum={draftLimitDeg}
      step={angleStepDeg}
      valueAfter={({ x }) => degrees(Math.atan2(leverHeight * Math.tan(draft) + x, leverHeight))}
      onChange={onDraft}
      onHold={onHold}
    />
  )
}

function TiltHandle({ scene, layout, onTilt, onHold, tiltDeg }: SectionHandlesProps & { tiltDeg: number }) {
  const { at, cutter } = scene
  const draftDeg = at.kind === 'wall' ? at.draftDeg : 0
  const maximum = Math.min(tiltLimitDeg, 89.5 - draftDeg, 90 - cutter.taperHalfAngleDeg)
  const up = { x: layout.turn.uMm, y: layout.turn.hMm }
  const pivot = onSheet(layout, up.x, up.y)
  const handle = toolOnSheet(layout, 0, layout.cutZMm)
  const lever = { x: handle.x - pivot.x, y: handle.y - pivot.y }
  return (
    <DragHandle
      label="Tilt"
      at={handle}
      directionDeg={-tiltDeg}
      value={tiltDeg}
      valueText={formatAngle(tiltDeg)}
      minimum={0}
      maximum={maximum}
      step={angleStepDeg}
      valueAfter={({ x, y }) => degrees(Math.atan2(-(lever.x + x), -(lever.y + y)))}
      onChange={onTilt}
      onHold={onHold}
    />
  )
}
