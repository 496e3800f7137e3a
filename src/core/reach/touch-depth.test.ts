import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cornerArc } from '@/core/outline/stroke-chain'
import { ballCutter, drillCutter, squareCutter } from '../../../test/support/reach-requests'
import { type HolePlacement, placementOf, toPartFrame, type WallPlacement, wallStandOffMm } from './placement'
import { arcObstacleTouchMm, holeTouchMm, obstacleTouchMm, wallTouchMm } from './touch-depth'
import type { WallFeature } from './types'

function against(more: Partial<WallFeature>, cutter = squareCutter): WallPlacement {
  const at = placementOf({ kind: 'wall', depthMm: 20, ...more }, cutter)
  if (at.kind === 'hole') throw new Error('a wall was asked for')
  return at
}

describe('wallStandOffMm', () => {
  it('it puts the rounded corner’s circle tangent to the leaning wall', () => {
    const sizes = fc.record({
      radiusMm: fc.double({ min: 0.1, max: 30, noNaN: true }),
      share: fc.double({ min: 0, max: 1, noNaN: true }),
      wallDeg: fc.double({ min: 0, max: 80, noNaN: true }),
    })
    fc.assert(
      fc.property(sizes, ({ radiusMm, share, wallDeg }) => {
        const cornerRadiusMm = radiusMm * share
        const centreU = -wallStandOffMm(radiusMm, cornerRadiusMm, wallDeg) + radiusMm - cornerRadiusMm
        const wallRad = (wallDeg * Math.PI) / 180
        const distanceMm = cornerRadiusMm * Math.sin(wallRad) - centreU * Math.cos(wallRad)
        expect(distanceMm).toBeCloseTo(cornerRadiusMm, 9)
      }),
      { seed: 3 },
    )
  })

  it('it refuses a wall that lies flat', () => {
    expect(() => wallStandOffMm(3, 3, 90)).toThrow(expect.objectContaining({ code: 'wall-out-of-range' }))
  })
})

describe('toPartFrame', () => {
  it('it keeps the tilted ball’s centre where the ball touches wall and floor', () => {
    const at = against({ draftDeg: 20, tiltDeg: 35 }, ballCutter)
    const centre = toPartFrame(at, 3, 0)
    const draftRad = (20 * Math.PI) / 180
    expect(centre.hMm).toBeCloseTo(3, 12)
    expect(centre.hMm * Math.sin(draftRad) - centre.uMm * Math.cos(draftRad)).toBeCloseTo(3, 12)
  })

  it('it mirrors the far side', () => {
    const at = against({ tiltDeg: 30 }, ballCutter)
    const [near, far, axis] = [toPartFrame(at, 20, 5), toPartFrame(at, 20, -5), toPartFrame(at, 20, 0)]
    expect((near.uMm + far.uMm) / 2).toBeCloseTo(axis.uMm, 12)
    expect((near.hMm + far.hMm) / 2).toBeCloseTo(axis.hMm, 12)
  })
})

describe('wallTouchMm', () => {
  it.each([
    [0, Number.POSITIVE_INFINITY],
    [0.9e-9, Number.POSITIVE_INFINITY],
    [1.1e-9, 10],
  ])('an overlap of %d mm', (overlapMm, depthMm) => {
    const radiusMm = squareCutter.cuttingDiameterMm / 2 + overlapMm
    expect(wallTouchMm(against({}), 10, radiusMm, 30, radiusMm)).toBe(depthMm)
  })

  it('it finds where a cone comes through a wall that leans less', () => {
    const at = against({ draftDeg: 10 })
    const tan = Math.tan((10 * Math.PI) / 180)
    const r = squareCutter.cuttingDiameterMm / 2
    // radius r - 1 + 0.5 (z - 10) meets r + z tan 10° at z = 6 / (0.5 - tan 10°)
    expect(wallTouchMm(at, 10, r - 1, 40, r + 14)).toBeCloseTo(6 / (0.5 - tan), 9)
  })

  it('it finds where a cone that narrows is still beyond a wall that leans', () => {
    expect(wallTouchMm(against({ draftDeg: 10 }), 10, 9, 40, 2)).toBe(10)
  })

  it('it never touches below the end of a face without end that starts beyond nothing', () => {
    expect(wallTouchMm(against({}), 50, 0, 50, Number.POSITIVE_INFINITY)).toBe(50)
  })
})

