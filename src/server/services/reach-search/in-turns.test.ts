import { expect, test } from 'vitest'
import { inTurns } from './in-turns'

test('it computes every item in its order', async () => {
  const { signal } = new AbortController()
  expect(await inTurns(['a', 'b'], signal, (item, index) => `${item}${index}`)).toEqual(['a0', 'b1'])
})

test('it computes nothing more once nobody waits', async () => {
  const controller = new AbortController()
  const computed: number[] = []
  const working = inTurns([1, 2, 3, 4], controller.signal, (item) => {
    computed.push(item)
    if (item === 2) controller.abort()
  })
  await expect(working).rejects.toMatchObject({ code: 'search-cancelled' })
  expect(computed).toEqual([1, 2])
})

test('it lets others through between two computations', async () => {
  const order: string[] = []
  const { signal } = new AbortController()
  const working = inTurns([1, 2], signal, (item) => order.push(`computed ${item}`))
  setImmediate(() => order.push('another request'))
  await working
  expect(order).toEqual(['computed 1', 'another request', 'computed 2'])
})
