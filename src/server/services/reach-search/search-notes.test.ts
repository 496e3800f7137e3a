import { expect, test } from 'vitest'
import { defaultReachSettings, type Feature } from '@/core/reach/types'
import { searchReach } from '@/core/search/search-reach'
import { searchTables } from '@/core/search/search-tables'
import type { CribTooling } from '@/core/search/types'
import { searchNotes } from './search-notes'

const cutter = {
  id: '1',
  geometry: {
    form: 'square' as const,
    cuttingDiameterMm: 6,
    lengthOfCutMm: 12,
    shankDiameterMm: 6,
    overallLengthMm: 57,
  },
}
const holder = {
  id: '2',
  taper: null,
  bore: { kind: 'fixed' as const, diameterMm: 6 },
  geometry: {
    gaugeLengthMm: 60,
    boreDepthMm: 40,
    minimumGripMm: 20,
    segments: [{ part: 'holder' as const, lengthMm: 60, noseDiameterMm: 20, spindleDiameterMm: 30 }],
  },
}
const empty: CribTooling = { cutters: [], holders: [], collets: [], extensions: [] }
const wall: Feature = { kind: 'wall', depthMm: 10 }

function notesOf(tooling: CribTooling, feature: Feature = wall) {
  const tables = searchTables(tooling, defaultReachSettings)
  const answer = searchReach(tables, { feature, limit: 5, nearMissLimit: 5 })
  return searchNotes(answer, feature, tables, null)
}

test('it says of an empty crib what is missing first', () => {
  expect(notesOf(empty)).toEqual([
    { code: 'crib-empty', text: 'There is no cutter in the catalogue yet, so nothing can be built.' },
  ])
  expect(notesOf({ ...empty, cutters: [cutter] })[0]?.text).toContain('There is no holder')
})

test('it says nothing where something reaches and everything could be checked', () => {
  expect(notesOf({ ...empty, cutters: [cutter], holders: [holder] })).toEqual([])
})

test('it says why no cutter suits a feature', () => {
  const hole: Feature = { kind: 'hole', depthMm: 5, diameterMm: 4 }
  const [note] = notesOf({ ...empty, cutters: [cutter], holders: [holder] }, hole)
  expect(note?.text).toMatch(/Of the cutters looked at: 1 too wide for the opening\./)
})

test('it counts what was left out since its figures cannot be checked', () => {
  const broken = { ...holder, id: '3', geometry: { ...holder.geometry, boreDepthMm: null } }
  const notes = notesOf({ ...empty, cutters: [cutter], holders: [holder, broken] })
  expect(notes).toEqual([
    {
      code: 'cutters-not-checked',
      text: 'Left out, since a figure the check needs is missing or cannot be: 1 holder.',
    },
  ])
})
