import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { holderPlans } from '../../db/seeds/demo-shop/holders'

/* Values and their sources stand in holders.md. */

interface Flange {
  gaugeMm: number
  coneMm: number
  smallEndMm: number | null
  flangeMm: number
  frontMm: number
}

const flanges = new Map(
  readFileSync(new URL('holders.md', import.meta.url), 'utf8')
    .split('\n')
    .filter((line) => /^\| (BT|CAT)/.test(line))
    .map((line) => line.split('|').map((cell) => cell.trim()))
    .map(([, size, gauge, cone, small, flange, front]): [string, Flange] => [
      size ?? '',
      {
        gaugeMm: Number(gauge),
        coneMm: Number(cone),
        smallEndMm: small ? Number(small) : null,
        flangeMm: Number(flange),
        frontMm: Number(front),
      },
    ]),
)

describe('tapers', () => {
  it('it has cones of 7 in 24', () => {
    const printed = [...flanges.values()].filter(({ smallEndMm }) => smallEndMm !== null)
    expect(printed).toHaveLength(3)
    for (const { gaugeMm, coneMm, smallEndMm } of printed) {
      expect(Math.abs(gaugeMm - (coneMm * 7) / 24 - (smallEndMm ?? 0))).toBeLessThan(0.001)
    }
  })

  it('it gives every holder of the demo shop the flange of its own taper, ending at the gauge line', () => {
    const plans = holderPlans()
    expect(plans.length).toBeGreaterThan(10)
    for (const { code, geometry, segments } of plans) {
      const flange = flanges.get(geometry.taper)
      const last = segments.at(-1)
      expect(flange, `${code} has a taper of the table`).toBeDefined()
      expect(last?.spindle, code).toBe(flange?.flangeMm)
      expect(last?.length, code).toBe(flange?.frontMm)
      const lengthMm = segments.reduce((sum, segment) => sum + segment.length, 0)
      expect(lengthMm, code).toBeCloseTo(geometry.gauge_length_mm, 6)
    }
  })
})
