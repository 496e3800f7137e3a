import { describe, expect, it } from 'vitest'
import { groupedFaults } from './grouped-faults'

const fault = (line: number, column: string, message: string) => ({ line, column, value: '', message })

describe('faults that rows share', () => {
  it('they are counted by row, the commonest first, and one of a kind stays in the list', () => {
    const rows = [
      { problems: [fault(2, 'Form', 'Choose a form.'), fault(2, 'Price', '“x” is not an amount.')] },
      { problems: [fault(3, 'Form', 'Choose a form.'), fault(3, 'Shank', 'Give the shank diameter.')] },
      { problems: [fault(4, 'Form', 'Choose a form.'), fault(5, 'Form', 'Choose a form.')] },
      { problems: [fault(6, 'Shank', 'Give the shank diameter.')] },
    ]
    expect(groupedFaults(rows)).toEqual([
      { column: 'Form', message: 'Choose a form.', rows: 3 },
      { column: 'Shank', message: 'Give the shank diameter.', rows: 2 },
    ])
  })
})
