import { ChainLine } from '@/components/drawing/chain-line'
import { draftingTextWidth, hiddenDashes, lineWidths } from '@/components/drawing/drafting-style'
import { DraftingText } from '@/components/drawing/drafting-text'
import { sweptRadiusMm } from '@/core/machine/rotary-stock'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import {
  type DaylightLayout,
  type DaylightScene,
  type DaylightStock,
  type DaylightTool,
  widestRadiusMm,
} from './daylight-layout'

export interface DaylightPartProps {
  scene: DaylightScene
  layout: DaylightLayout
  unit: LengthUnit
}

interface HatchedPartProps extends DaylightPartProps {
  hatchId: string
}

const tablePx = 20

export function Table({ layout, hatchId }: HatchedPartProps) {
  const { left, right, yOf } = layout
  const y = yOf(0)
  return (
    <>
      <rect x={left - 14} y={y} width={right - left + 28} height={tablePx} fill={`url(#${hatchId})`} />
      <path
        d={`M${left - 14} ${y}H${right + 14}`}
        stroke="var(--ink)"
        strokeWidth={lineWidths.outline}
        fill="none"
      />
    </>
  )
}

/** Fixtures, the part or the rotary stock. */
export function Standing(props: HatchedPartProps & { tool: DaylightTool | null }) {
  const { scene } = props
  return (
    <>
      {scene.fixtures.map((fixture, index) => (
        <Fixture key={fixture.key} {...props} fixture={fixture} rank={index} />
      ))}
      <Part {...props} />
      {scene.rotaryStock ? <RotaryStock {...props} stock={scene.rotaryStock} /> : null}
    </>
  )
}

function Fixture({
  layout,
  fixture,
  rank,
}: DaylightPartProps & { fixture: DaylightScene['fixtures'][number]; rank: number }) {
  const { left, right, yOf } = layout
  const inset = Math.min(6 + rank * 12, (right - left) / 5)
  const top = yOf(fixture.baseMm + fixture.heightMm)
  const bottom = yOf(fixture.baseMm)
  const width = right - left - 2 * inset
  const isWritten = bottom - top > 17 && draftingTextWidth(fixture.code) < width - 8
  return (
    <>
      <rect
        x={left + inset}
        y={top}
        width={width}
        height={bottom - top}
        fill="var(--well)"
        stroke="var(--ink)"
        strokeWidth={lineWidths.outline}
      />
      {isWritten ? (
        <DraftingText x={left + inset + 6} y={bottom - 5} anchor="start" text={fixture.code} />
      ) : null}
    </>
  )
}

/** From what it stands on up to the highest thing named, with the cut down to the lowest tip open. */
function Part({ scene, layout, hatchId, tool }: HatchedPartProps & { tool: DaylightTool | null }) {
  const { yOf, pxPerMm, retractX, depthX, right } = layout
  const baseMm = Math.max(0, ...scene.fixtures.map(({ baseMm, heightMm }) => baseMm + heightMm))
  const isShown = scene.rotaryStock === null && scene.highestMm > baseMm
  // The cut is a sign too, and wide enough for what goes down it: whether that clears the walls is the reach's to say.
  const cutHalf = Math.max(17, tool ? widestRadiusMm(tool) * pxPerMm + 7 : 0)
  const [from, to] = [retractX - 34, Math.min(depthX + cutHalf + 35, right + 6)]
  const top = yOf(scene.highestMm)
  return (
    <>
      {isShown ? (
        <rect
          x={from}
          y={top}
          width={to - from}
          height={yOf(baseMm) - top}
          fill={`url(#${hatchId})`}
          stroke="var(--ink)"
          strokeWidth={lineWidths.outline}
        />
      ) : null}
      {scene.rotaryStock === null ? (
        <path
          d={`M${depthX - cutHalf} ${yOf(scene.window.highestMm)}V${yOf(scene.lowestTipMm)}H${depthX + cutHalf}V${yOf(scene.window.highestMm)}`}
          fill="var(--sheet)"
          stroke="var(--ink)"
          strokeWidth={lineWidths.outline}
        />
      ) : null}
    </>
  )
}

