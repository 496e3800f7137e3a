import { expect, test } from 'vitest'
import { firstCrib } from './first-crib'

const east = { id: '2', code: 'EAST', name: 'East crib', members: 0 }
const main = { id: '1', code: 'MAIN', name: 'Main crib', members: 3 }
const west = { id: '3', code: 'WEST', name: 'West crib', members: 0 }

test('it opens on one’s own crib', () => {
  expect(firstCrib([east, main, west], '3')).toBe(west)
})

test('it opens on the crib with most members where one has none of one’s own', () => {
  expect(firstCrib([east, main, west], null)).toBe(main)
})

test('it opens on the first where none has members, and on none where there is none', () => {
  expect(firstCrib([east, west], null)).toBe(east)
  expect(firstCrib([], '3')).toBeUndefined()
})
