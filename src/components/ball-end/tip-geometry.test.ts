import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ballSpeedAnswer } from '@/core/ball-end/ball-speed-answer'
import { tipGeometry } from './tip-geometry'

const cut = fc.record({
  cuttingDiameterMm: fc.double({ min: 0.2, max: 50, noNaN: true }),
  share: fc.double({ min: 1e-3, max: 1.2, noNaN: true }),
  tiltDeg: fc.double({ min: 0, max: 85, noNaN: true }),
})

describe('the drawn tip', () => {
  it('ends its heavy line at the surface of the stock on both sides', () => {
    fc.assert(
      fc.property(cut, ({ cuttingDiameterMm, share, tiltDeg }) => {
        const depthOfCutMm = cuttingDiameterMm * share
        const request = { cuttingDiameterMm, depthOfCutMm, tiltDeg }
        const tip = tipGeometry(request, ballSpeedAnswer(request))
        const lean = (tiltDeg * Math.PI) / 180
        for (const side of [tip.left, tip.right]) {
          const arc = (side.arcDeg * Math.PI) / 180
          const heightMm = tip.roundMm * (1 - Math.cos(arc)) + side.sideMm * Math.cos(lean)
          expect(heightMm).toBeCloseTo(depthOfCutMm, 6)
          expect(side.sideMm).toBeGreaterThanOrEqual(-1e-9)
        }
      }),
    )
  })

  it('puts each diameter where the ball is that wide', () => {
    fc.assert(
      fc.property(cut, ({ cuttingDiameterMm, share, tiltDeg }) => {
        const request = { cuttingDiameterMm, depthOfCutMm: cuttingDiameterMm * share, tiltDeg }
        const { largest, smallest, radiusMm } = tipGeometry(request, ballSpeedAnswer(request))
        for (const circle of smallest ? [largest, smallest] : [largest]) {
          expect(Math.hypot(circle.radiusMm, circle.belowMm)).toBeCloseTo(radiusMm, 6)
        }
      }),
    )
  })

  it('keeps the flat of a corner radius between its two roundings', () => {
    const request = { cuttingDiameterMm: 12, cornerRadiusMm: 1, depthOfCutMm: 0.2, tiltDeg: 0 }
    const tip = tipGeometry(request, ballSpeedAnswer(request))
    expect(tip).toMatchObject({ flatMm: 5, roundMm: 1, radiusMm: 6 })
    expect(tip.largest.radiusMm).toBeCloseTo(5.6, 12)
    expect(tip.largest.belowMm).toBeCloseTo(0.8, 12)
  })
})
