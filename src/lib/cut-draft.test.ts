import { describe, expect, it } from 'vitest'
import { blankCut, readCutDraft } from './cut-draft'

const manner = { unit: 'mm', decimalComma: false } as const
const typed = { ...blankCut, materialNumber: '2', speed: '180', feed: '0.06', depthOfCut: '6', stepover: '3' }

describe('a cut as it is typed', () => {
  it('is read once it has material, speed and feed', () => {
    expect(readCutDraft(blankCut, manner, [])).toEqual({ input: null, faults: {} })
    expect(readCutDraft({ ...typed, feed: '' }, manner, []).input).toBeNull()
    expect(readCutDraft(typed, manner, []).input).toMatchObject({
      material: { number: 2 },
      ...{ cuttingSpeedMPerMin: 180, feedMm: 0.06, depthOfCutMm: 6, stepoverMm: 3, spindle: null },
    })
  })

  it('is read in the person’s unit, and a drill’s without depth and stepover', () => {
    const inches = { unit: 'in', decimalComma: false } as const
    const { input } = readCutDraft(
      { ...blankCut, materialNumber: '2', speed: '500', feed: '0.01' },
      inches,
      [],
    )
    expect(input).toMatchObject({ feedMm: 0.254, depthOfCutMm: null, stepoverMm: null })
    expect(input?.cuttingSpeedMPerMin).toBeCloseTo(152.4, 9)
  })

  it('says at its field what cannot be read, and then has no input', () => {
    const reading = readCutDraft({ ...typed, stepover: 'half', speed: '-5' }, manner, [])
    expect(reading.input).toBeNull()
    expect(Object.keys(reading.faults).sort()).toEqual(['speed', 'stepover'])
  })
})
