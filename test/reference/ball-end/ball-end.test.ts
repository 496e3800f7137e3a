import { readFileSync } from 'node:fs'
import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { ballSpeedAnswer } from '@/core/ball-end/ball-speed-answer'
import { cornerEffectiveDiameterMm } from '@/core/ball-end/corner-diameter'
import { chipThinningFactor, cuttingSpeedMPerMin, spindleRpmForSpeed } from '@/core/ball-end/cutting-speed'
import { scallopHeightMm, stepoverForScallopMm } from '@/core/ball-end/scallop'
import { capHalfAngleDeg, largestEffectiveDiameterMm } from '@/core/ball-end/tip-cap'
import { mmPerInch } from '@/core/units/length-unit'
import { metresPerFoot } from '@/core/units/parse-speed'

/** Every table's source stands in ball-end.md beside it. */
function rowsOf<Column extends string>(file: string): Record<Column, string>[] {
  const text = readFileSync(new URL(file, import.meta.url), 'utf8')
  return Papa.parse<Record<Column, string>>(text, { header: true, skipEmptyLines: true }).data
}

describe('effective diameter against the printed inch table', () => {
  const rows = rowsOf<'diameter_in' | 'depth_of_cut_in' | 'printed_in' | 'past_equator'>('printed-inch.csv')
  const withinHalf = rows.filter((row) => row.past_equator === 'no')

  it('has every printed cell', () => {
    expect([rows.length, withinHalf.length]).toEqual([51, 50])
  })

  it.each(withinHalf)('ball $diameter_in at $depth_of_cut_in cuts $printed_in', (row) => {
    const largestMm = largestEffectiveDiameterMm({
      cuttingDiameterMm: Number(row.diameter_in) * mmPerInch,
      depthOfCutMm: Number(row.depth_of_cut_in) * mmPerInch,
      tiltDeg: 0,
    })
    expect(Math.abs(largestMm / mmPerInch - Number(row.printed_in))).toBeLessThanOrEqual(0.000501)
  })
})

describe('effective diameter against the printed metric table', () => {
  const rows = rowsOf<'diameter_mm' | 'depth_of_cut_mm' | 'printed_mm' | 'past_equator'>('printed-mm.csv')
  const cut = (row: (typeof rows)[number]) => ({
    cuttingDiameterMm: Number(row.diameter_mm),
    depthOfCutMm: Number(row.depth_of_cut_mm),
    tiltDeg: 0,
  })

  it.each(rows.filter((row) => row.past_equator === 'no'))(
    'ball $diameter_mm at $depth_of_cut_mm cuts $printed_mm',
    (row) => {
      expect(Math.abs(largestEffectiveDiameterMm(cut(row)) - Number(row.printed_mm))).toBeLessThanOrEqual(
        0.001,
      )
    },
  )

  it.each(rows.filter((row) => row.past_equator === 'yes'))(
    'ball $diameter_mm at $depth_of_cut_mm cuts its whole diameter, not the $printed_mm printed',
    (row) => {
      expect(largestEffectiveDiameterMm(cut(row))).toBe(Number(row.diameter_mm))
    },
  )
})

describe('tilt, derived', () => {
  const rows = rowsOf<
    'diameter_mm' | 'depth_of_cut_mm' | 'tilt_deg' | 'cap_half_angle_deg' | 'effective_diameter_mm'
  >('derived-tilt.csv')

  it.each(rows)(
    'ball $diameter_mm at $depth_of_cut_mm, $tilt_deg degrees, cuts $effective_diameter_mm',
    (row) => {
      const cuttingDiameterMm = Number(row.diameter_mm)
      const depthOfCutMm = Number(row.depth_of_cut_mm)
      const tiltDeg = Number(row.tilt_deg)
      expect(capHalfAngleDeg(cuttingDiameterMm, depthOfCutMm)).toBeCloseTo(Number(row.cap_half_angle_deg), 3)
      expect(
        Math.abs(
          largestEffectiveDiameterMm({ cuttingDiameterMm, depthOfCutMm, tiltDeg }) -
            Number(row.effective_diameter_mm),
        ),
      ).toBeLessThanOrEqual(0.000051)
    },
  )

  it('gives the hand cases of ball-end.md', () => {
    const answer = ballSpeedAnswer({
      cuttingDiameterMm: 6,
      depthOfCutMm: 0.3,
      tiltDeg: 0,
      spindleRpm: 20_000,
    })
    expect(answer.effectiveDiameterMm.largest).toBeCloseTo(2.6153, 4)
    expect(answer.speedMPerMin?.largest).toBeCloseTo(164.3, 1)
    expect(answer.nominalSpeedMPerMin).toBeCloseTo(377, 1)
    const led = ballSpeedAnswer({ cuttingDiameterMm: 6, depthOfCutMm: 0.3, leadDeg: 30, tiltDeg: 20 })
    expect(led.tiltDeg).toBeCloseTo(35.531, 3)
  })

  it('agrees with the printed engagement angles of 5 and 10 per cent', () => {
    expect(Math.round(capHalfAngleDeg(100, 5))).toBe(26)
    expect(Math.round(capHalfAngleDeg(100, 10))).toBe(37)
  })
})