describe('obstacleTouchMm', () => {
  const obstacle = { setbackMm: 5, riseMm: 12 }
  const r = squareCutter.cuttingDiameterMm / 2

  it.each([
    ['below its top, over it', 3, r + 5.1, 8, r + 5.1, 0],
    ['in front of it', 3, r + 5, 80, r + 5, Number.POSITIVE_INFINITY],
    ['over it, above its top', 30, r + 6, 40, r + 6, 18],
    ['exactly at its top', 12, 0, 12, r + 6, 0],
    ['growing over it above its top', 20, r + 4, 40, r + 6, 18],
    ['growing over it below its top', 2, r + 4, 10, r + 6, 0],
  ])('%s', (_, z0, r0, z1, r1, depthMm) => {
    expect(obstacleTouchMm(against({}), obstacle, z0, r0, z1, r1)).toBeCloseTo(depthMm, 9)
  })

  it('it counts only passes near enough on a leaning wall', () => {
    const at = against({ draftDeg: 45 })
    expect(obstacleTouchMm(at, obstacle, 20, 0, 20, r + 5 + 8.01)).toBeCloseTo(8, 9)
    expect(obstacleTouchMm(at, obstacle, 20, 0, 20, r + 5 + 7.99)).toBe(Number.POSITIVE_INFINITY)
  })
})

describe('arcObstacleTouchMm', () => {
  it('it agrees with the chords of a fine polygon', () => {
    const cases = fc.record({
      arcRadiusMm: fc.double({ min: 0.5, max: 12, noNaN: true }),
      flatMm: fc.double({ min: 0, max: 5, noNaN: true }),
      taperDeg: fc.double({ min: 0, max: 40, noNaN: true }),
      draftDeg: fc.double({ min: 0, max: 55, noNaN: true }),
      setbackMm: fc.double({ min: 0, max: 6, noNaN: true }),
      riseMm: fc.double({ min: 0, max: 6, noNaN: true }),
      byMm: fc.double({ min: 0.1, max: 4, noNaN: true }),
    })
    let touched = 0
    fc.assert(
      fc.property(cases, ({ arcRadiusMm, flatMm, taperDeg, draftDeg, setbackMm, riseMm, byMm }) => {
        const cutter = {
          ...ballCutter,
          form: 'cornerRadius' as const,
          cuttingDiameterMm: 2 * (arcRadiusMm + flatMm),
          cornerRadiusMm: arcRadiusMm,
        }
        const at = against({ draftDeg }, cutter)
        const topZ = arcRadiusMm * (1 - Math.sin((taperDeg * Math.PI) / 180))
        const arc = cornerArc(arcRadiusMm, flatMm, arcRadiusMm, topZ)
        const chords = 4000
        let leastMm = Number.POSITIVE_INFINITY
        const at0 = (share: number) => {
          const z = topZ * share ** 2
          return [z - byMm, flatMm + byMm + Math.sqrt(arcRadiusMm ** 2 - (arcRadiusMm - z) ** 2)] as const
        }
        for (let chord = 0; chord < chords; chord++) {
          const [[z0, r0], [z1, r1]] = [at0(chord / chords), at0((chord + 1) / chords)]
          leastMm = Math.min(leastMm, obstacleTouchMm(at, { setbackMm, riseMm }, z0, r0, z1, r1))
        }
        const closedMm = arcObstacleTouchMm(at, { setbackMm, riseMm }, arc, byMm)
        if (leastMm === Number.POSITIVE_INFINITY) {
          // Chords lie a hair inside the arc: only a graze may be missed.
          const nearer = arcObstacleTouchMm(at, { setbackMm: setbackMm + 1e-4, riseMm }, arc, byMm)
          expect(nearer).toBe(Number.POSITIVE_INFINITY)
          return
        }
        touched++
        expect(Math.abs(closedMm - leastMm)).toBeLessThan(2e-2)
      }),
      { seed: 4, numRuns: 500 },
    )
    expect(touched).toBeGreaterThan(100)
  })
})

describe('holeTouchMm', () => {
  const at = placementOf({ kind: 'hole', depthMm: 20, diameterMm: 6 }, drillCutter) as HolePlacement

  it.each([
    ['as wide as the hole', 5, 3, 50, 3, Number.POSITIVE_INFINITY],
    ['wider from the start', 5, 3.1, 50, 3.1, 5],
    ['wider on a face', 5, 0, 5, 8, 5],
    ['wider half way up', 10, 2, 20, 4, 15],
    ['narrowing', 10, 4, 20, 2, 10],
  ])('%s', (_, z0, r0, z1, r1, heightMm) => {
    expect(holeTouchMm(at, z0, r0, z1, r1)).toBe(heightMm)
  })
})
