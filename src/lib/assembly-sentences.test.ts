import { describe, expect, it } from 'vitest'
import { differenceWords, featureWords, findingSentence, sizeChangeWords } from './assembly-sentences'

describe('what changed, in words', () => {
  it('it says lengths in the reader’s unit, angles in degrees', () => {
    expect(sizeChangeWords({ field: 'cuttingDiameterMm', before: 6.35, after: 6.223 }, 'in')).toBe(
      'cutting diameter 0.250 in → 0.245 in',
    )
    expect(sizeChangeWords({ field: 'taperHalfAngleDeg', before: 1, after: 1.5 }, 'mm')).toBe(
      'taper a side 1° → 1.5°',
    )
  })

  it('it says an outline by its segments, a bore by what it takes, what was missing as not given', () => {
    const nut = { part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }
    const body = { part: 'holder', lengthMm: 50, noseDiameterMm: 32, spindleDiameterMm: 36 }
    expect(sizeChangeWords({ field: 'segments', before: [nut], after: [nut, body] }, 'mm')).toBe(
      'outline 18 × Ø28 → 18 × Ø28, 50 × Ø32 to 36',
    )
    const bore = {
      field: 'bore',
      before: { kind: 'collet', series: 'ER16' },
      after: { kind: 'fixed', diameterMm: 6 },
    }
    expect(sizeChangeWords(bore, 'mm')).toBe('bore ER16 collets → 6 mm')
    expect(sizeChangeWords({ field: 'neckDiameterMm', before: null, after: 3 }, 'mm')).toBe(
      'neck diameter not given → 3 mm',
    )
  })
})

it('it names a feature by what bounds it', () => {
  const wall = {
    kind: 'wall',
    depthMm: 25,
    floorRadiusMm: 0,
    obstacles: [{ setbackMm: 5, riseMm: 9 }],
  } as const
  expect(featureWords({ ...wall, obstacles: [...wall.obstacles] }, 'mm')).toBe(
    'Wall 25 mm deep, square floor, 1 obstacle',
  )
  expect(featureWords({ kind: 'hole', depthMm: 20, diameterMm: 6.5 }, 'mm')).toBe('Hole Ø6.5 mm, 20 mm deep')
})

it('it says whose part is missing where nobody can know', () => {
  expect(findingSentence({ code: 'partGone', part: 'holder', held: 1, claimed: 2 }, 'mm')).toContain('1 of 2')
})

it('it gives a difference its sign, and none to nothing', () => {
  expect(differenceWords(139.62, 139.5, 'mm')).toBe('+0.12 mm')
  expect(differenceWords(139.38, 139.5, 'mm')).toBe('−0.12 mm')
  expect(differenceWords(139.5, 139.5, 'mm')).toBe('0 mm')
})
