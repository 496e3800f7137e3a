import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { emptyDraft, type ReachDraft } from './reach-draft'
import { draftInUnit, draftQuery, queryDraft } from './reach-query'
import { type Reading, readField } from './read-field'

const mm: Reading = { unit: 'mm', decimalComma: false }
const inch: Reading = { unit: 'in', decimalComma: false }
const comma: Reading = { unit: 'mm', decimalComma: true }

function draftWith(change: Partial<ReachDraft>): ReachDraft {
  return { ...emptyDraft, ...change }
}

describe('the check in the address bar', () => {
  it('carries ids of what is picked, figures in millimetres of what is typed, and lists', () => {
    const draft = draftWith({
      picks: { cutter: '51', holder: '185', collet: null, extension: null },
      texts: {
        ...emptyDraft.texts,
        feature: { depthMm: '1', draftDeg: '2.5' },
        holder: { minimumGripMm: '' },
        check: { stickOutMm: '1 1/2' },
      },
      obstacles: [{ key: 1, setback: '0', rise: '1/2' }],
      segments: { holder: [{ key: 1, part: 'nut', length: '1', nose: '2', spindle: '1' }], extension: null },
    })
    const query = draftQuery(draft, inch)
    expect(query).toBe(
      'cutter=51&holder=185&depth=25.4&draft=2.5&h.grip=&stickout=38.1&obstacles=0x12.7&h.segments=nut:25.4x50.8-25.4',
    )
  })

  it('opens for a colleague in their own unit', () => {
    const draft = queryDraft('depth=25.4&obstacles=5x12.7&c.DC=3&c.form=ball', inch)
    expect(draft.texts.feature.depthMm).toBe('1')
    expect(draft.texts.cutter).toEqual({ cuttingDiameterMm: '3 mm', form: 'ball' })
    expect(draft.obstacles).toMatchObject([{ setback: '5 mm', rise: '0.5' }])
  })

  it('carries along what cannot be read, so that no limit is lost on the way', () => {
    const typed = draftWith({
      texts: { ...emptyDraft.texts, feature: { depthMm: '10', floorRadiusMm: '1.250' } },
      obstacles: [
        { key: 1, setback: '5', rise: 'high' },
        { key: 2, setback: '', rise: '' },
      ],
    })
    const query = draftQuery(typed, comma)
    expect(query).toBe('depth=10&floor=unread:1.250&obstacles=unread')
    const opened = queryDraft(query, comma)
    expect(opened.texts.feature.floorRadiusMm).toBe('1.250')
    expect(readField('length', opened.obstacles[0]?.rise ?? '', comma).ok).toBe(false)
  })

  it('takes no nonsense for an id, and makes no verdict of nonsense for a figure', () => {
    const opened = queryDraft('cutter=../1&depth=-3&draft=x&h.segments=nut:1x&feature=slot', mm)
    expect(opened.picks).toEqual(emptyDraft.picks)
    expect(opened.featureKind).toBe('wall')
    expect(opened.texts.feature).toEqual({ depthMm: '-3', draftDeg: 'x' })
    expect(opened.segments.holder).toHaveLength(1)
    expect(readField('length', opened.segments.holder?.[0]?.length ?? '', mm).ok).toBe(false)
  })

  it('keeps a figure of the catalogue that was cleared on purpose', () => {
    const cleared = draftWith({
      picks: { ...emptyDraft.picks, cutter: '7' },
      texts: { ...emptyDraft.texts, cutter: { neckDiameterMm: '' } },
    })
    expect(queryDraft(draftQuery(cleared, mm), mm).texts.cutter.neckDiameterMm).toBe('')
  })

  it('says the same figures after a change of unit or of decimal sign', () => {
    const micrometres = fc.integer({ min: 1, max: 400_000 })
    fc.assert(
      fc.property(micrometres, micrometres, fc.constantFrom(mm, inch, comma), (depth, nose, reading) => {
        const query = `depth=${depth / 1000}&h.segments=nut:10x${nose / 1000}`
        const there = queryDraft(query, reading)
        expect(draftQuery(there, reading)).toBe(query)
        expect(draftQuery(draftInUnit(there, reading, inch), inch)).toBe(query)
      }),
    )
  })
})
