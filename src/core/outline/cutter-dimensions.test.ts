import { describe, expect, it } from 'vitest'
import type { CutterGeometry } from '@/core/tooling'
import { cutterDimensions } from './cutter-dimensions'

const plain: CutterGeometry = {
  form: 'square',
  cuttingDiameterMm: 10,
  lengthOfCutMm: 20,
  shankDiameterMm: 10,
  overallLengthMm: 80,
}

describe('cutterDimensions', () => {
  it('it assumes a run-out of half the diameter after a length of cut given alone, and says so', () => {
    const { fluteLengthMm, assumptions } = cutterDimensions(plain)
    expect(fluteLengthMm).toBe(25)
    expect(assumptions).toEqual(['fluteLength'])
  })

  it('it assumes none where a neck follows', () => {
    const { fluteLengthMm, assumptions } = cutterDimensions({
      ...plain,
      neckDiameterMm: 9,
      reachLengthMm: 40,
      shankDiameterMm: 12,
    })
    expect(fluteLengthMm).toBe(20)
    expect(assumptions).toEqual(['fluteLength', 'transitionAngle'])
  })

  it('it reads a fluted length given alone as the length of cut, with a run-out after it', () => {
    const { lengthOfCutMm, fluteLengthMm, assumptions } = cutterDimensions({
      ...plain,
      lengthOfCutMm: null,
      fluteLengthMm: 22,
    })
    expect([lengthOfCutMm, fluteLengthMm]).toEqual([22, 27])
    expect(assumptions).toEqual(['lengthOfCut', 'fluteLength'])
  })

  it('it assumes nothing where both are given', () => {
    expect(cutterDimensions({ ...plain, fluteLengthMm: 23 }).assumptions).toEqual([])
  })

  it('it never assumes a run-out past the end of the cutter', () => {
    expect(cutterDimensions({ ...plain, overallLengthMm: 22 }).fluteLengthMm).toBe(22)
  })

  it('it takes a radius printed to a thousandth for half the diameter', () => {
    const printed = { ...plain, form: 'tapered' as const, taperHalfAngleDeg: 3, cuttingDiameterMm: 3.175 }
    expect(cutterDimensions({ ...printed, cornerRadiusMm: 1.588 }).hasSphericalTip).toBe(true)
    expect(cutterDimensions({ ...printed, cornerRadiusMm: 1.586 }).hasSphericalTip).toBe(false)
  })

  const refused: [string, Partial<CutterGeometry>, string, string][] = [
    ['a diameter of nothing', { cuttingDiameterMm: 0 }, 'not-positive', 'cuttingDiameterMm'],
    ['a diameter that is no number', { cuttingDiameterMm: Number.NaN }, 'not-finite', 'cuttingDiameterMm'],
    ['an endless shank', { shankDiameterMm: Number.POSITIVE_INFINITY }, 'not-finite', 'shankDiameterMm'],
    ['no length of cut', { lengthOfCutMm: null }, 'length-of-cut-missing', 'lengthOfCutMm'],
    ['flutes shorter than the cut', { fluteLengthMm: 19 }, 'flutes-shorter-than-cut', 'fluteLengthMm'],
    ['a cut longer than the cutter', { lengthOfCutMm: 81 }, 'flutes-longer-than-cutter', 'lengthOfCutMm'],
    ['flutes longer than the cutter', { fluteLengthMm: 81 }, 'flutes-longer-than-cutter', 'fluteLengthMm'],
    [
      'a radius over half',
      { form: 'cornerRadius', cornerRadiusMm: 5.01 },
      'corner-radius-over-half',
      'cornerRadiusMm',
    ],
    ['a corner radius form without', { form: 'cornerRadius' }, 'corner-radius-missing', 'cornerRadiusMm'],
    [
      'a ball of another radius',
      { form: 'ball', cornerRadiusMm: 4 },
      'corner-radius-not-half',
      'cornerRadiusMm',
    ],
    ['a square end with a radius', { cornerRadiusMm: 1 }, 'corner-radius-on-square', 'cornerRadiusMm'],
    ['a taper without its angle', { form: 'tapered' }, 'not-given', 'taperHalfAngleDeg'],
    ['a taper of 90', { form: 'tapered', taperHalfAngleDeg: 90 }, 'taper-out-of-range', 'taperHalfAngleDeg'],
    ['a drill without its point', { form: 'drill' }, 'not-given', 'pointAngleDeg'],
    ['a point over 180', { form: 'drill', pointAngleDeg: 181 }, 'point-angle-out-of-range', 'pointAngleDeg'],
    [
      'a point longer than the cut',
      { form: 'drill', pointAngleDeg: 20 },
      'point-longer-than-cut',
      'pointAngleDeg',
    ],
    [
      'a chamfer wider at its tip',
      { form: 'chamfer', pointAngleDeg: 90, tipDiameterMm: 11 },
      'tip-over-diameter',
      'tipDiameterMm',
    ],
    ['a negative neck taper', { neckTaperHalfAngleDeg: -1 }, 'negative', 'neckTaperHalfAngleDeg'],
    ['a neck taper of 90', { neckTaperHalfAngleDeg: 90 }, 'neck-taper-out-of-range', 'neckTaperHalfAngleDeg'],
    [
      'a transition over 90',
      { neckTransitionAngleDeg: 91 },
      'transition-out-of-range',
      'neckTransitionAngleDeg',
    ],
    ['a reach past the end', { reachLengthMm: 81 }, 'reach-length-longer-than-cutter', 'reachLengthMm'],
  ]

  it.each(refused)('it refuses %s beside its field', (_, given, code, field) => {
    expect(() => cutterDimensions({ ...plain, ...given })).toThrow(
      expect.objectContaining({ code, path: `cutter.${field}` }),
    )
  })
})
