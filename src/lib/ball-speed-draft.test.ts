import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { SpeedLimits } from '@/core/speeds/speed-limit'
import {
  ballSpeedAddress,
  ballSpeedFields,
  draftFromAddress,
  picksFromAddress,
  readBallSpeedDraft,
  type TypingSettings,
  withCutter,
  withTyped,
  workedOutText,
} from './ball-speed-draft'

const inMm: TypingSettings = { unit: 'mm', decimalComma: false }
const inInches: TypingSettings = { unit: 'in', decimalComma: false }

const draftOf = (address: string, settings = inMm) => draftFromAddress(new URLSearchParams(address), settings)

describe('a ball-end speed as it is typed', () => {
  it('begins with a cut that can be worked out, in either unit', () => {
    for (const settings of [inMm, inInches, { unit: 'mm', decimalComma: true } as const]) {
      const reading = readBallSpeedDraft(draftOf('', settings), settings)
      expect(reading.faults).toEqual({})
      expect(reading.answer?.effectiveDiameterMm.largest).toBeGreaterThan(0)
    }
    expect(draftOf('', inInches).cuttingDiameterMm).toBe('0.25')
  })

  it('reads dimensions as people write them', () => {
    const draft = {
      ...draftOf(''),
      cuttingDiameterMm: '1/4',
      depthOfCutMm: '10 thou',
      wantedSpeedMPerMin: '500 SFM',
      spindleRpm: '',
    }
    const { request } = readBallSpeedDraft(draft, inMm)
    expect(request).toMatchObject({ cuttingDiameterMm: 6.35, depthOfCutMm: 0.254, wantedSpeedMPerMin: 152.4 })
  })

  it('works one half of a pair out from whichever was typed last', () => {
    const byHeight = withTyped(draftOf('cuttingDiameterMm=10&depthOfCutMm=1'), 'scallopHeightMm', '1')
    const height = readBallSpeedDraft(byHeight, inMm)
    expect(height.request?.stepoverMm).toBe(6)
    expect(workedOutText('stepoverMm', height, inMm)).toBe('6')
    const byStepover = withTyped(byHeight, 'stepoverMm', '6')
    expect(byStepover.scallopHeightMm).toBe('')
    expect(workedOutText('scallopHeightMm', readBallSpeedDraft(byStepover, inMm), inMm)).toBe('1')
  })

  it('works the spindle speed and the cutting speed out from each other, in the unit of the person', () => {
    const draft = withTyped(
      draftOf('cuttingDiameterMm=10&depthOfCutMm=5', inInches),
      'wantedSpeedMPerMin',
      '500',
    )
    const reading = readBallSpeedDraft(draft, inInches)
    expect(workedOutText('spindleRpm', reading, inInches)).toBe('4851')
    const turned = withTyped(draft, 'spindleRpm', '4851')
    expect(workedOutText('wantedSpeedMPerMin', readBallSpeedDraft(turned, inInches), inInches)).toBe('500')
  })

  it.each([
    ['cuttingDiameterMm', '', 'Enter the diameter of the ball.'],
    ['cuttingDiameterMm', 'six', 'not a length'],
    ['cuttingDiameterMm', '-6', 'negative'],
    ['depthOfCutMm', '0', 'more than 0'],
    ['depthOfCutMm', 'F', 'not a length'],
    ['tiltDeg', '120', 'from 0 to 90'],
    ['stepoverMm', '7', 'more than the cutting diameter'],
    ['scallopHeightMm', '4', 'more than the radius'],
    ['cornerRadiusMm', '4', 'more than half'],
    ['spindleRpm', '1.5', 'whole number'],
    ['maximumRpm', '0', 'more than 0'],
  ] as const)('says beside %s why %j cannot be', (field, text, reason) => {
    const draft = withTyped(draftOf('cuttingDiameterMm=6&depthOfCutMm=0.3'), field, text)
    const reading = readBallSpeedDraft(draft, inMm)
    expect(Object.keys(reading.faults)).toEqual([field])
    expect(reading.faults[field]).toContain(reason)
    expect(reading.answer).toBeNull()
  })

  it('names no figure of another unit than the one typed in', () => {
    const draft = withTyped(draftOf('cuttingDiameterMm=6.35&depthOfCutMm=0.3'), 'scallopHeightMm', '5')
    const { scallopHeightMm } = readBallSpeedDraft(draft, inInches).faults
    expect(scallopHeightMm).toContain('more than the radius')
    expect(scallopHeightMm).not.toMatch(/\d/)
  })

  it('holds the whole cut in its address, whoever opens it in whatever unit', () => {
    const length = fc.integer({ min: 1_000, max: 90_000_000_000 }).map((steps) => steps / 1e9)
    const values = fc.record(
      {
        cuttingDiameterMm: length,
        cornerRadiusMm: length,
        depthOfCutMm: length,
        tiltDeg: fc.integer({ min: 0, max: 900 }).map((tenths) => tenths / 10),
        leadDeg: fc.integer({ min: 0, max: 90 }),
        stepoverMm: length,
        maximumRpm: fc.integer({ min: 1, max: 60_000 }),
        spindleRpm: fc.integer({ min: 1, max: 60_000 }),
      },
      { requiredKeys: ['cuttingDiameterMm', 'depthOfCutMm'] },
    )
    fc.assert(
      fc.property(
        values,
        fc.constantFrom('mm' as const, 'in' as const),
        fc.boolean(),
        (given, unit, decimalComma) => {
          const settings = { unit, decimalComma }
          const address = ballSpeedAddress(given, { cutter: '12', holder: null })
          expect(picksFromAddress(new URLSearchParams(address))).toEqual({ cutter: '12', holder: null })
          const draft = draftOf(address, settings)
          expect(readBallSpeedDraft(draft, settings).values).toEqual(given)
        },
      ),
    )
  })

  it('is capped by the least of the spindle typed and the holder and cutter picked, and names it', () => {
    const draft = draftOf('cuttingDiameterMm=6&depthOfCutMm=0.3&spindleRpm=30000&maximumRpm=24000')
    const capped = (picked: SpeedLimits) => {
      const { answer, limit, values } = readBallSpeedDraft(draft, inMm, picked)
      expect(values.maximumRpm).toBe(24_000)
      return [answer?.spindleRpm, limit?.part]
    }
    expect(capped({})).toEqual([24_000, 'spindle'])
    expect(capped({ holder: 18_000, cutter: 20_000 })).toEqual([18_000, 'holder'])
    expect(capped({ holder: null, cutter: 20_000 })).toEqual([20_000, 'cutter'])
    expect(capped({ holder: 30_000 })).toEqual([24_000, 'spindle'])
  })

  it('takes the end of a cutter picked: a ball’s radius stays blank', () => {
    const draft = draftOf('cuttingDiameterMm=6&depthOfCutMm=0.3')
    const ends = (cutter: Parameters<typeof withCutter>[1]) => {
      const { values } = readBallSpeedDraft(withCutter(draft, cutter, inInches), inInches)
      return [values.cuttingDiameterMm, values.cornerRadiusMm]
    }
    expect(ends({ form: 'ball', cuttingDiameterMm: 12.7, cornerRadiusMm: 6.35 })).toEqual([12.7, undefined])
    expect(ends({ form: 'cornerRadius', cuttingDiameterMm: 10, cornerRadiusMm: 0.5 })).toEqual([10, 0.5])
  })

  it('takes no id from an address but plain ones', () => {
    expect(picksFromAddress(new URLSearchParams('cutter=1%20or%201&holder=-2'))).toEqual({
      cutter: null,
      holder: null,
    })
  })

  it('takes nothing from an address but plain numbers', () => {
    const draft = draftOf('cuttingDiameterMm=<b>6</b>&depthOfCutMm=-1&tiltDeg=1e3&stepoverMm=0.5&foreign=1')
    expect(ballSpeedFields.filter((field) => draft[field] !== '')).toEqual(['stepoverMm'])
  })
})
