import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cornerEffectiveDiameterMm } from './corner-diameter'
import {
  type BallCut,
  capHalfAngleDeg,
  combinedTiltDeg,
  isTipInCut,
  largestEffectiveDiameterMm,
  smallestEffectiveDiameterMm,
} from './tip-cap'

const diameter = fc.double({ min: 0.05, max: 80, noNaN: true })
const share = fc.double({ min: 1e-4, max: 0.5, noNaN: true })
const angle = fc.double({ min: 0, max: 90, noNaN: true })
const anyCut = fc.record({ cuttingDiameterMm: diameter, share, tiltDeg: angle }).map(
  (cut): BallCut => ({
    cuttingDiameterMm: cut.cuttingDiameterMm,
    depthOfCutMm: cut.cuttingDiameterMm * cut.share,
    tiltDeg: cut.tiltDeg,
  }),
)

/** Walks the cap on the sphere in space and measures how far each point is from the tool axis. */
function sampledDiametersMm({ cuttingDiameterMm, depthOfCutMm, tiltDeg }: BallCut) {
  const radiusMm = cuttingDiameterMm / 2
  const tilt = (tiltDeg * Math.PI) / 180
  const [axisX, axisZ] = [Math.sin(tilt), Math.cos(tilt)]
  const steps = 200
  let [largest, smallest] = [0, Number.POSITIVE_INFINITY]
  for (let ring = 0; ring <= steps; ring++) {
    const depth = (depthOfCutMm * ring) / steps
    const z = 1 - depth / radiusMm
    for (let turn = 0; turn < 2 * steps; turn++) {
      const around = (Math.PI * turn) / steps
      const x = Math.sqrt(Math.max(0, 1 - z * z)) * Math.cos(around)
      const along = x * axisX + z * axisZ
      const distance = 2 * radiusMm * Math.sqrt(Math.max(0, 1 - along * along))
      largest = Math.max(largest, distance)
      smallest = Math.min(smallest, distance)
    }
  }
  return { largest, smallest }
}

