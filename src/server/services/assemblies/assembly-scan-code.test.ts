import { describe, expect, it } from 'vitest'
import { readScanCode } from '../../../../test/support/read-scan-code'
import { type ScanCode, scanCode } from './assembly-scan-code'

const pxPerModule = 8
const quietModules = 4

/** The code as a scanner's camera has it: grey values, white all round. */
function picture({ rows, size }: ScanCode): { grey: Uint8ClampedArray; side: number } {
  const side = (size + 2 * quietModules) * pxPerModule
  const grey = new Uint8ClampedArray(side * side).fill(255)
  for (let y = 0; y < size * pxPerModule; y += 1)
    for (let x = 0; x < size * pxPerModule; x += 1)
      if (rows[Math.floor(y / pxPerModule)]?.[Math.floor(x / pxPerModule)] === '1')
        grey[(y + quietModules * pxPerModule) * side + x + quietModules * pxPerModule] = 0
  return { grey, side }
}

describe('the code of a set-up sheet', () => {
  it.each([
    'http://127.0.0.1:3000/assemblies/1',
    'https://tools.shop.example/assemblies/987654321',
    'https://a-rather-long-name-of-a-host.in-a-shop.example/leadline/assemblies/12',
  ])('is read back by another library as it was meant: %s', (text) => {
    const code = scanCode(text)
    expect(code.rows).toHaveLength(code.size)
    const { grey, side } = picture(code)
    expect(readScanCode(grey, side, side)).toBe(text)
  })

  it('is not read back once a quarter of it is gone', () => {
    const code = scanCode('http://127.0.0.1:3000/assemblies/1')
    const torn = code.rows.map((row, y) => (y < code.size / 2 ? row : row.replace(/1/g, '0')))
    const { grey, side } = picture({ ...code, rows: torn })
    expect(() => readScanCode(grey, side, side)).toThrow()
  })
})
