import { describe, expect, it } from 'vitest'
import type { CutterGeometry } from '@/core/tooling'
import { assemblyOutline } from './assembly-outline'
import { cutterOutline } from './cutter-outline'
import type { OutlinePart, OutlineStroke } from './types'

const plain: CutterGeometry = {
  form: 'square',
  cuttingDiameterMm: 10,
  lengthOfCutMm: 20,
  fluteLengthMm: 24,
  shankDiameterMm: 10,
  overallLengthMm: 80,
}
const forms: CutterGeometry[] = [
  plain,
  { ...plain, form: 'cornerRadius', cornerRadiusMm: 1.5 },
  { ...plain, form: 'ball' },
  { ...plain, form: 'tapered', taperHalfAngleDeg: 4 },
  { ...plain, form: 'tapered', taperHalfAngleDeg: 4, cornerRadiusMm: 5 },
  { ...plain, form: 'tapered', taperHalfAngleDeg: 4, cornerRadiusMm: 2, shankDiameterMm: 20 },
  { ...plain, form: 'drill', pointAngleDeg: 118 },
  { ...plain, form: 'reamer' },
  { ...plain, form: 'tap', pointAngleDeg: 60 },
  { ...plain, form: 'chamfer', pointAngleDeg: 90, tipDiameterMm: 2 },
  { ...plain, form: 'faceMill', neckDiameterMm: 8, reachLengthMm: 40 },
  { ...plain, neckDiameterMm: 9, reachLengthMm: 40, shankDiameterMm: 12, neckTaperHalfAngleDeg: 1 },
  { ...plain, neckDiameterMm: 9, reachLengthMm: 40, shankDiameterMm: 12, neckTransitionAngleDeg: 90 },
]

const strokesOf = (parts: OutlinePart[]): OutlineStroke[] => parts.flatMap(({ segments }) => segments)
const partNames = (cutter: CutterGeometry) => cutterOutline(cutter).map(({ part }) => part)

describe('cutterOutline', () => {
  it.each(forms)('it joins end to end, from the axis at the tip to the overall length: $form', (cutter) => {
    const strokes = strokesOf(cutterOutline(cutter))
    expect([strokes[0]?.fromZMm, strokes[0]?.fromRadiusMm]).toEqual([0, 0])
    for (const [index, stroke] of strokes.slice(1).entries()) {
      expect(stroke.fromZMm).toBeCloseTo(strokes[index]?.toZMm ?? Number.NaN, 12)
      expect(stroke.fromRadiusMm).toBeCloseTo(strokes[index]?.toRadiusMm ?? Number.NaN, 12)
      expect(stroke.toZMm).toBeGreaterThanOrEqual(stroke.fromZMm)
    }
    expect(strokes.at(-1)?.toZMm).toBe(cutter.overallLengthMm)
  })

  it.each(forms)('it ends every arc tangent to what follows it: $form', (cutter) => {
    const strokes = strokesOf(cutterOutline(cutter))
    for (const [index, arc] of strokes.entries()) {
      if (arc.kind !== 'arc') continue
      const next = strokes[index + 1]
      if (!next || next.toZMm === next.fromZMm) continue
      const slope = (next.toRadiusMm - next.fromRadiusMm) / (next.toZMm - next.fromZMm)
      const arcSlope = (arc.centreZMm - arc.toZMm) / (arc.toRadiusMm - arc.centreRadiusMm)
      expect(arcSlope).toBeCloseTo(slope, 9)
    }
  })

  it('it draws a thicker shank without a neck as a square step at the end of the flutes', () => {
    const shank = cutterOutline({ ...plain, shankDiameterMm: 12 }).find(({ part }) => part === 'shank')
    expect(shank?.segments[0]).toEqual({
      kind: 'line',
      fromZMm: 24,
      fromRadiusMm: 5,
      toZMm: 24,
      toRadiusMm: 6,
    })
  })

  it('it leaves out parts without length, and a neck that ends within the flutes', () => {
    expect(partNames({ ...plain, fluteLengthMm: 20 })).toEqual(['flute', 'shank'])
    expect(partNames({ ...plain, neckDiameterMm: 9, reachLengthMm: 24 })).toEqual([
      'flute',
      'runOut',
      'shank',
    ])
  })

  it('it cuts a transition off at the overall length', () => {
    const long = { ...plain, neckDiameterMm: 4, reachLengthMm: 79, shankDiameterMm: 10 }
    const transition = cutterOutline(long).at(-1)
    expect(transition?.part).toBe('transition')
    expect(transition?.segments.at(-1)?.toRadiusMm).toBeCloseTo(3, 12)
  })

  it('it carries a taper on through the run-out', () => {
    const runOut = cutterOutline({ ...plain, form: 'tapered', taperHalfAngleDeg: 4 })[1]
    expect(runOut?.part).toBe('runOut')
    expect(runOut?.segments[0]?.toRadiusMm).toBeCloseTo(5 + 24 * Math.tan((4 * Math.PI) / 180), 12)
  })
})

describe('assemblyOutline', () => {
  const holder = {
    gaugeLengthMm: 60,
    spindleNoseDiameterMm: 90,
    segments: [
      { part: 'nut' as const, lengthMm: 20, noseDiameterMm: 30, spindleDiameterMm: 28 },
      { part: 'holder' as const, lengthMm: 30, noseDiameterMm: 40, spindleDiameterMm: 50 },
    ],
  }
  const extension = {
    projectionMm: 70,
    segments: [{ lengthMm: 50, noseDiameterMm: 16, spindleDiameterMm: 20 }],
  }

  it('it stacks cutter, extension, holder and spindle face, the last diameters carried up', () => {
    const parts = assemblyOutline(plain, holder, extension, 40)
    expect(parts.map(({ part }) => part)).toEqual([
      'flute',
      'runOut',
      'shank',
      'extension',
      'nut',
      'holder',
      'spindle',
    ])
    const endOf = (name: string) => parts.find(({ part }) => part === name)?.segments.at(-1)
    expect(endOf('shank')?.toZMm).toBe(40)
    expect([endOf('extension')?.toZMm, endOf('extension')?.toRadiusMm]).toEqual([110, 10])
    expect([endOf('holder')?.toZMm, endOf('holder')?.toRadiusMm]).toEqual([170, 25])
    expect([endOf('spindle')?.fromZMm, endOf('spindle')?.toRadiusMm]).toEqual([170, 45])
  })

  it('it draws a spindle of unknown width without end', () => {
    const parts = assemblyOutline(plain, { ...holder, spindleNoseDiameterMm: null }, null, 40)
    expect(parts.at(-1)?.segments[0]?.toRadiusMm).toBe(Number.POSITIVE_INFINITY)
  })

  it.each([
    ['no segment', { ...holder, segments: [] }, 'segments-missing'],
    ['segments longer than the gauge length', { ...holder, gaugeLengthMm: 49 }, 'segments-too-long'],
    ['a gauge length of nothing', { ...holder, gaugeLengthMm: 0 }, 'not-positive'],
  ])('it refuses %s', (_, bad, code) => {
    expect(() => assemblyOutline(plain, bad, null, 40)).toThrow(expect.objectContaining({ code }))
  })
})
