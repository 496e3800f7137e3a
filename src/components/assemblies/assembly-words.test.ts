import { describe, expect, it } from 'vitest'
import type { AssemblyPart, AssemblyPlace, AssemblyRow } from '@/schemas/assembly'
import { difference, partPlaceWords, placeWords, spotWords } from './assembly-words'

const bin: AssemblyPlace = {
  locationId: '1',
  kind: 'bin',
  code: 'B1-02',
  name: 'Bin B1-02',
  cribCode: 'MAIN',
}
const mill: AssemblyPlace = { locationId: '2', kind: 'machine', code: 'M1', name: 'Mill', cribCode: null }
const hands: AssemblyPlace = {
  locationId: '3',
  kind: 'person',
  code: 'ada@x',
  name: 'Ada Kern',
  cribCode: null,
}
const part: AssemblyPart = {
  kind: 'cutter',
  itemId: '9',
  code: 'EM-1',
  description: '',
  isTrackedByPiece: false,
  isArchived: false,
  pieceId: null,
  pieceTag: null,
  place: null,
  home: null,
  condition: null,
  bins: [],
  pieces: [],
}
const row = (change: Partial<AssemblyRow>): AssemblyRow => ({
  id: '1',
  version: 1,
  number: 12,
  name: '',
  state: 'built',
  stickOutMm: 30,
  gaugeLengthMm: 130,
  toolNumber: null,
  lengthOffsetNumber: null,
  diameterOffsetNumber: null,
  archivedAt: null,
  parts: [],
  place: hands,
  machine: null,
  pocket: null,
  isMarked: false,
  isBeingRechecked: false,
  measurement: null,
  ...change,
})

describe('where something is', () => {
  it('it is a bin by crib and code, a machine by its code, a person by name', () => {
    expect([bin, mill, hands].map(placeWords)).toEqual(['MAIN B1-02', 'M1', 'Ada Kern'])
  })

  it('it is told of an assembly by what matters of its state', () => {
    expect(spotWords(row({ state: 'planned', place: null }))).toBe('Not built')
    expect(spotWords(row({ state: 'brokenDown', place: null }))).toBe('Broken down')
    expect(spotWords(row({}))).toBe('Ada Kern')
    const machine = { id: '1', code: 'M1', name: 'Mill' }
    expect(spotWords(row({ machine, pocket: null }))).toBe('M1')
    expect(spotWords(row({ machine, pocket: 7 }))).toBe('M1, pocket 7')
  })

  it('it is told of a part by its place, else by the fullest bin, else as none', () => {
    expect(partPlaceWords({ ...part, place: mill, condition: 'used' })).toBe('M1, used')
    const bins = [
      { place: bin, condition: 'new' as const, quantity: 3 },
      { place: bin, condition: 'used' as const, quantity: 1 },
    ]
    expect(partPlaceWords({ ...part, bins })).toBe('MAIN B1-02, new: 3 and 1 more')
    expect(partPlaceWords(part)).toBe('None in any bin')
    const tagged = {
      ...part,
      isTrackedByPiece: true,
      pieceTag: 'P-7',
      place: hands,
      condition: 'new' as const,
    }
    expect(partPlaceWords(tagged)).toBe('P-7 · Ada Kern, new')
  })
})

it('it says a difference over the tolerance, at it and under it', () => {
  expect(difference(130.05, 130, 0.05, 'mm')).toEqual({ text: '+0.05 mm', isOver: false })
  expect(difference(130.051, 130, 0.05, 'mm').isOver).toBe(true)
  expect(difference(129.94, 130, 0.05, 'mm')).toEqual({ text: '−0.06 mm', isOver: true })
})
