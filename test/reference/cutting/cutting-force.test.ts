import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { cuttingSpeedMPerMin, spindleRpmForSpeed } from '@/core/ball-end/cutting-speed'
import { type CutRequest, cutAnswer, defaultCuttingSettings } from '@/core/cutting/cut-answer'
import { drillingForce, drillingThrustN, drillingTorqueNm } from '@/core/cutting/drilling-force'
import { engagementRad, meanChipMm } from '@/core/cutting/engagement'
import { type MillingCut, millingForce, powerAtTorqueKw } from '@/core/cutting/milling-force'
import { specificForceNPerMm2 } from '@/core/cutting/specific-force'
import { spindleOutputAt } from '@/core/cutting/spindle-curve'
import { findWorkMaterial, workMaterials } from '@/core/cutting/work-materials'

/* Values and their sources stand in cutting-force.md and drilling.md. */

const kienzle = (unitForceNPerMm2: number, thicknessExponent: number) => ({
  unitForceNPerMm2,
  thicknessExponent,
})

describe('specific cutting force', () => {
  it('it has every row of the printed table, no more and no fewer', () => {
    const printed = readFileSync(new URL('work-materials.csv', import.meta.url), 'utf8')
      .trim()
      .split('\n')
      .slice(1)
      .map((line) => line.split(','))
    expect(workMaterials.map((material) => material.number)).toEqual(
      printed.map(([number]) => Number(number)),
    )
    for (const [number, iso, unitForce, exponent] of printed) {
      const material = findWorkMaterial(Number(number))
      expect(iso?.split('/')).toContain(material?.isoGroup)
      expect(material?.unitForceNPerMm2).toBe(Number(unitForce))
      expect(material?.isExponentAssumed).toBe(exponent === '')
      expect(material?.thicknessExponent).toBe(exponent === '' ? 0.25 : Number(exponent))
    }
  })

  it.each([
    [1700, 0.24, 0.1, '2954.3'],
    [2150, 0.2, 0.1, '3407.5'],
    [700, 0.25, 0.05, '1480.3'],
    [1500, 0.22, 0.1, '2489'],
  ])('it gives the derived value for %d, %d at %d mm', (unitForce, exponent, chipMm, derived) => {
    const digits = derived.split('.')[1]?.length ?? 0
    expect(specificForceNPerMm2(kienzle(unitForce, exponent), chipMm).toFixed(digits)).toBe(derived)
  })
})

