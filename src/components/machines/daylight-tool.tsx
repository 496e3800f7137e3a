import { ChainLine } from '@/components/drawing/chain-line'
import { DimensionLine } from '@/components/drawing/dimension-line'
import { chainDashes, hiddenDashes, lineWidths } from '@/components/drawing/drafting-style'
import { DraftingText } from '@/components/drawing/drafting-text'
import { TurnedBody } from '@/components/drawing/turned-body'
import { formatLength } from '@/lib/format-length'
import { type DaylightTool, deepestTipMm, uprightFrame, widestRadiusMm } from './daylight-layout'
import { Cross, type DaylightPartProps, StruckText } from './daylight-standing'

interface ToolProps extends DaylightPartProps {
  tool: DaylightTool
}

const headPx = 40
const labelPx = 18
/** Where the nose is not known it is drawn as wide as this, in mm. */
const noseSignMm = 80

/** Gauge line with Z at the top and at the bottom of its travel. */
export function GaugeLines({ scene, layout }: DaylightPartProps) {
  const { left, right, yOf, retractX, depthX, lowestGaugeLineMm, pxPerMm } = layout
  const half = ((scene.spindleNoseDiameterMm ?? noseSignMm) / 2) * pxPerMm
  const top = yOf(scene.gaugeLineToTableMm)
  const bottom = yOf(lowestGaugeLineMm)
  const retractY = yOf(layout.retractMm)
  // The two names stand apart where the two lines hardly do.
  const isBelow = bottom >= retractY && bottom - retractY < labelPx
  return (
    <>
      <path
        d={`M${retractX - half} ${top - headPx}V${top}H${retractX + half}V${top - headPx}`}
        fill="var(--well)"
        stroke="var(--ink)"
        strokeWidth={lineWidths.outline}
      />
      <ChainLine from={{ x: left - 14, y: top }} to={{ x: right + 14, y: top }} />
      <DraftingText x={right + 14} y={top - 5} anchor="end" text="Gauge line, Z up" />
      {lowestGaugeLineMm > 0 ? (
        <>
          <path
            d={`M${left - 14} ${bottom}H${right + 14}`}
            stroke="var(--ink-soft)"
            strokeWidth={lineWidths.thin}
            strokeDasharray={chainDashes}
          />
          <DraftingText x={left - 10} y={isBelow ? bottom + 13 : bottom - 5} anchor="start" text="Z down" />
        </>
      ) : null}
      <ChainLine
        from={{ x: retractX, y: top - headPx - 6 }}
        to={{ x: retractX, y: yOf(layout.retractMm) + 10 }}
      />
      <ChainLine
        from={{ x: depthX, y: Math.min(bottom, yOf(scene.window.highestMm)) - 20 }}
        to={{ x: depthX, y: yOf(scene.lowestTipMm) + 8 }}
      />
    </>
  )
}

export function RetractPlane({ layout }: DaylightPartProps) {
  const { left, right, yOf, retractMm, lowestGaugeLineMm } = layout
  const y = yOf(retractMm)
  const down = yOf(lowestGaugeLineMm)
  const isBelow = y > down && y - down < labelPx
  return (
    <>
      <path
        d={`M${left - 14} ${y}H${right + 14}`}
        stroke="var(--ink)"
        strokeWidth={lineWidths.thin * 1.3}
        strokeDasharray={hiddenDashes}
      />
      <DraftingText x={left - 10} y={isBelow ? y + 13 : y - 5} anchor="start" text="Retract" />
    </>
  )
}

/** The tool with Z at the top: its tip has to stay above the retract height. */
export function RetractTool({ scene, layout, tool, unit }: ToolProps) {
  const { yOf, retractX } = layout
  const tipMm = scene.gaugeLineToTableMm - tool.gaugeLengthMm
  const isTooLong = tool.fit.verdict === 'tooLong'
  const halfPx = widestRadiusMm(tool) * layout.pxPerMm
  return (
    <>
      <TurnedBody
        parts={tool.parts}
        toSheet={uprightFrame(layout, retractX, tipMm)}
        stroke={isTooLong ? 'var(--collision)' : 'var(--ink)'}
      />
      <DimensionLine
        axis="vertical"
        from={{ x: retractX, y: yOf(scene.gaugeLineToTableMm) }}
        to={{ x: retractX, y: yOf(tipMm) }}
        at={Math.round(retractX - halfPx - 16)}
        text={formatLength(tool.gaugeLengthMm, unit, { withUnit: false })}
      />
      {isTooLong ? (
        <>
          <Cross x={retractX} y={yOf(tipMm)} />
          <StruckText
            x={retractX + 12}
            y={yOf(tipMm) + 5}
            anchor="start"
            text={`too long by ${formatLength(tool.fit.byMm, unit)}`}
          />
        </>
      ) : null}
    </>
  )
}

/** The tool as far down as it is to go, or as far as it gets. */
export function DepthTool({ scene, layout, tool, unit }: ToolProps) {
  const { yOf, depthX, pxPerMm } = layout
  const tipMm = deepestTipMm(scene, layout, tool.gaugeLengthMm)
  const shortMm = tipMm - scene.lowestTipMm
  const gaugeLineY = yOf(tipMm + tool.gaugeLengthMm)
  const half = ((scene.spindleNoseDiameterMm ?? noseSignMm) / 2) * pxPerMm
  return (
    <>
      <path
        d={`M${depthX - half} ${gaugeLineY - headPx}V${gaugeLineY}H${depthX + half}V${gaugeLineY - headPx}`}
        fill="none"
        stroke="var(--ink-soft)"
        strokeWidth={lineWidths.thin}
        strokeDasharray={hiddenDashes}
      />
      <TurnedBody
        parts={tool.parts}
        toSheet={uprightFrame(layout, depthX, tipMm)}
        stroke={shortMm > 0 ? 'var(--collision)' : 'var(--ink)'}
      />
      {shortMm > 0 ? (
        <>
          <Cross x={depthX} y={yOf(tipMm)} />
          <StruckText
            x={depthX + 12}
            y={yOf(tipMm - shortMm / 2) + 5}
            anchor="start"
            text={`short by ${formatLength(shortMm, unit)}`}
          />
        </>
      ) : null}
    </>
  )
}
