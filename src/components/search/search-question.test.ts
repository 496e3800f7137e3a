import { describe, expect, test } from 'vitest'
import { defaultReachSettings } from '@/core/reach/types'
import type { Reading } from '../reach/read-field'
import { compileSearch, noChoices, searchDraft, searchQuery, withChoices } from './search-question'

const mm: Reading = { unit: 'mm', decimalComma: false }
const inches: Reading = { unit: 'in', decimalComma: false }

const compiled = (query: string, reading = mm) =>
  compileSearch(searchDraft(new URLSearchParams(query), reading), reading, defaultReachSettings)

function requestOf(query: string, reading = mm) {
  const search = compiled(query, reading)
  if (search.state !== 'asked') throw new Error(`${query} is ${search.state}`)
  return search.request
}

function errorsOf(query: string) {
  const search = compiled(query)
  return search.state === 'refused' ? search.errors : {}
}

const whole = [
  'depth=25&draft=2&opening=12&corner=3&floor=0&obstacles=5x8&for=finishing&stepover=0.3&cusp=0.01&ratio=6',
  'cut=22&ap=2&ae=1&fz=0.04&vc=100&rank=cost&crib=2&machine=3&stock=yes&forms=square,ball&tool=carbide&material=Tool+steel',
].join('&')

describe('a search in the address', () => {
  test('it asks everything it names', () => {
    expect(requestOf(whole)).toMatchObject({
      feature: {
        kind: 'wall',
        depthMm: 25,
        draftDeg: 2,
        openingWidthMm: 12,
        insideCornerRadiusMm: 3,
        floorRadiusMm: 0,
        obstacles: [{ setbackMm: 5, riseMm: 8 }],
      },
      purpose: 'finishing',
      scallop: { stepoverMm: 0.3, maximumHeightMm: 0.01 },
      cut: { materialNumber: 22, depthOfCutMm: 2, stepoverMm: 1, feedMm: 0.04, cuttingSpeedMPerMin: 100 },
      where: {
        cribId: '2',
        machineId: '3',
        inStockOnly: true,
        forms: ['square', 'ball'],
        substrates: ['carbide'],
        material: 'Tool steel',
        longestStickOutToDiameter: 6,
      },
      rankBy: 'cost',
      perCutter: 1,
    })
  })

  test('it is written as it was read, whatever unit the reader has', () => {
    const asSorted = (query: URLSearchParams) => [...query].sort()
    for (const reading of [mm, inches]) {
      const written = searchQuery(searchDraft(new URLSearchParams(whole), reading), reading)
      expect(asSorted(written)).toEqual(asSorted(new URLSearchParams(whole)))
      expect(requestOf(whole, reading).feature).toEqual(requestOf(whole).feature)
    }
    expect(requestOf(whole, inches).sentenceUnit).toBe('in')
  })

  test('it asks for a cut that is whole, and says what is missing of one that is not', () => {
    expect(requestOf('depth=25').cut).toBeNull()
    expect(Object.keys(errorsOf('depth=25&cut=22&ap=2'))).toEqual(['cut.stepoverMm', 'cut.feedMm'])
    expect(errorsOf('depth=25&ap=2&ae=1&fz=0.04')).toHaveProperty(['cut.materialNumber'])
    expect(requestOf('feature=hole&depth=25&diameter=8&cut=2&fz=0.2').cut).toMatchObject({
      feedMm: 0.2,
      depthOfCutMm: null,
    })
  })

  test('it lists every holder of the one cutter it names', () => {
    const { perCutter, where } = requestOf('depth=25&cutter=7')
    expect([perCutter, where?.cutterId]).toEqual([null, '7'])
  })

  test('it passes over the tools of a check it was made from', () => {
    const draft = searchDraft(new URLSearchParams('depth=25&holder=4&c.DC=6&stickout=40&ch=0.75'), mm)
    expect(searchQuery(draft, mm).toString()).toBe('depth=25&ch=0.75')
  })

  test('it keeps what cannot be read, marked, and asks nothing', () => {
    const draft = searchDraft(new URLSearchParams('depth=25&ratio=6'), mm)
    const typed = { ...draft, texts: { ...draft.texts, ratio: 'six' } }
    const query = searchQuery(typed, mm)
    expect(query.get('ratio')).toBe('unread:six')
    expect(searchDraft(query, mm).texts.ratio).toBe('six')
    expect(errorsOf(query.toString())).toHaveProperty(['where.longestStickOutToDiameter'])
  })

  test('it changes choices alone where only these are changed', () => {
    const next = withChoices(new URLSearchParams('depth=25&stock=yes&forms=ball'), noChoices)
    expect(next.toString()).toBe('depth=25')
  })
})

describe('a search that cannot be asked yet', () => {
  test('it is empty before anything is given', () => {
    expect(compiled('').state).toBe('empty')
    expect(compiled('rank=stock').state).toBe('empty')
  })

  test.each([
    ['draft=2', 'feature.depthMm'],
    ['feature=hole&depth=20', 'feature.diameterMm'],
    ['depth=unread:25+cubits', 'feature.depthMm'],
    ['depth=5&for=finishing&stepover=0.3', 'scallop.maximumHeightMm'],
    ['depth=5&for=finishing&cusp=0.01', 'scallop.stepoverMm'],
  ])('it says of %s what is missing at %s', (query, path) => {
    expect(Object.keys(errorsOf(query))).toEqual([path])
  })
})
