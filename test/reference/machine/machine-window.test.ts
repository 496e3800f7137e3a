import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { CoreInputError } from '@/core/core-input-error'
import { gaugeLengthFit, type MachineWindowRequest, machineWindow } from '@/core/machine/machine-window'
import { centringMarginMm, sweptRadiusMm } from '@/core/machine/rotary-stock'
import { setUpWindow } from '@/core/machine/set-up-window'

/* Worked by hand in machine-window.md. */

const first: MachineWindowRequest = {
  gaugeLineToTableMm: 600,
  zTravelMm: 450,
  highestMm: 220,
  lowestTipMm: 60,
  retractClearanceMm: 25,
}
const bar = { widthMm: 80, heightMm: 80, axisHeightMm: 120 }
const turned: MachineWindowRequest = {
  gaugeLineToTableMm: 500,
  zTravelMm: 350,
  highestMm: 150,
  lowestTipMm: 100,
  retractClearanceMm: 25,
  rotaryStock: bar,
}

describe('a machine window by hand', () => {
  it('it is bounded by the retract over the highest thing and by the travel (case 1)', () => {
    expect(machineWindow(first)).toEqual({
      gaugeLengthMm: { shortest: 90, longest: 355 },
      longestBoundBy: 'retract',
      sweptRadiusMm: null,
      highestMm: 220,
      tableClearanceMm: null,
      shortfallMm: 0,
      tableStrikeMm: 0,
      possible: true,
    })
  })

  it('it is bounded by the changer where that takes less (case 2)', () => {
    expect(machineWindow({ ...first, longestToolMm: 250 })).toMatchObject({
      gaugeLengthMm: { shortest: 90, longest: 250 },
      longestBoundBy: 'changer',
      possible: true,
    })
  })

  it('it is impossible, by so much, where its ends cross, and possible where they meet (cases 3, 3a, 3b)', () => {
    const crossed = {
      ...first,
      gaugeLineToTableMm: 500,
      zTravelMm: 300,
      lowestTipMm: 20,
      retractClearanceMm: 30,
    }
    expect(machineWindow({ ...crossed, highestMm: 330 })).toMatchObject({
      gaugeLengthMm: { shortest: 180, longest: 140 },
      shortfallMm: 40,
      possible: false,
    })
    expect(machineWindow({ ...crossed, highestMm: 290 })).toMatchObject({ shortfallMm: 0, possible: true })
    expect(machineWindow({ ...first, gaugeLineToTableMm: 400, highestMm: 390 })).toMatchObject({
      gaugeLengthMm: { shortest: -110, longest: -15 },
      shortfallMm: 15,
      possible: false,
    })
  })

  it('it tells a gauge length outside by how much (case 4)', () => {
    const window = machineWindow(first).gaugeLengthMm
    expect(gaugeLengthFit(window, 355)).toEqual({ verdict: 'fits', byMm: 0 })
    expect(gaugeLengthFit(window, 355 + 5e-10)).toEqual({ verdict: 'fits', byMm: 0 })
    expect(gaugeLengthFit(window, 90)).toEqual({ verdict: 'fits', byMm: 0 })
    expect(gaugeLengthFit(window, 356)).toEqual({ verdict: 'tooLong', byMm: 1 })
    expect(gaugeLengthFit(window, 80)).toEqual({ verdict: 'tooShort', byMm: 10 })
  })

  it('it is as high as the corners sweep, not as the finished part (case 5)', () => {
    const window = machineWindow(turned)
    expect(window.sweptRadiusMm).toBeCloseTo(56.5685, 4)
    expect(window.highestMm).toBeCloseTo(176.5685, 4)
    expect(window.gaugeLengthMm.longest).toBeCloseTo(298.4315, 4)
    expect(window.gaugeLengthMm.shortest).toBe(50)
    expect(window.tableClearanceMm).toBeCloseTo(63.4315, 4)
    expect(window.possible).toBe(true)
  })

  it.each([
    [70, 11.5685, false],
    [50, 31.5685, false],
    [25 + 56.568542494923804, 0, true],
  ])('it strikes the table with the axis %d high by %d (case 6)', (axisHeightMm, strikeMm, possible) => {
    const window = machineWindow({
      ...turned,
      lowestTipMm: 60,
      rotaryStock: { ...bar, axisHeightMm },
    })
    expect(window.tableStrikeMm).toBeCloseTo(strikeMm, 4)
    expect(window.possible).toBe(possible)
  })

  it('it sweeps from an axis off the middle, and by the jaws where they stand out (cases 7, 8)', () => {
    expect(
      sweptRadiusMm({ widthMm: 60, heightMm: 40, offsetXMm: 5, offsetYMm: -3, axisHeightMm: 100 }),
    ).toBeCloseTo(41.8808, 4)
    expect(sweptRadiusMm({ ...bar, chuckRadiusMm: 62.5 })).toBe(62.5)
  })

  it('it leaves so much to clean up (case 9)', () => {
    const square = { widthMm: 50, heightMm: 50, axisHeightMm: 100 }
    expect(centringMarginMm(square, 48, 0.4)).toBeCloseTo(0.6, 12)
    expect(centringMarginMm(square, 48, 1.2)).toBeCloseTo(-0.2, 12)
    expect(centringMarginMm({ ...square, offsetYMm: 0.5 }, 48, 0.4)).toBeCloseTo(0.1, 12)
    expect(centringMarginMm({ ...square, heightMm: 49 }, 48, 0.4)).toBeCloseTo(0.1, 12)
  })

  it('it takes whatever stands highest (case 10)', () => {
    expect(machineWindow({ ...turned, highestMm: 210 }).gaugeLengthMm.longest).toBe(265)
    const fixtures = [
      { baseMm: 0, heightMm: 40 },
      { baseMm: 40, heightMm: 170 },
    ]
    expect(setUpWindow(turned, { ...turned, fixtures }).gaugeLengthMm.longest).toBe(265)
    expect(setUpWindow(turned, { ...turned, fixtures: [] }).highestMm).toBeCloseTo(176.5685, 4)
  })
})