describe('corner radius, derived', () => {
  const rows = rowsOf<'diameter_mm' | 'corner_radius_mm' | 'depth_of_cut_mm' | 'effective_diameter_mm'>(
    'derived-corner.csv',
  )

  it.each(rows)(
    '$diameter_mm with $corner_radius_mm at $depth_of_cut_mm cuts $effective_diameter_mm',
    (row) => {
      const effectiveMm = cornerEffectiveDiameterMm({
        cuttingDiameterMm: Number(row.diameter_mm),
        cornerRadiusMm: Number(row.corner_radius_mm),
        depthOfCutMm: Number(row.depth_of_cut_mm),
      })
      expect(Math.abs(effectiveMm - Number(row.effective_diameter_mm))).toBeLessThanOrEqual(0.000051)
    },
  )
})

describe('scallop, derived', () => {
  const rows = rowsOf<'unit' | 'diameter' | 'stepover' | 'height'>('derived-scallop.csv')

  it.each(rows)('$diameter $unit at a stepover of $stepover leaves $height', (row) => {
    const mm = row.unit === 'in' ? mmPerInch : 1
    const tip = { cuttingDiameterMm: Number(row.diameter) * mm }
    const heightMm = scallopHeightMm(tip, Number(row.stepover) * mm)
    expect(heightMm / mm / Number(row.height)).toBeCloseTo(1, 3)
    expect(stepoverForScallopMm(tip, Number(row.height) * mm) / mm / Number(row.stepover)).toBeCloseTo(1, 3)
  })
})

describe('chip thinning against the printed factors', () => {
  const rows = rowsOf<'diameter_in' | 'depth_in' | 'printed_factor' | 'table'>('printed-chip-thinning.csv')

  it.each(rows)('$depth_in of $diameter_in ($table) is $printed_factor', (row) => {
    const factor = chipThinningFactor(Number(row.depth_in) * mmPerInch, Number(row.diameter_in) * mmPerInch)
    expect(Math.abs(factor - Number(row.printed_factor))).toBeLessThanOrEqual(0.051)
  })
})

describe('spindle speed against the printed tables', () => {
  const rows = rowsOf<'unit' | 'speed' | 'diameter' | 'printed_rpm' | 'tolerance_rpm' | 'source'>(
    'printed-spindle-speed.csv',
  )

  it.each(rows)('$speed on $diameter $unit is $printed_rpm rpm ($source)', (row) => {
    const isInch = row.unit === 'in'
    const diameterMm = Number(row.diameter) * (isInch ? mmPerInch : 1)
    const speedMPerMin = Number(row.speed) * (isInch ? metresPerFoot : 1)
    const rpm = spindleRpmForSpeed(diameterMm, speedMPerMin)
    expect(Math.abs(rpm - Number(row.printed_rpm))).toBeLessThanOrEqual(Number(row.tolerance_rpm))
    expect(cuttingSpeedMPerMin(diameterMm, rpm)).toBeCloseTo(speedMPerMin, 9)
  })

  it('keeps to the printed rule of 3.82 for inches within its own rounding', () => {
    const rpm = spindleRpmForSpeed(mmPerInch, 100 * metresPerFoot)
    expect(rpm / 382).toBeCloseTo(1, 3)
  })
})
