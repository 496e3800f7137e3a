import { describe, expect, it } from 'vitest'
import { cutterCatalogue } from '@/components/cutters/cutter-catalogue'
import { viewWords } from './view-words'

const words = (q: string, filters: Record<string, string>, unit: 'mm' | 'in' = 'mm') =>
  viewWords({ q, filters }, cutterCatalogue.filters, { unit })

describe('a view in words', () => {
  it('is empty where nothing narrows it', () => {
    expect(words('', {})).toBe('')
  })

  it('names search, choices and ranges, in the person’s own unit', () => {
    expect(
      words('osterby', {
        form: 'ball,square',
        'cuttingDiameterMm.min': '3.175',
        'cuttingDiameterMm.max': '6.35',
        stockState: 'low',
      }),
    ).toBe(
      'Search: “osterby”. Form: Ball end mill, Square end mill. Cutting diameter: from 3.175 mm to 6.35 mm. Stock: Low.',
    )
    expect(words('', { 'lengthOfCutMm.min': '25.4' }, 'in')).toBe('Length of cut: from 1.000 in.')
  })

  it('names a place only where its name is known', () => {
    const view = { q: '', filters: { locationId: '7' } }
    const known = { locationId: [{ value: '7', label: 'MAIN A', count: 3 }] }
    expect(viewWords(view, cutterCatalogue.filters, { unit: 'mm' }, known)).toBe('Location: MAIN A.')
    expect(words('', { locationId: '7' })).toBe('Location: The place in the address.')
  })
})
