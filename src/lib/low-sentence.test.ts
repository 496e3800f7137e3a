import { expect, test } from 'vitest'
import { lowSentence } from './low-sentence'

const alert = { itemCode: 'EM-303', cribCode: 'MAIN', onHand: 2, position: 2, reorderPoint: 2 }

test('it says what is left and the point it fell to', () => {
  expect(lowSentence(alert)).toBe('EM-303 is now low in MAIN: 2 left, reorder point 2.')
})

test('it says apart what is on hand and what counts, where they differ', () => {
  expect(lowSentence({ ...alert, onHand: 5 })).toBe(
    'EM-303 is now low in MAIN: 5 left, 2 available and coming, reorder point 2.',
  )
})