describe('the cap of a ball end in the cut', () => {
  it('agrees with a naive walk over the cap in space', () => {
    fc.assert(
      fc.property(anyCut, (cut) => {
        const sampled = sampledDiametersMm(cut)
        const slack = cut.cuttingDiameterMm * 0.02
        const largest = largestEffectiveDiameterMm(cut)
        const smallest = smallestEffectiveDiameterMm(cut)
        expect(largest).toBeGreaterThanOrEqual(sampled.largest - 1e-9)
        expect(largest).toBeLessThanOrEqual(sampled.largest + slack)
        expect(smallest).toBeLessThanOrEqual(sampled.smallest + 1e-9)
        expect(smallest).toBeGreaterThanOrEqual(sampled.smallest - slack)
      }),
    )
  })

  it('is the written formula, DC·sin(β ± ψ), within rounding', () => {
    fc.assert(
      fc.property(anyCut, (cut) => {
        const psi = Math.acos(1 - (2 * cut.depthOfCutMm) / cut.cuttingDiameterMm)
        const beta = (cut.tiltDeg * Math.PI) / 180
        const largest = cut.cuttingDiameterMm * Math.sin(Math.min(beta + psi, Math.PI / 2))
        const smallest = cut.cuttingDiameterMm * Math.sin(Math.max(beta - psi, 0))
        expect(Math.abs(largestEffectiveDiameterMm(cut) - largest)).toBeLessThan(1e-9)
        expect(Math.abs(smallestEffectiveDiameterMm(cut) - smallest)).toBeLessThan(1e-9)
        expect(
          Math.abs(capHalfAngleDeg(cut.cuttingDiameterMm, cut.depthOfCutMm) - (psi * 180) / Math.PI),
        ).toBeLessThan(1e-9)
      }),
    )
  })

  it('grows with depth and with tilt, never beyond the diameter', () => {
    fc.assert(
      fc.property(anyCut, share, angle, (cut, otherShare, otherTilt) => {
        const largest = largestEffectiveDiameterMm(cut)
        const deeper = Math.max(cut.depthOfCutMm, otherShare * cut.cuttingDiameterMm)
        const steeper = Math.max(cut.tiltDeg, otherTilt)
        const grown = largestEffectiveDiameterMm({ ...cut, depthOfCutMm: deeper, tiltDeg: steeper })
        expect(grown).toBeGreaterThanOrEqual(largest - 1e-12)
        expect(grown).toBeLessThanOrEqual(cut.cuttingDiameterMm + 1e-12)
      }),
    )
  })

  it('has the tip in the cut exactly while the smallest diameter is none', () => {
    fc.assert(
      fc.property(anyCut, (cut) => {
        expect(smallestEffectiveDiameterMm(cut) === 0).toBe(isTipInCut(cut))
      }),
    )
  })

  it('lifts the tip out just above the tilt it names, not at it', () => {
    fc.assert(
      fc.property(diameter, fc.double({ min: 1e-3, max: 0.49, noNaN: true }), (cuttingDiameterMm, part) => {
        const depthOfCutMm = cuttingDiameterMm * part
        const tiltDeg = capHalfAngleDeg(cuttingDiameterMm, depthOfCutMm)
        expect(isTipInCut({ cuttingDiameterMm, depthOfCutMm, tiltDeg })).toBe(true)
        expect(isTipInCut({ cuttingDiameterMm, depthOfCutMm, tiltDeg: tiltDeg + 1e-6 })).toBe(false)
      }),
    )
  })

  it('cuts with the whole diameter from half of it on, where no tilt clears the tip', () => {
    for (const depthOfCutMm of [3, 3.001, 6, 50]) {
      const cut = { cuttingDiameterMm: 6, depthOfCutMm, tiltDeg: 20 }
      expect(largestEffectiveDiameterMm(cut)).toBe(6)
      expect(capHalfAngleDeg(6, depthOfCutMm)).toBe(90)
      expect(isTipInCut({ ...cut, tiltDeg: 90 })).toBe(true)
    }
    expect(
      largestEffectiveDiameterMm({ cuttingDiameterMm: 6, depthOfCutMm: 2.999, tiltDeg: 0 }),
    ).toBeLessThan(6)
  })

  it('is the same as a corner radius of half the diameter', () => {
    fc.assert(
      fc.property(diameter, share, (cuttingDiameterMm, part) => {
        const depthOfCutMm = cuttingDiameterMm * part
        expect(
          cornerEffectiveDiameterMm({
            cuttingDiameterMm,
            cornerRadiusMm: cuttingDiameterMm / 2,
            depthOfCutMm,
          }),
        ).toBeCloseTo(largestEffectiveDiameterMm({ cuttingDiameterMm, depthOfCutMm, tiltDeg: 0 }), 9)
      }),
    )
  })
})

describe('combinedTiltDeg', () => {
  it('is cos β = cos α · cos γ, and does not care which comes first', () => {
    fc.assert(
      fc.property(angle, angle, (lead, tilt) => {
        const beta = combinedTiltDeg(lead, tilt)
        const radians = (deg: number) => (deg * Math.PI) / 180
        expect(Math.cos(radians(beta))).toBeCloseTo(Math.cos(radians(lead)) * Math.cos(radians(tilt)), 12)
        expect(combinedTiltDeg(tilt, lead)).toBeCloseTo(beta, 9)
        expect(beta).toBeGreaterThanOrEqual(Math.max(lead, tilt) - 1e-9)
        expect(beta).toBeLessThanOrEqual(90)
      }),
    )
  })

  it('adds nothing to nothing', () => {
    expect(combinedTiltDeg(0, 15)).toBeCloseTo(15, 12)
    expect(combinedTiltDeg(0.001, 0)).toBeCloseTo(0.001, 12)
  })
})
