'use client'

import { useId } from 'react'
import { DrawingSheet } from '@/components/drawing/drawing-sheet'
import { HatchPattern } from '@/components/drawing/hatch-pattern'
import { ScaleBar } from '@/components/drawing/scale-bar'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import { fitSentence, strikeSentence, windowSentences } from '@/lib/machine-sentences'
import { HeightDimensions, WindowDimensions } from './daylight-dimensions'
import { type DaylightScene, type DaylightTool, daylightLayout } from './daylight-layout'
import { Standing, Table, TableStrike } from './daylight-standing'
import { DepthTool, GaugeLines, RetractPlane, RetractTool } from './daylight-tool'

export interface DaylightDrawingProps {
  code: string
  scene: DaylightScene
  tool: DaylightTool | null
  unit: LengthUnit
}

/** The daylight of a machine: what stands on its table, how far the spindle comes down, and the tool in both places. */
export function DaylightDrawing({ code, scene, tool, unit }: DaylightDrawingProps) {
  const hatchId = useId()
  return (
    <DrawingSheet
      code={code}
      unit={unit}
      sentence={daylightSentence(scene, tool, unit)}
      note="Heights to scale; widths of part and fixtures drawn as a sign"
      draw={(width) => {
        const layout = daylightLayout(scene, width)
        const shared = { scene, layout, unit }
        return {
          height: layout.height,
          scaleName: layout.scaleName,
          body: (
            <>
              <defs>
                <HatchPattern id={hatchId} />
                <HatchPattern id={`${hatchId}-stock`} spacing={6} isMirrored />
              </defs>
              <Table {...shared} hatchId={hatchId} />
              <Standing {...shared} tool={tool} hatchId={`${hatchId}-stock`} />
              <GaugeLines {...shared} />
              {tool ? <DepthTool {...shared} tool={tool} /> : null}
              <RetractPlane {...shared} />
              {tool ? <RetractTool {...shared} tool={tool} /> : <WindowDimensions {...shared} />}
              <HeightDimensions {...shared} />
              <TableStrike {...shared} />
              <ScaleBar x={14} y={layout.height - 14} pxPerMm={layout.pxPerMm} unit={unit} />
            </>
          ),
        }
      }}
    />
  )
}

/** The drawing as it is read aloud. */
function daylightSentence(scene: DaylightScene, tool: DaylightTool | null, unit: LengthUnit): string {
  const said = (mm: number) => formatLength(mm, unit)
  const { window, rotaryStock, fixtures } = scene
  const standing = [
    ...fixtures.map(
      ({ code, baseMm, heightMm }) =>
        `fixture ${code} from ${said(baseMm)} to ${said(baseMm + heightMm)} above it`,
    ),
    ...(rotaryStock && window.sweptRadiusMm !== null
      ? [
          `rotary stock ${said(rotaryStock.widthMm)} by ${said(rotaryStock.heightMm)} on an axis ${said(rotaryStock.axisHeightMm)} high, sweeping a circle of radius ${said(window.sweptRadiusMm)}`,
        ]
      : []),
  ]
  return [
    `Drawing of the daylight: gauge line ${said(scene.gaugeLineToTableMm)} above the table with Z at the top, ${said(scene.zTravelMm)} of travel down.`,
    standing.length > 0 ? `On the table: ${standing.join('; ')}.` : '',
    `The highest thing stands ${said(window.highestMm)} high, the retract ${said(scene.retractClearanceMm)} above it; the lowest tip position is ${said(scene.lowestTipMm)}.`,
    ...(tool
      ? [fitSentence(tool.fit, tool.gaugeLengthMm, unit), strikeSentence(window, unit) ?? '']
      : windowSentences(window, unit)),
  ]
    .filter((sentence) => sentence !== '')
    .join(' ')
}
