import { describe, expect, it } from 'vitest'
import type { CutterGeometry } from '../tooling'
import { cutterProblems } from './cutter-problems'

const square: CutterGeometry = {
  form: 'square',
  cuttingDiameterMm: 6,
  lengthOfCutMm: 12,
  fluteLengthMm: 15,
  shankDiameterMm: 6,
  overallLengthMm: 57,
}
const paths = (change: Partial<CutterGeometry>) =>
  cutterProblems({ ...square, ...change }).map((problem) => problem.path.join('.'))

/** Just below, on and just above each limit; a limit may be passed by the rounding of a length, 1e-9 mm. */
const limits: [string, Partial<CutterGeometry>, Partial<CutterGeometry>, string][] = [
  [
    'a corner radius of half the diameter',
    { form: 'cornerRadius', cornerRadiusMm: 3 },
    { form: 'cornerRadius', cornerRadiusMm: 3 + 1e-8 },
    'cornerRadiusMm',
  ],
  [
    'a length of cut as long as the flutes',
    { lengthOfCutMm: 15 },
    { lengthOfCutMm: 15 + 1e-8 },
    'lengthOfCutMm',
  ],
  ['flutes as long as the cutter', { fluteLengthMm: 57 }, { fluteLengthMm: 57 + 1e-8 }, 'fluteLengthMm'],
  [
    'a reach length as long as the cutter',
    { reachLengthMm: 57 },
    { reachLengthMm: 57 + 1e-8 },
    'reachLengthMm',
  ],
  [
    'a neck as thick as the flutes',
    { neckDiameterMm: 6, reachLengthMm: 20 },
    { neckDiameterMm: 6 + 1e-8, reachLengthMm: 20 },
    'neckDiameterMm',
  ],
  [
    'a tip as wide as a chamfer',
    { form: 'chamfer', pointAngleDeg: 90, tipDiameterMm: 6 },
    { form: 'chamfer', pointAngleDeg: 90, tipDiameterMm: 6 + 1e-8 },
    'tipDiameterMm',
  ],
  [
    'a right-angled point as long as the length of cut',
    { form: 'drill', pointAngleDeg: 90, lengthOfCutMm: 3 + 1e-12 },
    { form: 'drill', pointAngleDeg: 90, lengthOfCutMm: 3 - 1e-8 },
    'pointAngleDeg',
  ],
]

describe('cutterProblems', () => {
  it('has nothing against a cutter that can be', () => {
    expect(paths({})).toEqual([])
  })

  it.each(limits)('takes %s and nothing beyond', (_, on, beyond, path) => {
    expect(paths(on)).toEqual([])
    expect(paths(beyond)).toEqual([path])
  })

  it('takes a neck that begins where the flutes end, and not one that ends there', () => {
    expect(paths({ neckDiameterMm: 5, reachLengthMm: 15.01 })).toEqual([])
    expect(paths({ neckDiameterMm: 5, reachLengthMm: 15 })).toEqual(['reachLengthMm'])
  })

  it('lets a taper carry on through the run-out before a neck begins', () => {
    // A sharp tip of Ø2 that opens at 10° a side is Ø(2 + 2·15·tan 10°) = Ø7.2898 after 15 mm: worked by hand.
    const tapered = {
      form: 'tapered',
      cuttingDiameterMm: 2,
      taperHalfAngleDeg: 10,
      reachLengthMm: 30,
    } as const
    expect(paths({ ...tapered, neckDiameterMm: 7.2898 })).toEqual([])
    expect(paths({ ...tapered, neckDiameterMm: 7.29 })).toEqual(['neckDiameterMm'])
  })

  it('asks of a half made ball only what it has cut so far', () => {
    // A Ø6 ball with 1 mm of flutes is Ø(2·√(3² − 2²)) = Ø4.4721 there: worked by hand.
    const stub = { form: 'ball', lengthOfCutMm: 1, fluteLengthMm: 2, reachLengthMm: 20 } as const
    expect(paths({ ...stub, neckDiameterMm: 4.4721 })).toEqual([])
    expect(paths({ ...stub, neckDiameterMm: 4.4722 })).toEqual(['neckDiameterMm'])
  })

  it('refuses what contradicts the form', () => {
    expect(paths({ cornerRadiusMm: 0.5 })).toEqual(['cornerRadiusMm'])
    expect(paths({ taperHalfAngleDeg: 1 })).toEqual(['taperHalfAngleDeg'])
    expect(paths({ pointAngleDeg: 118 })).toEqual(['pointAngleDeg'])
    expect(paths({ tipDiameterMm: 1 })).toEqual(['tipDiameterMm'])
    expect(paths({ form: 'ball', cornerRadiusMm: 2.9 })).toEqual(['cornerRadiusMm'])
  })

  it('takes noughts and a flat point for what they are: nothing given', () => {
    expect(paths({ cornerRadiusMm: 0, taperHalfAngleDeg: 0, tipDiameterMm: 0, pointAngleDeg: 180 })).toEqual(
      [],
    )
  })

  it('names each field that is wrong', () => {
    expect(paths({ form: 'chamfer', overallLengthMm: 10 })).toEqual([
      'pointAngleDeg',
      'tipDiameterMm',
      'lengthOfCutMm',
      'fluteLengthMm',
    ])
  })
})
