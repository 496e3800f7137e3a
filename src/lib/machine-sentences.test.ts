import { describe, expect, it } from 'vitest'
import { machineWindow } from '@/core/machine/machine-window'
import {
  centringSentence,
  fitSentence,
  machineRefusals,
  noseSentence,
  windowSentences,
} from './machine-sentences'

const first = {
  gaugeLineToTableMm: 600,
  zTravelMm: 450,
  highestMm: 220,
  lowestTipMm: 60,
  retractClearanceMm: 25,
}

describe('what a set-up takes, in words', () => {
  it('it says both ends and what holds them', () => {
    expect(windowSentences(machineWindow(first), 'mm')).toEqual([
      'Takes gauge lengths from 90 mm to 355 mm.',
      'Longer ones are stopped by the retract over the highest thing; shorter ones do not get down to the lowest tip position.',
    ])
  })

  it('it names the changer, and leaves out a shortest that asks nothing', () => {
    expect(windowSentences(machineWindow({ ...first, lowestTipMm: 200, longestToolMm: 250 }), 'mm')).toEqual([
      'Takes gauge lengths up to 250 mm; every one gets down.',
      'Longer ones are stopped by the tool changer.',
    ])
  })

  it('it says by how much none fits', () => {
    const crossed = { ...first, gaugeLineToTableMm: 500, zTravelMm: 300, lowestTipMm: 20, highestMm: 330 }
    expect(windowSentences(machineWindow(crossed), 'mm')[0]).toContain('No tool fits, by 35 mm')
    expect(windowSentences(machineWindow({ ...first, highestMm: 590 }), 'mm')[0]).toContain('no room')
  })

  it('it says first what strikes the table', () => {
    const rotaryStock = { widthMm: 80, heightMm: 80, axisHeightMm: 50 }
    const [sentence] = windowSentences(machineWindow({ ...first, lowestTipMm: 40, rotaryStock }), 'mm')
    expect(sentence).toBe(
      'What turns strikes the table: it would go 6.569 mm into it. Raise the axis or take a smaller stock.',
    )
    const near = machineWindow({ ...first, rotaryStock: { ...rotaryStock, axisHeightMm: 70 } })
    expect(windowSentences(near, 'mm')[0]).toBe(
      'What turns comes within 13.431 mm of the table, 11.569 mm less than the clearance.',
    )
  })

  it('it tells an assembly by how much, in the person’s unit', () => {
    expect(fitSentence({ verdict: 'fits', byMm: 0 }, 101.6, 'in')).toBe(
      'A gauge length of 4.000 in fits this set-up.',
    )
    expect(fitSentence({ verdict: 'tooLong', byMm: 12.7 }, 101.6, 'in')).toContain('too long by 0.500 in')
    expect(fitSentence({ verdict: 'tooShort', byMm: 3 }, 80, 'mm')).toContain('too short by 3 mm')
  })

  it('it says where the spindle’s nose comes down to what stands there, at the very clearance not', () => {
    const heights = { lowestTipMm: 50, highestMm: 110, retractClearanceMm: 20 }
    expect(noseSentence(heights, 80, 'mm')).toBeNull()
    expect(noseSentence(heights, 79.9, 'mm')).toContain('19.9 mm above the highest thing')
    expect(noseSentence(heights, 45, 'mm')).toContain('15 mm below the top of the highest thing')
  })

  it('it says where the taper or the width is wrong, at the very width not', () => {
    const machine = { taper: 'BT30', widestToolMm: 60 }
    const tool = { holderCode: 'H-1', taper: 'bt 30', widestMm: 60 }
    expect(machineRefusals(machine, tool, 'mm')).toEqual([])
    expect(machineRefusals(machine, { ...tool, taper: 'CAT40', widestMm: 63.5 }, 'mm')).toEqual([
      'H-1 has a CAT40 taper; this spindle takes BT30.',
      'Its widest part, 63.5 mm, is more than the changer takes, 60 mm.',
    ])
    expect(machineRefusals({ ...machine, widestToolMm: null }, { ...tool, taper: null }, 'mm')).toEqual([])
  })

  it('it tells what is left to clean up', () => {
    expect(centringSentence(0.6, 'mm')).toBe('0.6 mm is left to clean up on the thinnest side.')
    expect(centringSentence(-0.2, 'mm')).toContain('0.2 mm is missing')
  })
})