describe('a machine window', () => {
  it.each([
    [{ gaugeLineToTableMm: 0 }, 'not-positive', 'gaugeLineToTableMm'],
    [{ gaugeLineToTableMm: Number.NaN }, 'not-finite', 'gaugeLineToTableMm'],
    [{ zTravelMm: -1 }, 'not-positive', 'zTravelMm'],
    [{ highestMm: -1 }, 'negative', 'highestMm'],
    [{ lowestTipMm: -0.1 }, 'negative', 'lowestTipMm'],
    [{ lowestTipMm: 221 }, 'lowest-above-highest', 'lowestTipMm'],
    [{ retractClearanceMm: -1 }, 'negative', 'retractClearanceMm'],
    [{ longestToolMm: 0 }, 'not-positive', 'longestToolMm'],
    [{ rotaryStock: { ...bar, widthMm: 0 } }, 'not-positive', 'rotaryStock.widthMm'],
    [{ rotaryStock: { ...bar, axisHeightMm: -1 } }, 'not-positive', 'rotaryStock.axisHeightMm'],
    [{ rotaryStock: { ...bar, offsetXMm: Number.POSITIVE_INFINITY } }, 'not-finite', 'rotaryStock.offsetXMm'],
    [{ rotaryStock: { ...bar, chuckRadiusMm: -1 } }, 'negative', 'rotaryStock.chuckRadiusMm'],
  ] satisfies [Partial<MachineWindowRequest>, string, string][])(
    'refuses %j with %s at %s',
    (change, code, path) => {
      const refusal = (() => {
        try {
          return machineWindow({ ...first, ...change })
        } catch (error) {
          return error
        }
      })()
      expect(refusal).toBeInstanceOf(CoreInputError)
      expect(refusal).toMatchObject({ code, path })
    },
  )

  it('takes exactly the gauge lengths that clear the highest thing and get down, told by moving the tip', () => {
    const height = fc.double({ min: 0, max: 400, noNaN: true })
    fc.assert(
      fc.property(
        fc.record({
          highestMm: height,
          sink: height,
          clearance: fc.double({ min: 0, max: 60, noNaN: true }),
        }),
        fc.double({ min: 1, max: 600, noNaN: true }),
        ({ highestMm, sink, clearance }, gaugeLengthMm) => {
          const lowestTipMm = Math.max(0, highestMm - sink)
          const request = { ...first, highestMm, lowestTipMm, retractClearanceMm: clearance }
          const tipAtTopMm = request.gaugeLineToTableMm - gaugeLengthMm
          const tipAtBottomMm = tipAtTopMm - request.zTravelMm
          const clears = tipAtTopMm >= highestMm + clearance - 1e-9
          const getsDown = tipAtBottomMm <= lowestTipMm + 1e-9
          const window = machineWindow(request).gaugeLengthMm
          expect(gaugeLengthFit(window, gaugeLengthMm).verdict === 'fits').toBe(clears && getsDown)
        },
      ),
      { seed: 4, numRuns: 2000 },
    )
  })
})
