import { describe, expect, it } from 'vitest'
import { machineWindow } from '@/core/machine/machine-window'
import {
  type DaylightScene,
  daylightLayout,
  deepestTipMm,
  uprightFrame,
  widestRadiusMm,
} from './daylight-layout'
import { triedTool } from './tried-tool'

/* Case 1 of the machine windows by hand: from 90 to 355. */
const heights = { highestMm: 220, lowestTipMm: 60, retractClearanceMm: 25 }
const machine = { gaugeLineToTableMm: 600, zTravelMm: 450 }
const window = machineWindow({ ...machine, ...heights })
const scene: DaylightScene = {
  ...machine,
  ...heights,
  spindleNoseDiameterMm: null,
  fixtures: [],
  rotaryStock: null,
  window,
}
const holder = {
  gaugeLengthMm: 100,
  segments: [{ part: 'holder' as const, lengthMm: 60, noseDiameterMm: 30, spindleDiameterMm: 46 }],
}
const parts = { cutter: null, holder, extension: null, stickOutMm: 40 }

describe('the daylight on its sheet', () => {
  it.each([356, 900, 1440])('has true heights, all of them on a sheet %d wide', (width) => {
    const layout = daylightLayout(scene, width)
    expect(layout.yOf(0) - layout.yOf(600)).toBeCloseTo(600 * layout.pxPerMm, 1)
    expect(layout.yOf(600)).toBeGreaterThan(0)
    expect(layout.yOf(0)).toBeLessThan(layout.height)
    expect(layout.left).toBeLessThan(layout.retractX)
    expect(layout.retractX).toBeLessThan(layout.depthX)
    expect(layout.depthX).toBeLessThan(layout.right)
    expect(layout.right).toBeLessThan(width)
    expect(layout.retractMm).toBe(245)
    expect(layout.lowestGaugeLineMm).toBe(150)
  })

  it('leaves room under the table for what would go into it', () => {
    const rotaryStock = {
      ...{ widthMm: 80, heightMm: 80, offsetXMm: null, offsetYMm: null, axisHeightMm: 20 },
      ...{ chuckRadiusMm: null, partDiameterMm: null },
    }
    const struck = machineWindow({ ...machine, ...heights, lowestTipMm: 0, rotaryStock })
    const layout = daylightLayout({ ...scene, rotaryStock, window: struck }, 900)
    expect(layout.yOf(struck.tableClearanceMm ?? 0)).toBeLessThan(layout.height)
    expect(layout.yOf(struck.tableClearanceMm ?? 0)).toBeGreaterThan(layout.yOf(0))
  })

  it('puts the tip where it gets to: on the lowest position, or short of it', () => {
    const layout = daylightLayout(scene, 900)
    expect(deepestTipMm(scene, layout, 140)).toBe(60)
    expect(deepestTipMm(scene, layout, 80)).toBe(70)
    const tip = uprightFrame(layout, layout.depthX, 60)(0, 0)
    expect(tip).toEqual({ x: layout.depthX, y: layout.yOf(60) })
  })
})

describe('a tool that is tried', () => {
  it('is nothing until a holder and a stick-out are there', () => {
    expect(triedTool({ ...parts, holder: null }, window)).toBeNull()
    expect(triedTool({ ...parts, stickOutMm: null }, window)).toBeNull()
  })

  it('reaches from its tip to the gauge line, holder, extension and all', () => {
    const extension = {
      projectionMm: 50,
      segments: [{ lengthMm: 50, noseDiameterMm: 16, spindleDiameterMm: 16 }],
    }
    const tool = triedTool({ ...parts, extension }, window)
    if (tool === null || typeof tool === 'string') throw new Error('it is a tool')
    expect(tool.gaugeLengthMm).toBe(190)
    expect(tool.fit).toEqual({ verdict: 'fits', byMm: 0 })
    expect(tool.parts.at(-1)?.segments.at(-1)?.toZMm).toBe(190)
    expect(widestRadiusMm(tool)).toBe(23)
  })

  it('says in a sentence what cannot be', () => {
    const cutter = { form: 'square' as const, cuttingDiameterMm: 6, lengthOfCutMm: 12, shankDiameterMm: 6 }
    expect(triedTool({ ...parts, cutter: { ...cutter, overallLengthMm: 30 } }, window)).toBe(
      'The stick-out is longer than the cutter itself.',
    )
    expect(triedTool({ ...parts, holder: { ...holder, gaugeLengthMm: 50 } }, window)).toBe(
      'The segments are longer than the holder itself.',
    )
  })
})
