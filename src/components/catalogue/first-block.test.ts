import { afterEach, expect, test, vi } from 'vitest'
import { askAhead, listBlockUrl } from './first-block'

afterEach(() => vi.unstubAllGlobals())

function answering(answer: () => Response) {
  const fetched = vi.fn(async () => answer())
  vi.stubGlobal('fetch', fetched)
  return fetched
}

const url = listBlockUrl('cutter', 'q=ball', '-code', 0)

test('it names the block the grid asks for: narrowed, ordered, from the first row', () => {
  expect(url).toBe('/api/cutters?q=ball&sort=-code&limit=100&offset=0')
  expect(listBlockUrl('holder', '', '', 200)).toBe('/api/holders?limit=100&offset=200')
})

test('it hands a block over once, so that reading again reads what is there by then', async () => {
  const fetched = answering(() => Response.json({ rows: [], nextCursor: null, total: 0 }))
  const first = askAhead(url)
  await expect(first.take(url)).resolves.toEqual({ rows: [], nextCursor: null, total: 0 })
  expect(first.take(url)).toBeUndefined()
  expect(fetched).toHaveBeenCalledTimes(1)
})

test('it hands nothing to who asks for another view, nor the old block to who asks after', () => {
  answering(() => Response.json({ rows: [], nextCursor: null }))
  const first = askAhead(url)
  expect(first.take(listBlockUrl('cutter', 'q=drill', '-code', 0))).toBeUndefined()
  expect(first.take(url)).toBeUndefined()
})

test('it tells a failure to who takes the block, and to nobody else', async () => {
  answering(() => Response.json({ status: 500, code: 'internal', detail: 'No.' }, { status: 500 }))
  const first = askAhead(url)
  await new Promise((resolve) => setTimeout(resolve, 0))
  await expect(first.take(url)).rejects.toThrow()
})
