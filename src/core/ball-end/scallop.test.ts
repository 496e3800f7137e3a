import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { chipThinningFactor } from './cutting-speed'
import { scallopHeightMm, stepoverForScallopMm } from './scallop'

const tip = fc
  .record({
    cuttingDiameterMm: fc.double({ min: 0.05, max: 80, noNaN: true }),
    cornerShare: fc.option(fc.double({ min: 0.01, max: 0.5, noNaN: true })),
  })
  .map(({ cuttingDiameterMm, cornerShare }) => ({
    cuttingDiameterMm,
    cornerRadiusMm: cornerShare === null ? null : cuttingDiameterMm * cornerShare,
  }))

describe('scallop', () => {
  it('comes back to the same height from the stepover that leaves it', () => {
    fc.assert(
      fc.property(tip, fc.double({ min: 0, max: 1, noNaN: true }), (end, part) => {
        const heightMm = ((end.cornerRadiusMm ?? end.cuttingDiameterMm / 2) * part) / 1.000001
        const stepoverMm = stepoverForScallopMm(end, heightMm)
        expect(stepoverMm).toBeLessThanOrEqual(end.cuttingDiameterMm + 1e-9)
        const back = scallopHeightMm(end, Math.min(stepoverMm, end.cuttingDiameterMm))
        expect(Math.abs(back - heightMm)).toBeLessThan(1e-9 * Math.max(1, end.cuttingDiameterMm))
      }),
    )
  })

  it('is the height at which two circles a stepover apart cross', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 50, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (diameter, part) => {
          const heightMm = scallopHeightMm({ cuttingDiameterMm: diameter }, diameter * part)
          const radius = diameter / 2
          const fromCentre = Math.hypot((diameter * part) / 2, radius - heightMm)
          expect(fromCentre).toBeCloseTo(radius, 9)
        },
      ),
    )
  })

  it('is none without a stepover, and the radius over the whole diameter', () => {
    expect(scallopHeightMm({ cuttingDiameterMm: 6 }, 0)).toBe(0)
    expect(scallopHeightMm({ cuttingDiameterMm: 6 }, 6)).toBe(3)
    expect(stepoverForScallopMm({ cuttingDiameterMm: 6 }, 0)).toBe(0)
    expect(stepoverForScallopMm({ cuttingDiameterMm: 6 }, 3)).toBe(6)
  })

  it('is none while the flat end of a corner radius cleans the stepover', () => {
    const end = { cuttingDiameterMm: 12, cornerRadiusMm: 1 }
    expect(scallopHeightMm(end, 10)).toBe(0)
    expect(scallopHeightMm(end, 10.5)).toBeGreaterThan(0)
    expect(scallopHeightMm(end, 12)).toBe(1)
  })

  it('refuses what leaves no scallop at all, at its field', () => {
    expect(() => scallopHeightMm({ cuttingDiameterMm: 6 }, 6.0001)).toThrow(
      expect.objectContaining({ code: 'stepover-over-diameter', path: 'stepoverMm' }),
    )
    expect(() => scallopHeightMm({ cuttingDiameterMm: 6 }, -1)).toThrow(
      expect.objectContaining({
        code: 'out-of-range',
        path: 'stepoverMm',
        message: "The stepover can't be below 0.",
      }),
    )
    expect(() => stepoverForScallopMm({ cuttingDiameterMm: 6 }, 3.01)).toThrow(
      expect.objectContaining({ code: 'out-of-range', path: 'scallopHeightMm' }),
    )
  })
})

describe('chipThinningFactor', () => {
  it('is one from half of the diameter on, and grows without a step below', () => {
    expect(chipThinningFactor(3, 6)).toBe(1)
    expect(chipThinningFactor(6, 6)).toBe(1)
    expect(chipThinningFactor(2.9999, 6)).toBeCloseTo(1, 6)
    expect(chipThinningFactor(0.6, 6)).toBeCloseTo(1 / 0.6, 12)
  })
})
