import { expect, test } from 'vitest'
import { featureWords, filterWords } from './feature-words'
import { noChoices } from './search-question'

test('it says what was asked for in one line, every limit of it', () => {
  const wall = {
    kind: 'wall' as const,
    depthMm: 25,
    draftDeg: 1.5,
    throughMm: 1,
    openingWidthMm: 12,
    insideCornerRadiusMm: 3,
    floorRadiusMm: 0,
    obstacles: [{ setbackMm: 5, riseMm: 8 }],
  }
  expect(featureWords(wall, 'finishing', 'mm')).toBe(
    'Wall 25 mm deep, 1 mm through, draft 1.5°, opening 12 mm, inside corner 3 mm, square floor, 1 obstacle beside it, to finish',
  )
})

test('it leaves out what was not asked, and speaks in the reader’s unit', () => {
  expect(featureWords({ kind: 'wall', depthMm: 25.4 }, null, 'in')).toBe('Wall 1.000 in deep')
  expect(featureWords({ kind: 'hole', diameterMm: 6.5, depthMm: 20 }, 'roughing', 'mm')).toBe(
    'Hole 6.5 mm, 20 mm deep, to rough',
  )
})

test('it says what is looked through only where that is not everything', () => {
  const texts = { stepover: '', cusp: '', ratio: '', ap: '', ae: '', fz: '', vc: '' }
  expect(filterWords({ choices: noChoices, texts, cutMaterial: null })).toBeNull()
  const choices = {
    ...noChoices,
    material: 'Grey iron',
    forms: ['ball' as const],
    substrates: ['hss' as const],
  }
  expect(filterWords({ choices, texts: { ...texts, ratio: '6' }, cutMaterial: 22 })).toBe(
    'in Grey iron; only ball end mill; only of HSS; at most 6 × DC out; a cut estimated for each',
  )
})
