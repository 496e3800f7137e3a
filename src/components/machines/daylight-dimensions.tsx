import { DimensionLine } from '@/components/drawing/dimension-line'
import { formatLength } from '@/lib/format-length'
import type { DaylightPartProps } from './daylight-standing'

/** What the machine has, on the left; what stands on it, on the right. */
export function HeightDimensions({ scene, layout, unit }: DaylightPartProps) {
  const { left, right, yOf, retractMm, lowestGaugeLineMm } = layout
  const figure = (mm: number) => formatLength(mm, unit, { withUnit: false })
  const table = yOf(0)
  const at = (x: number, heightMm: number) => ({ x, y: yOf(heightMm) })
  return (
    <>
      <DimensionLine
        axis="vertical"
        from={{ x: left - 14, y: table }}
        to={at(left - 14, scene.gaugeLineToTableMm)}
        at={left - 46}
        text={figure(scene.gaugeLineToTableMm)}
      />
      <DimensionLine
        axis="vertical"
        from={at(left - 14, lowestGaugeLineMm)}
        to={at(left - 14, scene.gaugeLineToTableMm)}
        at={left - 22}
        text={figure(scene.zTravelMm)}
        symbol="Z"
      />
      {scene.lowestTipMm > 0 ? (
        <DimensionLine
          axis="vertical"
          from={{ x: right + 14, y: table }}
          to={at(right + 14, scene.lowestTipMm)}
          at={right + 32}
          text={figure(scene.lowestTipMm)}
        />
      ) : null}
      <DimensionLine
        axis="vertical"
        from={{ x: right + 14, y: table }}
        to={at(right + 14, scene.window.highestMm)}
        at={right + 56}
        text={figure(scene.window.highestMm)}
      />
      {scene.retractClearanceMm > 0 ? (
        <DimensionLine
          axis="vertical"
          from={at(right + 14, scene.window.highestMm)}
          to={at(right + 14, retractMm)}
          at={right + 80}
          text={figure(scene.retractClearanceMm)}
        />
      ) : null}
    </>
  )
}

/** The longest and the shortest gauge length, where no tool is shown. */
export function WindowDimensions({ scene, layout, unit }: DaylightPartProps) {
  const { retractX, depthX, yOf, lowestGaugeLineMm } = layout
  const { shortest, longest } = scene.window.gaugeLengthMm
  const figure = (mm: number) => formatLength(mm, unit, { withUnit: false })
  return (
    <>
      {longest > 0 ? (
        <DimensionLine
          axis="vertical"
          from={{ x: retractX, y: yOf(scene.gaugeLineToTableMm) }}
          to={{ x: retractX, y: yOf(scene.gaugeLineToTableMm - longest) }}
          at={retractX + 20}
          text={figure(longest)}
          symbol="longest"
        />
      ) : null}
      {shortest > 0 ? (
        <DimensionLine
          axis="vertical"
          from={{ x: depthX, y: yOf(lowestGaugeLineMm) }}
          to={{ x: depthX, y: yOf(scene.lowestTipMm) }}
          at={depthX + 34}
          text={figure(shortest)}
          symbol="shortest"
        />
      ) : null}
    </>
  )
}