/** Seen along its axis: the stock cut through, the finished part in it, and the circle its corners sweep. */
function RotaryStock({ scene, layout, stock, hatchId, unit }: HatchedPartProps & { stock: DaylightStock }) {
  const { yOf, pxPerMm, depthX } = layout
  const axisY = yOf(stock.axisHeightMm)
  const sweptPx = (scene.window.sweptRadiusMm ?? 0) * pxPerMm
  const cornersPx = sweptRadiusMm({ ...stock, chuckRadiusMm: null }) * pxPerMm
  const halfWidth = (stock.widthMm / 2) * pxPerMm
  const halfHeight = (stock.heightMm / 2) * pxPerMm
  const x = depthX - (stock.offsetXMm ?? 0) * pxPerMm
  const y = axisY + (stock.offsetYMm ?? 0) * pxPerMm
  return (
    <>
      {stock.chuckRadiusMm ? (
        <circle
          cx={depthX}
          cy={axisY}
          r={stock.chuckRadiusMm * pxPerMm}
          fill="var(--well)"
          stroke="var(--ink)"
          strokeWidth={lineWidths.thin}
        />
      ) : null}
      <rect
        x={x - halfWidth}
        y={y - halfHeight}
        width={2 * halfWidth}
        height={2 * halfHeight}
        fill="var(--sheet)"
      />
      <rect
        x={x - halfWidth}
        y={y - halfHeight}
        width={2 * halfWidth}
        height={2 * halfHeight}
        fill={`url(#${hatchId})`}
        stroke="var(--ink)"
        strokeWidth={lineWidths.outline}
      />
      {stock.partDiameterMm === null ? null : (
        <circle
          cx={depthX}
          cy={axisY}
          r={(stock.partDiameterMm / 2) * pxPerMm}
          fill="none"
          stroke="var(--ink)"
          strokeWidth={lineWidths.thin}
        />
      )}
      <circle
        cx={depthX}
        cy={axisY}
        r={cornersPx}
        fill="none"
        stroke="var(--ink)"
        strokeWidth={lineWidths.thin * 1.3}
        strokeDasharray={hiddenDashes}
      />
      <ChainLine from={{ x: depthX - sweptPx - 8, y: axisY }} to={{ x: depthX + sweptPx + 8, y: axisY }} />
      <ChainLine from={{ x: depthX, y: axisY - sweptPx - 8 }} to={{ x: depthX, y: axisY + sweptPx + 8 }} />
      <DraftingText
        x={depthX - sweptPx * 0.72 - 6}
        y={axisY - sweptPx * 0.72 - 4}
        anchor="end"
        text={`R${formatLength(scene.window.sweptRadiusMm ?? 0, unit, { withUnit: false })} swept`}
      />
    </>
  )
}

/** The arc that comes nearer to the table than the clearance, and a cross where it is nearest. */
export function TableStrike({ scene, layout, unit }: DaylightPartProps) {
  const { window, rotaryStock, retractClearanceMm } = scene
  const { sweptRadiusMm, tableClearanceMm } = window
  if (!rotaryStock || sweptRadiusMm === null || tableClearanceMm === null || window.tableStrikeMm === 0)
    return null
  const { yOf, pxPerMm, depthX } = layout
  const dropMm = Math.max(-sweptRadiusMm, rotaryStock.axisHeightMm - retractClearanceMm)
  const half = Math.sqrt(Math.max(0, sweptRadiusMm ** 2 - dropMm ** 2)) * pxPerMm
  const y = yOf(rotaryStock.axisHeightMm - dropMm)
  const bottomY = yOf(tableClearanceMm)
  const r = sweptRadiusMm * pxPerMm
  const words =
    tableClearanceMm < 0
      ? `strikes the table by ${formatLength(-tableClearanceMm, unit)}`
      : `${formatLength(tableClearanceMm, unit)} off the table`
  return (
    <>
      <path
        d={`M${depthX - half} ${y}A${r} ${r} 0 ${dropMm < 0 ? 1 : 0} 0 ${depthX + half} ${y}`}
        fill="none"
        stroke="var(--collision)"
        strokeWidth={lineWidths.outline * 1.5}
      />
      <Cross x={depthX} y={bottomY} />
      <StruckText x={depthX} y={Math.max(bottomY, yOf(0)) + tablePx + 16} text={words} anchor="middle" />
    </>
  )
}

export function Cross({ x, y }: { x: number; y: number }) {
  return (
    <path
      d={`M${x - 6} ${y - 6}L${x + 6} ${y + 6}M${x + 6} ${y - 6}L${x - 6} ${y + 6}`}
      stroke="var(--collision)"
      strokeWidth={2.6}
      strokeLinecap="round"
    />
  )
}

export function StruckText({
  x,
  y,
  text,
  anchor,
}: {
  x: number
  y: number
  text: string
  anchor: 'start' | 'middle' | 'end'
}) {
  return (
    <text
      x={x}
      y={y}
      textAnchor={anchor}
      fontSize={13}
      fontWeight={700}
      fill="var(--collision)"
      stroke="var(--sheet)"
      strokeWidth={4}
      strokeLinejoin="round"
      paintOrder="stroke"
    >
      {text}
    </text>
  )
}
