import { describe, expect, it } from 'vitest'
import { CoreInputError } from '../core-input-error'
import { type CutRequest, cutAnswer, defaultCuttingSettings } from './cut-answer'
import { spindleOutputAt } from './spindle-curve'
import { stickOutBand } from './stick-out-caution'
import { findWorkMaterial } from './work-materials'

const steel = findWorkMaterial(2)
const hardened = findWorkMaterial(38)
if (!steel || !hardened) throw new Error('the table has these rows')

const request: CutRequest = {
  cutter: {
    form: 'square',
    cuttingDiameterMm: 12,
    lengthOfCutMm: 26,
    shankDiameterMm: 12,
    overallLengthMm: 83,
    fluteCount: 4,
    substrate: 'carbide',
  },
  material: steel,
  cuttingSpeedMPerMin: 180,
  feedMm: 0.06,
  depthOfCutMm: 6,
  stepoverMm: 6,
  complianceUmPerN: 0.05,
  stickOutToDiameter: 3,
  settings: defaultCuttingSettings,
}
const drill = { ...request.cutter, form: 'drill' as const, fluteCount: null, pointAngleDeg: 140 }

function refusalOf(asked: CutRequest): unknown {
  try {
    return cutAnswer(asked)
  } catch (error) {
    return error
  }
}

describe('cutAnswer', () => {
  it('holds the speed to the least of cutter, holder and spindle, and says so', () => {
    const spindle = { points: [], maximumRpm: 4000, efficiency: 0.8 }
    const answer = cutAnswer({ ...request, spindle, limitsRpm: [6000, null, undefined] })
    expect(answer.spindleRpm).toBe(4000)
    expect(answer.cuttingSpeedMPerMin).toBeCloseTo((Math.PI * 12 * 4000) / 1000, 9)
    expect(answer.assumptions).toContain('speed-limited')
    expect(cutAnswer(request).assumptions).not.toContain('speed-limited')
  })

  it('says where the speed is below what the spindle turns, or above its curve', () => {
    const spindle = {
      points: [{ rpm: 4000, powerKw: 5 }],
      minimumRpm: 5000,
      maximumRpm: 20_000,
      efficiency: 0.8,
    }
    const answer = cutAnswer({ ...request, spindle })
    expect(answer.assumptions).toContain('speed-below-spindle')
    expect(answer.assumptions).toContain('speed-off-curve')
    expect(answer.drive).toBeNull()
  })

  it('reads a shallow ball and a shallow corner at the diameter that cuts', () => {
    const ball = { ...request.cutter, form: 'ball' as const, cornerRadiusMm: 6 }
    expect(cutAnswer({ ...request, cutter: ball, depthOfCutMm: 0.6, stepoverMm: 1 }).diameterMm).toBeCloseTo(
      2 * Math.sqrt(0.6 * 11.4),
      12,
    )
    const corner = { ...request.cutter, form: 'cornerRadius' as const, cornerRadiusMm: 1 }
    expect(cutAnswer({ ...request, cutter: corner, depthOfCutMm: 2 }).diameterMm).toBe(12)
  })

  it('answers a drill with torque and thrust, its point assumed where it is not given', () => {
    const answer = cutAnswer({ ...request, cutter: drill, feedMm: 0.2, depthOfCutMm: null, stepoverMm: null })
    expect(answer.kind).toBe('drilling')
    expect(answer.feedMmPerMin).toBeCloseTo(answer.spindleRpm * 0.2, 9)
    expect(answer.assumptions).not.toContain('point-angle-assumed')
    expect(cutAnswer({ ...request, cutter: { ...drill, pointAngleDeg: null } }).assumptions).toContain(
      'point-angle-assumed',
    )
  })

  it('says where the table prints no exponent', () => {
    expect(cutAnswer({ ...request, material: hardened }).assumptions).toContain('exponent-assumed')
  })

  it.each([
    [{ stepoverMm: null }, 'not-given', 'stepoverMm'],
    [{ stepoverMm: 12.1 }, 'stepover-over-diameter', 'stepoverMm'],
    [{ depthOfCutMm: 0 }, 'not-positive', 'depthOfCutMm'],
    [{ feedMm: Number.NaN }, 'not-finite', 'feedMm'],
    [{ cutter: { ...request.cutter, fluteCount: null } }, 'not-given', 'cutter.fluteCount'],
    [{ cutter: { ...request.cutter, form: 'tap' } }, 'not-estimated', 'cutter.form'],
  ] satisfies [Partial<CutRequest>, string, string][])('refuses %j with %s at %s', (change, code, path) => {
    const refusal = refusalOf({ ...request, ...change })
    expect(refusal).toBeInstanceOf(CoreInputError)
    expect(refusal).toMatchObject({ code, path })
  })
})

describe('spindleOutputAt', () => {
  it.each([
    [[], 'curve-empty'],
    [[{ rpm: 1000 }], 'point-without-output'],
    [
      [
        { rpm: 1000, powerKw: 1 },
        { rpm: 1000, powerKw: 2 },
      ],
      'point-twice',
    ],
    [[{ rpm: 0, powerKw: 1 }], 'not-positive'],
  ])('refuses %j with %s', (points, code) => {
    expect(() => spindleOutputAt(points, 500)).toThrow(expect.objectContaining({ code }))
  })

  it('takes the lesser where power and torque of one point disagree', () => {
    const output = spindleOutputAt([{ rpm: 9549.296585513721, powerKw: 5, torqueNm: 3 }], 9549.296585513721)
    expect(output?.powerKw).toBeCloseTo(3, 9)
  })
})

describe('stickOutBand', () => {
  it.each([
    [3.999, 'plain'],
    [4, 'plain'],
    [4.001, 'caution'],
    [8, 'caution'],
    [8.001, 'over'],
  ])('at %d it is %s', (ratio, band) => {
    expect(stickOutBand(ratio, defaultCuttingSettings)).toBe(band)
  })
})
