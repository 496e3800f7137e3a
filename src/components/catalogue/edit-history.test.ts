import { describe, expect, it } from 'vitest'
import {
  type EditStep,
  longestHistory,
  type RowsStep,
  reversedStep,
  undoChanges,
  withStep,
} from './edit-history'

const step: RowsStep = {
  field: 'maker',
  name: 'Maker of 2 cutters',
  rows: [
    { id: '1', before: 'Old', after: 'New' },
    { id: '2', before: null, after: 'New' },
  ],
}

describe('taking an edit back', () => {
  it('puts each row back to what it was, at the version it has now', () => {
    const rows = new Map([
      ['1', { version: 4, maker: 'New' }],
      ['2', { version: 2, maker: 'New' }],
    ])
    expect(undoChanges(step, (id) => rows.get(id))).toEqual([
      { id: '1', version: 4, maker: 'Old' },
      { id: '2', version: 2, maker: null },
    ])
  })

  it('makes again what was taken back, by taking back the step the other way round', () => {
    const rows = new Map([
      ['1', { version: 5, maker: 'Old' }],
      ['2', { version: 3, maker: null }],
    ])
    expect(undoChanges(reversedStep(step), (id) => rows.get(id))).toEqual([
      { id: '1', version: 5, maker: 'New' },
      { id: '2', version: 3, maker: 'New' },
    ])
  })

  it('refuses to write over what someone else put there since', () => {
    expect(undoChanges(step, (id) => ({ version: 5, maker: id === '1' ? 'Theirs' : 'New' }))).toBeNull()
    expect(undoChanges(step, () => undefined)).toBeNull()
  })

  it('keeps the last acts and lets the oldest go', () => {
    let steps: EditStep[] = []
    for (let index = 0; index <= longestHistory; index += 1)
      steps = withStep(steps, { ...step, name: `${index}` })
    expect(steps).toHaveLength(longestHistory)
    expect(steps[0]?.name).toBe('1')
  })
})
