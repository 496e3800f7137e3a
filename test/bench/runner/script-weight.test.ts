import { randomBytes } from 'node:crypto'
import { gunzipSync, gzipSync } from 'node:zlib'
import { expect, it } from 'vitest'
import { gzippedKb } from './script-weight'

it('sums what each file takes compressed by itself', () => {
  const one = Buffer.from('const a = 1\n'.repeat(1000))
  const other = randomBytes(4000)
  const expected = (gzipSync(one).length + gzipSync(other).length) / 1024
  expect(gzippedKb([file('/a.js', one), file('/b.js', other)])).toBe(expected)
  // Random bytes do not compress, so the sum is near theirs; gzip adds its own few.
  expect(expected).toBeGreaterThan(4000 / 1024)
  expect(expected).toBeLessThan(4200 / 1024)
  expect(gunzipSync(gzipSync(one)).equals(one)).toBe(true)
})

it('counts a file that was asked for twice once', () => {
  const body = randomBytes(1000)
  expect(gzippedKb([file('/a.js', body), file('/a.js', body)])).toBe(gzippedKb([file('/a.js', body)]))
})

it('is nothing for a page without script', () => expect(gzippedKb([])).toBe(0))

const file = (url: string, body: Buffer) => ({ url, body })
