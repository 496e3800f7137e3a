import { describe, expect, it } from 'vitest'
import { type BallSpeedRequest, ballSpeedAnswer } from '@/core/ball-end/ball-speed-answer'
import type { LimitingPart } from '@/core/speeds/speed-limit'
import { ballSpeedVerdict } from './ball-speed-verdict'

const ball: BallSpeedRequest = { cuttingDiameterMm: 6, depthOfCutMm: 0.3, tiltDeg: 0 }

function verdictOf(
  change: Partial<BallSpeedRequest>,
  unit: 'mm' | 'in' = 'mm',
  part: LimitingPart = 'spindle',
) {
  const request = { ...ball, ...change }
  const limit = request.maximumRpm == null ? null : { part, rpm: request.maximumRpm }
  return ballSpeedVerdict(request, ballSpeedAnswer(request), unit, limit)
}

describe('the verdict on a ball-end speed', () => {
  it('says speed and diameter first, then what to do about the dead tip', () => {
    expect(verdictOf({ spindleRpm: 20_000 })).toEqual({
      kind: 'caution',
      sentence:
        'At 20\u00a0000 rpm the 6 mm ball cuts at 164.3 m/min, on a diameter of 2.615 mm; its own diameter would say 377 m/min.',
      remarks: ['The dead tip is in the cut and rubs: lean the tool more than 25.84° to lift it out.'],
    })
  })

  it('holds only where the tip is out of the cut and no limit holds the spindle back', () => {
    expect(verdictOf({ tiltDeg: 30, spindleRpm: 20_000 }).kind).toBe('holds')
    expect(verdictOf({ tiltDeg: 30, spindleRpm: 20_000, maximumRpm: 18_000 }).kind).toBe('caution')
    expect(verdictOf({ tiltDeg: 20, spindleRpm: 20_000 }).kind).toBe('caution')
  })

  // By hand: Deff = 2·√(0.010 · 0.240) = 0.09798 in; n = 12 · 500/(π · 0.09798) = 19 492.
  it('speaks of SFM and inches to those who work in them', () => {
    expect(
      verdictOf({ cuttingDiameterMm: 6.35, depthOfCutMm: 0.254, wantedSpeedMPerMin: 152.4 }, 'in').sentence,
    ).toBe(
      'At 19\u00a0492 rpm the 1/4 (0.250) in ball cuts at 500 SFM, on a diameter of 0.098 in; its own diameter would say 1276 SFM.',
    )
  })

  it('says whose limit costs what, by the speed that was asked for', () => {
    const [remark] = verdictOf({ wantedSpeedMPerMin: 200, maximumRpm: 18_000 }, 'mm', 'holder').remarks
    expect(remark).toBe('200 m/min would need more than the holder’s limit of 18\u00a0000 rpm.')
    expect(verdictOf({ spindleRpm: 20_000, maximumRpm: 18_000 }).remarks[0]).toBe(
      '20\u00a0000 rpm is over the spindle’s limit, so 18\u00a0000 rpm is reckoned with.',
    )
  })

  it('promises no tilt where none helps, and says when the side cuts', () => {
    const { remarks } = verdictOf({ depthOfCutMm: 4 })
    expect(remarks.join(' ')).toContain('no tilt lifts it out')
    expect(remarks.join(' ')).toContain('deeper than the radius')
  })

  it('speaks of a flat end, not of a tilt, with a corner radius', () => {
    const { sentence, remarks } = verdictOf({ cuttingDiameterMm: 12, cornerRadiusMm: 1, depthOfCutMm: 0.2 })
    expect(sentence).toBe('The 12 mm cutter with 1 mm corners cuts on a diameter of 11.2 mm at most.')
    expect(remarks.join(' ')).toContain('flat end')
  })
})
