import { describe, expect, it } from 'vitest'
import { type DraftField, draftTexts, readDraft } from './draft'

const fields: DraftField[] = [
  { name: 'name', label: 'Name', kind: 'line', isRequired: true },
  { name: 'zTravelMm', label: 'Z travel', kind: 'length', isRequired: true },
  { name: 'lowestTipMm', label: 'Lowest tip', kind: 'distance' },
  { name: 'efficiency', label: 'Efficiency', kind: 'number' },
  { name: 'pocketCount', label: 'Pockets', kind: 'count' },
]
const inches = { unit: 'in', decimalComma: false } as const
const comma = { unit: 'mm', decimalComma: true } as const

describe('a form of a machine', () => {
  it('opens with what is kept, in the person’s unit, and reads the same back', () => {
    const row = { name: 'Mill', zTravelMm: 508, lowestTipMm: 0, efficiency: 0.85, pocketCount: 24 }
    for (const manner of [inches, comma]) {
      const texts = draftTexts(fields, row, manner)
      expect(readDraft(fields, texts, manner)).toEqual({ body: row, faults: {} })
    }
    expect(draftTexts(fields, row, inches).zTravelMm).toBe('20')
    expect(draftTexts(fields, row, comma).efficiency).toBe('0,85')
  })

  it('takes what is left empty for nothing, and says what is needed', () => {
    expect(readDraft(fields, draftTexts(fields, null, comma), comma)).toEqual({
      body: { lowestTipMm: null, efficiency: null, pocketCount: null },
      faults: { name: 'Name is needed.', zTravelMm: 'Z travel is needed.' },
    })
  })

  it('says at its field what cannot be read, and 0 only where 0 is an answer', () => {
    const texts = { name: 'Mill', zTravelMm: '0', lowestTipMm: '0', efficiency: 'high', pocketCount: '2.5' }
    const { faults, body } = readDraft(fields, texts, inches)
    expect(Object.keys(faults)).toEqual(['zTravelMm', 'efficiency', 'pocketCount'])
    expect(body.lowestTipMm).toBe(0)
  })
})
