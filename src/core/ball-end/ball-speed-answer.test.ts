import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { CoreInputError } from '../core-input-error'
import { type BallSpeedRequest, ballSpeedAnswer } from './ball-speed-answer'

const ball: BallSpeedRequest = { cuttingDiameterMm: 6, depthOfCutMm: 0.3, tiltDeg: 0 }

describe('ballSpeedAnswer', () => {
  it('answers the shape of the cut alone where no speed and no stepover is given', () => {
    expect(ballSpeedAnswer(ball)).toMatchObject({
      tipInCut: true,
      speedMPerMin: null,
      nominalSpeedMPerMin: null,
      spindleRpm: null,
      spindleLimited: false,
      scallopHeightMm: null,
      chipThinningFactor: null,
    })
  })

  it('gives the tip its speed back once the tool leans far enough', () => {
    const answer = ballSpeedAnswer({ ...ball, tiltDeg: 30, spindleRpm: 20_000 })
    expect(answer.tipInCut).toBe(false)
    expect(answer.speedMPerMin?.smallest).toBeGreaterThan(0)
    expect(answer.speedMPerMin?.largest).toBeLessThan(answer.nominalSpeedMPerMin ?? 0)
    expect(ballSpeedAnswer({ ...ball, spindleRpm: 20_000 }).speedMPerMin?.smallest).toBe(0)
  })

  it('works the spindle speed out for a wanted cutting speed, at the largest diameter that cuts', () => {
    const answer = ballSpeedAnswer({ ...ball, wantedSpeedMPerMin: 120, maximumRpm: 24_000 })
    expect(answer.speedMPerMin?.largest).toBeCloseTo(120, 9)
    expect(answer.spindleRpm).toBeCloseTo(14_605, 0)
    expect(answer.spindleLimited).toBe(false)
  })

  it('holds the spindle to the largest allowed speed, below, at and above it', () => {
    const wantedRpm = ballSpeedAnswer({ ...ball, wantedSpeedMPerMin: 120 }).spindleRpm ?? 0
    const limited = (maximumRpm: number) => ballSpeedAnswer({ ...ball, wantedSpeedMPerMin: 120, maximumRpm })
    expect(limited(wantedRpm + 1)).toMatchObject({ spindleLimited: false, spindleRpm: wantedRpm })
    expect(limited(wantedRpm)).toMatchObject({ spindleLimited: false, spindleRpm: wantedRpm })
    expect(limited(wantedRpm - 1)).toMatchObject({ spindleLimited: true, spindleRpm: wantedRpm - 1 })
    expect(limited(12_000).speedMPerMin?.largest).toBeCloseTo((Math.PI * 2.61533937 * 12_000) / 1000, 4)
    expect(ballSpeedAnswer({ ...ball, spindleRpm: 30_000, maximumRpm: 24_000 })).toMatchObject({
      spindleLimited: true,
      spindleRpm: 24_000,
    })
  })

  it('answers the angle between axis and normal, from lead and tilt together', () => {
    expect(ballSpeedAnswer({ ...ball, tiltDeg: 15 }).tiltDeg).toBe(15)
    expect(ballSpeedAnswer({ ...ball, tiltDeg: 20, leadDeg: 30 }).tiltDeg).toBeCloseTo(35.531, 3)
    expect(ballSpeedAnswer({ ...ball, tiltDeg: 15, leadDeg: 0 }).tiltDeg).toBeCloseTo(15, 12)
  })

  it('answers a corner radius with the axis normal to the surface', () => {
    const answer = ballSpeedAnswer({
      cuttingDiameterMm: 20,
      cornerRadiusMm: 5,
      depthOfCutMm: 1,
      tiltDeg: 0,
      stepoverMm: 16,
    })
    expect(answer).toMatchObject({
      effectiveDiameterMm: { largest: 16, smallest: 0 },
      tipInCut: true,
      tiltToClearTipDeg: null,
      scallopHeightMm: 1,
      chipThinningFactor: 1,
    })
  })

  it('takes a corner radius of half the diameter for the ball it is, tilt and all', () => {
    const tilted = { ...ball, tiltDeg: 15, stepoverMm: 0.5 }
    expect(ballSpeedAnswer({ ...tilted, cornerRadiusMm: 3 })).toEqual(ballSpeedAnswer(tilted))
  })

  it.each([
    [{ cuttingDiameterMm: 0 }, 'not-positive', 'cuttingDiameterMm'],
    [{ cuttingDiameterMm: -6 }, 'not-positive', 'cuttingDiameterMm'],
    [{ cuttingDiameterMm: Number.NaN }, 'not-finite', 'cuttingDiameterMm'],
    [{ cuttingDiameterMm: 1e9 }, 'too-large', 'cuttingDiameterMm'],
    [{ depthOfCutMm: 0 }, 'not-positive', 'depthOfCutMm'],
    [{ depthOfCutMm: -0.1 }, 'not-positive', 'depthOfCutMm'],
    [{ depthOfCutMm: Number.POSITIVE_INFINITY }, 'not-finite', 'depthOfCutMm'],
    [{ tiltDeg: -1 }, 'out-of-range', 'tiltDeg'],
    [{ tiltDeg: 90.001 }, 'out-of-range', 'tiltDeg'],
    [{ leadDeg: 91 }, 'out-of-range', 'leadDeg'],
    [{ cornerRadiusMm: 0 }, 'not-positive', 'cornerRadiusMm'],
    [{ cornerRadiusMm: 3.001 }, 'corner-radius-too-large', 'cornerRadiusMm'],
    [{ cornerRadiusMm: 1, tiltDeg: 5 }, 'tilt-with-corner-radius', 'tiltDeg'],
    [{ cornerRadiusMm: 1, leadDeg: 5 }, 'tilt-with-corner-radius', 'leadDeg'],
    [{ stepoverMm: 0 }, 'not-positive', 'stepoverMm'],
    [{ stepoverMm: 6.001 }, 'stepover-over-diameter', 'stepoverMm'],
    [{ spindleRpm: 0 }, 'not-positive', 'spindleRpm'],
    [{ maximumRpm: -1 }, 'not-positive', 'maximumRpm'],
    [{ wantedSpeedMPerMin: 0 }, 'not-positive', 'wantedSpeedMPerMin'],
    [{ wantedSpeedMPerMin: 100, spindleRpm: 1000 }, 'speed-given-twice', 'wantedSpeedMPerMin'],
  ] satisfies [Partial<BallSpeedRequest>, string, string][])(
    'refuses %j with %s at %s',
    (change, code, path) => {
      const refusal = (() => {
        try {
          return ballSpeedAnswer({ ...ball, ...change })
        } catch (error) {
          return error
        }
      })()
      expect(refusal).toBeInstanceOf(CoreInputError)
      expect(refusal).toMatchObject({ code, path, message: expect.stringMatching(/^[A-Z].*\.$/) })
    },
  )

  it('answers finite numbers or a refusal, whatever it is given', () => {
    const value = fc.oneof(
      fc.double(),
      fc.double({ min: 0, max: 100, noNaN: true }),
      fc.constantFrom(0, 1e-12, 1e-9, 3, 6),
    )
    const option = fc.option(value)
    const request = fc.record({
      cuttingDiameterMm: value,
      cornerRadiusMm: option,
      depthOfCutMm: value,
      tiltDeg: value,
      leadDeg: option,
      stepoverMm: option,
      spindleRpm: option,
      wantedSpeedMPerMin: option,
      maximumRpm: option,
    })
    fc.assert(
      fc.property(request, (asked) => {
        try {
          const numbers = Object.values(ballSpeedAnswer(asked)).flatMap((part) =>
            part !== null && typeof part === 'object' ? Object.values(part) : part,
          )
          for (const number of numbers)
            if (typeof number === 'number') expect(number).toBeGreaterThanOrEqual(0)
          for (const number of numbers)
            if (typeof number === 'number') expect(number).toBeLessThan(Number.POSITIVE_INFINITY)
        } catch (error) {
          if (!(error instanceof CoreInputError)) throw error
        }
      }),
      { numRuns: 3000 },
    )
  })
})
