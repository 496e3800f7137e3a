import { describe, expect, it } from 'vitest'
import { defaultReachSettings } from '@/core/reach/types'
import type { HolderResponse } from '@/schemas/holder'
import type { CatalogueRows } from './catalogue-values'
import { checkResult, compileCheck } from './compile-check'
import { changedDraft, emptyDraft, type ReachDraft } from './reach-draft'
import { queryDraft } from './reach-query'
import type { Reading } from './read-field'
import { workedExample } from './worked-example'

const reading: Reading = { unit: 'mm', decimalComma: false }

function compiled(draft: ReachDraft, rows: CatalogueRows = {}) {
  return compileCheck(draft, { rows, reading, settings: defaultReachSettings })
}

function result(draft: ReachDraft, rows: CatalogueRows = {}) {
  return checkResult(compiled(draft, rows))
}

const chuck: HolderResponse = {
  id: '185',
  kind: 'holder',
  version: 1,
  code: 'H-1',
  maker: null,
  partNumber: null,
  description: '',
  archivedAt: null,
  createdAt: '2026-12-01T00:00:00Z',
  updatedAt: '2026-12-01T00:00:00Z',
  stock: { onHand: 0, available: 0, isLow: false, locations: [] },
  taper: null,
  gaugeLengthMm: 100,
  bore: { kind: 'fixed', diameterMm: 3.175 },
  boreDepthMm: 60,
  minimumGripMm: 20,
  gripStartMm: null,
  nutTorqueNm: null,
  sideLockInsertionMm: null,
  maximumRpm: null,
  segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }],
}

describe('a check being given', () => {
  it('reaches as the worked example says', () => {
    expect(result(workedExample(reading))).toMatchObject({
      state: 'answered',
      answer: { verdict: 'reaches', stickOut: { requiredMm: 39.5 } },
    })
  })

  it('says what is still needed before there is any verdict', () => {
    expect(compiled(emptyDraft).missing).toEqual([
      'the depth',
      'the cutter’s cutting diameter',
      'the cutter’s length of cut',
      'the cutter’s shank diameter',
      'the cutter’s overall length',
      'the holder’s gauge length',
      'the holder’s outline',
      'the holder’s bore depth',
      'the holder’s least grip',
    ])
    expect(result(emptyDraft)).toEqual({ state: 'waiting' })
  })

  it('waits for what is picked instead of answering without it', () => {
    const draft = changedDraft(workedExample(reading), { type: 'pick', slot: 'holder', id: '185' })
    expect(result(draft)).toEqual({ state: 'waiting' })
    expect(compiled(draft).missing).toContain('the holder from the crib')
    expect(result(draft, { holder: chuck }).state).toBe('answered')
  })

  it('takes what is typed before the catalogue, and a cleared figure as not given', () => {
    const picked = changedDraft(workedExample(reading), { type: 'pick', slot: 'holder', id: '185' })
    const typed = changedDraft(picked, { type: 'text', group: 'holder', name: 'gaugeLengthMm', text: '120' })
    expect(compiled(typed, { holder: chuck }).holder).toMatchObject({ gaugeLengthMm: 120, boreDepthMm: 60 })
    const cleared = changedDraft(picked, { type: 'text', group: 'holder', name: 'boreDepthMm', text: '' })
    expect(compiled(cleared, { holder: chuck }).missing).toContain('the holder’s bore depth')
    const back = changedDraft(cleared, { type: 'forget', group: 'holder', name: 'boreDepthMm' })
    expect(result(back, { holder: chuck }).state).toBe('answered')
  })

  it('drops the old verdict the moment a field can’t be read, and says which', () => {
    const draft = changedDraft(workedExample(reading), {
      type: 'text',
      group: 'feature',
      name: 'depthMm',
      text: '25 furlongs',
    })
    expect(result(draft)).toEqual({
      state: 'refused',
      errors: { 'feature.depthMm': expect.stringContaining('furlongs') },
      reason: null,
    })
  })

  it('puts what the core refuses at the core’s own place', () => {
    const draft = changedDraft(workedExample(reading), {
      type: 'text',
      group: 'feature',
      name: 'tiltDeg',
      text: '10',
    })
    expect(result(draft)).toMatchObject({
      state: 'refused',
      errors: { 'feature.tiltDeg': 'Only a tool with a ball tip may be tilted.' },
    })
  })

  it('leaves out what was typed for another form or another kind of feature', () => {
    const draft = queryDraft(
      'feature=hole&depth=10&diameter=6&draft=5&c.form=drill&c.RE=2&c.SIG=118',
      reading,
    )
    const { feature, cutter } = compiled(draft)
    expect(feature).toEqual({ kind: 'hole', depthMm: 10, diameterMm: 6, breakThroughMm: null })
    expect(cutter).toBeNull()
    const whole = queryDraft('c.form=drill&c.RE=2&c.SIG=118&c.DC=6&c.DMM=6&c.OAL=90&c.APMX=40', reading)
    expect(compiled(whole).cutter).not.toHaveProperty('cornerRadiusMm')
  })

  it('asks the extension, not the holder, how the shank is held', () => {
    const draft = queryDraft(
      'depth=10&c.DC=3&c.APMX=6&c.DMM=3&c.OAL=60&h.A=80&h.segments=holder:80x40&x.E=40&x.segments=holder:40x12',
      reading,
    )
    expect(compiled(draft).missing).toEqual(['the extension’s bore depth', 'the extension’s least grip'])
  })

  it('says which length of a half-typed segment or obstacle is missing', () => {
    const draft: ReachDraft = {
      ...workedExample(reading),
      obstacles: [{ key: 1, setback: '5', rise: '' }],
      segments: { holder: [{ key: 1, part: 'nut', length: '18', nose: '', spindle: '' }], extension: null },
    }
    expect(compiled(draft).unread).toEqual({
      'feature.obstacles.0.riseMm': 'Enter a length.',
      'holder.segments.0.noseDiameterMm': 'Enter a length.',
    })
  })
})
