import { expect, test } from 'vitest'
import { groupsText } from './groups-text'

test('one group measures the same, several measure the same', () => {
  expect(groupsText(1, 'cutters')).toBe('1 group of cutters measures the same.')
  expect(groupsText(2, 'collets')).toBe('2 groups of collets measure the same.')
})
