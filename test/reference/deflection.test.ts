import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { reachAnswer } from '@/core/reach/reach-answer'
import { type BeamPiece, tipComplianceUmPerN } from '@/core/stiffness/compliance'
import { ballCutter, reachRequest } from '../support/reach-requests'

/* Values and their sources stand in deflection.md. */

const rod = (lengthMm: number, diameterMm: number, modulusGpa: number): BeamPiece[] => [
  { fromMm: 0, toMm: lengthMm, fromDiameterMm: diameterMm, toDiameterMm: diameterMm, modulusGpa },
]
const stepped = (stepMm: number): BeamPiece[] => [
  { fromMm: 0, toMm: stepMm, fromDiameterMm: 8, toDiameterMm: 8, modulusGpa: 600 },
  { fromMm: stepMm, toMm: 40, fromDiameterMm: 10, toDiameterMm: 10, modulusGpa: 600 },
]

describe('deflection of a cantilever', () => {
  it.each([
    [100, rod(40, 10, 600), 7.243],
    [100, rod(40, 8, 600), 17.684],
    [100, rod(40, 10, 210), 20.695],
    [50, rod(20, 6, 600), 3.493],
    [50, rod(30, 6, 600), 11.789],
    [100, stepped(22), 8.98],
    [100, stepped(20), 8.548],
  ])(
    '%d N: it gives the derived value (section 5) to the digits printed',
    (sideLoadN, pieces, deflectionUm) => {
      expect(sideLoadN * tipComplianceUmPerN(pieces)).toBeCloseTo(deflectionUm, 3)
    },
  )

  it('it gives eight times as much at twice the overhang (Mitsubishi Materials, course 70)', () => {
    expect(tipComplianceUmPerN(rod(80, 10, 210)) / tipComplianceUmPerN(rod(40, 10, 210))).toBeCloseTo(
      1.6 / 0.2,
      9,
    )
  })

  it('it gives a sixteenth at twice the diameter (Mitsubishi Materials, course 70)', () => {
    expect((25 * tipComplianceUmPerN(rod(40, 20, 600))) / tipComplianceUmPerN(rod(40, 10, 600))).toBeCloseTo(
      1.5625,
      9,
    )
  })

  it('it agrees on cones with Simpson’s rule over ∫x²/d⁴', () => {
    fc.assert(
      fc.property(
        fc.record({
          fromMm: fc.double({ min: 0, max: 50, noNaN: true }),
          lengthMm: fc.double({ min: 0.1, max: 80, noNaN: true }),
          fromDiameterMm: fc.double({ min: 2, max: 30, noNaN: true }),
          coneMm: fc.double({ min: -1.5, max: 10, noNaN: true }),
        }),
        ({ fromMm, lengthMm, fromDiameterMm, coneMm }) => {
          const toDiameterMm = fromDiameterMm + coneMm
          const closed = tipComplianceUmPerN([
            { fromMm, toMm: fromMm + lengthMm, fromDiameterMm, toDiameterMm, modulusGpa: 210 },
          ])
          const at = (share: number) =>
            (fromMm + share * lengthMm) ** 2 / (fromDiameterMm + share * coneMm) ** 4
          expect(closed).toBeCloseTo(((64 / Math.PI) * simpson(at) * lengthMm) / 210, 6)
        },
      ),
      { seed: 1, numRuns: 200 },
    )
  })
})

/** Over 0 to 1 in 2000 steps. */
function simpson(f: (share: number) => number): number {
  const steps = 2000
  let sum = f(0) + f(1)
  for (let step = 1; step < steps; step++) sum += f(step / steps) * (step % 2 === 0 ? 2 : 4)
  return sum / (3 * steps)
}

describe('stiffness of an assembly', () => {
  it('it adds flutes at 0.8, shank, nut and holder, built in at the gauge line', () => {
    const answer = reachAnswer(reachRequest({ cutter: ballCutter, stickOutMm: 40, sideLoadN: 50 }))
    const inertia = (diameterMm: number) => (Math.PI * diameterMm ** 4) / 64
    const carbide = 12 ** 3 / inertia(4.8) + (40 ** 3 - 12 ** 3) / inertia(6)
    const steel = (140 ** 3 - 40 ** 3) / inertia(28)
    const complianceUmPerN = carbide / (3 * 580) + steel / (3 * 210)
    expect(answer.stiffness.complianceUmPerN).toBeCloseTo(complianceUmPerN, 9)
    expect(answer.stiffness.deflectionUm).toBeCloseTo(50 * complianceUmPerN, 9)
    expect(answer.stiffness.stickOutToDiameter).toBeCloseTo(40 / 6, 9)
  })

  it('it takes a tapered flute as a cone and high-speed steel as steel', () => {
    const cutter = {
      ...ballCutter,
      form: 'tapered' as const,
      taperHalfAngleDeg: 3,
      cornerRadiusMm: 0,
      substrate: 'hss' as const,
    }
    const feature = { kind: 'wall' as const, depthMm: 10, draftDeg: 5 }
    const { stiffness } = reachAnswer(reachRequest({ feature, cutter, stickOutMm: 20 }))
    const endMm = 6 + 24 * Math.tan((3 * Math.PI) / 180)
    const piece = (
      fromMm: number,
      toMm: number,
      fromDiameterMm: number,
      toDiameterMm: number,
    ): BeamPiece => ({
      fromMm,
      toMm,
      fromDiameterMm,
      toDiameterMm,
      modulusGpa: 210,
    })
    expect(stiffness.complianceUmPerN).toBeCloseTo(
      tipComplianceUmPerN([piece(0, 12, 0.8 * 6, 0.8 * endMm), piece(12, 20, 6, 6), piece(20, 120, 28, 28)]),
      9,
    )
  })
})