describe('milling', () => {
  /** At the cutter, of a material whose kc does not change with the chip: a printed example names one kc. */
  const powerKw = (cut: MillingCut, specificForce: number, spindleRpm: number) =>
    powerAtTorqueKw(millingForce(cut, kienzle(specificForce, 0), 0.4).torqueNm, spindleRpm)

  it('it gives the power a maker prints, 1.68 kW (Mitsubishi Materials)', () => {
    const rpm = spindleRpmForSpeed(250, 80)
    expect(rpm).toBeCloseTo(101.859, 3)
    const feedPerToothMm = 280 / (12 * rpm)
    expect(feedPerToothMm).toBeCloseTo(0.22907, 5)
    const cut = { diameterMm: 250, fluteCount: 12, depthOfCutMm: 2, stepoverMm: 80, feedPerToothMm }
    expect(powerKw(cut, 1800, rpm) / 0.8).toBeCloseTo(1.68, 2)
  })

  it('it agrees with a maker’s formula in kgf within what rounding its constant costs (Kyocera R42)', () => {
    const [ap, ae, vf, efficiency, rpm] = [3, 20, 400, 0.75, 1000]
    const printedKw = (240 * ae * vf * ap) / (6_120_000 * efficiency)
    const cut = {
      diameterMm: 32,
      fluteCount: 4,
      depthOfCutMm: ap,
      stepoverMm: ae,
      feedPerToothMm: vf / (4 * rpm),
    }
    const ours = powerKw(cut, 240 * 9.80665, rpm) / efficiency
    expect(ours / printedKw).toBeGreaterThan(0.9995)
    expect(ours / printedKw).toBeLessThan(1.0005)
  })

  it('it gives the derived end mill, by force and by volume alike', () => {
    const rpm = spindleRpmForSpeed(12, 180)
    const feedMmPerMin = rpm * 4 * 0.06
    expect(rpm).toBeCloseTo(4774.6, 1)
    expect(feedMmPerMin).toBeCloseTo(1145.9, 1)
    expect((engagementRad(3, 12) * 180) / Math.PI).toBeCloseTo(60, 9)
    expect(meanChipMm(0.06, 3, 12)).toBeCloseTo(0.028648, 6)
    const cut = { diameterMm: 12, fluteCount: 4, depthOfCutMm: 6, stepoverMm: 3, feedPerToothMm: 0.06 }
    const force = millingForce(cut, kienzle(1500, 0.22), 0.4)
    expect(force.specificForceNPerMm2).toBeCloseTo(3277.4, 1)
    expect(force.torqueNm).toBeCloseTo(2.2534, 4)
    expect(powerAtTorqueKw(force.torqueNm, rpm)).toBeCloseTo(1.1267, 4)
    const byVolumeKw = (6 * 3 * feedMmPerMin * force.specificForceNPerMm2) / 60e6
    expect(byVolumeKw).toBeCloseTo(powerAtTorqueKw(force.torqueNm, rpm), 9)
    expect((6 * 3 * feedMmPerMin) / 1000).toBeCloseTo(20.626, 3)
  })

  it('it bends the tool by one whole tooth at least, and by all that are in a slot (by hand)', () => {
    const cut = { diameterMm: 12, fluteCount: 4, depthOfCutMm: 6, stepoverMm: 3, feedPerToothMm: 0.06 }
    const side = millingForce(cut, kienzle(1500, 0.22), 0.4)
    expect(side.cuttingForceN).toBeCloseTo(375.56, 1)
    expect(side.sideLoadN).toBeCloseTo(606.74, 1)
    expect(millingForce(cut, kienzle(1500, 0.22), 0).sideLoadN).toBeCloseTo(563.34, 1)
    const slot = millingForce({ ...cut, stepoverMm: 12 }, kienzle(1500, 0.22), 0)
    expect(slot.teethInCut).toBeCloseTo(2, 12)
    expect(slot.sideLoadN).toBeCloseTo(1410.2, 0)
    expect(slot.sideLoadN).toBeCloseTo(slot.cuttingForceN, 9)
  })
})

describe('drilling', () => {
  it('it gives speed, feed, power, torque and thrust as a maker prints them (Iscar, page 601)', () => {
    const rpm = spindleRpmForSpeed(22, 200)
    expect(Math.round(rpm)).toBe(2894)
    expect(Math.round(rpm * 0.15)).toBe(434)
    const torqueNm = drillingTorqueNm(22, 0.15, 2200)
    expect(Math.round(torqueNm)).toBe(20)
    expect(Math.floor((powerAtTorqueKw(torqueNm, rpm) / 0.75) * 100) / 100).toBe(8.06)
    expect(Math.floor(drillingThrustN(22, 0.15, 2200, 180))).toBe(2286)
    expect(cuttingSpeedMPerMin(22, 2894)).toBeCloseTo(200, 0)
  })

  it('it takes kc at the chip’s own thickness, half the feed across the lip', () => {
    const force = drillingForce(
      { diameterMm: 10, feedPerRevolutionMm: 0.2, pointAngleDeg: 140 },
      kienzle(1700, 0.24),
    )
    expect(force.chipMm).toBeCloseTo(0.1 * 0.9396926, 6)
    expect(force.specificForceNPerMm2).toBeCloseTo(1700 * (0.1 * 0.9396926) ** -0.24, 1)
    expect(force.torqueNm).toBeCloseTo((0.2 * force.specificForceNPerMm2 * 100) / 8000, 9)
  })

  it.each([
    ['low carbon steel', 2, 2.22],
    ['aluminium', 21, 1.01],
    ['chromium molybdenum steel, 269 HB', 7, 2.41],
  ])(
    'it lies within half and half as much again of another maker’s torque for %s (Tungaloy L068)',
    (_, number, k) => {
      const material = findWorkMaterial(number)
      if (!material) throw new Error('the table has this row')
      for (const [diameterMm, feed] of [
        [6, 0.12],
        [10, 0.2],
        [10, 0.3],
        [20, 0.3],
      ] as const) {
        const torqueNm = (k * diameterMm ** 2 * (0.63 + 16.84 * feed)) / 100
        const ours = drillingForce({ diameterMm, feedPerRevolutionMm: feed, pointAngleDeg: 118 }, material)
        expect(ours.torqueNm / torqueNm).toBeGreaterThan(0.5)
        expect(ours.torqueNm / torqueNm).toBeLessThan(1.5)
      }
    },
  )
})

