import { describe, expect, it } from 'vitest'
import { cutterForm } from '@/components/cutters/cutter-form'
import { mergedValues, staleFields } from './stale-comparison'

const before = { code: 'EM-1', maker: 'Osterby', form: 'square', overallLengthMm: '57', description: '' }
const theirs = { ...before, maker: 'Karrow', form: 'ball', overallLengthMm: '60' }
const mine = { ...before, overallLengthMm: '63', description: 'Mine' }

describe('staleFields', () => {
  it('lists what they changed, in words, with what stands here', () => {
    expect(staleFields(cutterForm, before, theirs, mine)).toEqual([
      { path: 'maker', label: 'Maker', before: 'Osterby', theirs: 'Karrow', mine: 'Osterby' },
      {
        path: 'form',
        label: 'Form',
        before: 'Square end mill',
        theirs: 'Ball end mill',
        mine: 'Square end mill',
      },
      { path: 'overallLengthMm', label: 'Overall length', before: '57', theirs: '60', mine: '63' },
    ])
  })
})

describe('mergedValues', () => {
  it('keeps mine where I changed something, and theirs everywhere else', () => {
    const merged = Object.fromEntries(
      mergedValues(cutterForm, before, theirs, mine).map(({ path, value }) => [path, value]),
    )
    expect(merged).toMatchObject({
      maker: 'Karrow',
      form: 'ball',
      overallLengthMm: '63',
      description: 'Mine',
    })
  })
})