describe('a spindle’s curve', () => {
  const curve = [
    { rpm: 8000, powerKw: 11 },
    { rpm: 1500, torqueNm: 70 },
  ]

  it('it gives what was worked by hand, never a torque its power does not allow', () => {
    expect(spindleOutputAt(curve, 1500)?.powerKw).toBeCloseTo(10.9956, 4)
    expect(spindleOutputAt(curve, 8000)?.torqueNm).toBeCloseTo(13.1303, 4)
    expect(spindleOutputAt(curve, 4000)?.powerKw).toBeCloseTo(10.9973, 4)
    expect(spindleOutputAt(curve, 4000)?.torqueNm).toBeCloseTo(26.254, 3)
    expect(spindleOutputAt(curve, 750)?.torqueNm).toBe(70)
    expect(spindleOutputAt(curve, 750)?.powerKw).toBeCloseTo(5.4978, 4)
    expect(spindleOutputAt(curve, 8001)).toBeNull()
  })
})

describe('a cut asked of an assembly and a machine', () => {
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
    material: { number: 2, isoGroup: 'P', name: 'Steel', ...kienzle(1500, 0.22), isExponentAssumed: false },
    cuttingSpeedMPerMin: 180,
    feedMm: 0.06,
    depthOfCutMm: 6,
    stepoverMm: 6,
    complianceUmPerN: 0.05,
    stickOutToDiameter: 3,
    settings: defaultCuttingSettings,
  }

  it('it raises the feed by radial chip thinning, so that the thickest chip stays', () => {
    const answer = cutAnswer({ ...request, stepoverMm: 3 })
    if (answer.kind !== 'milling') throw new Error('a milling cut was asked')
    expect(answer.chipThinningFactor).toBeCloseTo(1 / (2 * Math.sqrt(0.25 * 0.75)), 12)
    expect(answer.feedPerToothMm * Math.sin(Math.PI / 3)).toBeCloseTo(0.06, 12)
    expect(answer.feedMmPerMin).toBeCloseTo(answer.spindleRpm * 4 * answer.feedPerToothMm, 9)
    expect(answer.deflectionUm).toBeCloseTo(answer.sideLoadN * 0.05, 12)
  })

  it('it asks power of the motor over the efficiency, and says whether the curve gives it', () => {
    const flat = (powerKw: number) => [
      { rpm: 4000, powerKw },
      { rpm: 10_000, powerKw },
    ]
    const spindle = { points: flat(5), maximumRpm: 10_000, efficiency: 0.8 }
    const answer = cutAnswer({ ...request, spindle })
    expect(answer.motorPowerKw).toBeCloseTo(answer.powerKw / 0.8, 12)
    expect(answer.drive?.drives).toBe(true)
    const weak = cutAnswer({ ...request, spindle: { ...spindle, points: flat(2) } })
    expect(weak.drive?.drives).toBe(false)
    expect(weak.drive?.torqueShare).toBeGreaterThan(1)
  })
})
