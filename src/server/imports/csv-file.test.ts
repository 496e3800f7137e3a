import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { detectDelimiter, firstRecords, readRecords } from './csv-file'
import { detectEncoding, nonTextKind, readHead } from './encoding'

const folder = mkdtempSync(join(tmpdir(), 'leadline-csv-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

function fileOf(bytes: Uint8Array): string {
  const path = join(folder, 'file.csv')
  writeFileSync(path, bytes)
  return path
}

async function rowsOf(bytes: Uint8Array): Promise<{ encoding: string; rows: string[][] }> {
  const path = fileOf(bytes)
  const { format } = firstRecords(await readHead(path))
  const encoding = await detectEncoding(path)
  const rows: string[][] = []
  for await (const batch of readRecords(path, { ...format, encoding }))
    rows.push(...batch.map(({ cells }) => cells))
  return { encoding, rows }
}

const bigEndian = (text: string) => Buffer.from(text, 'utf16le').swap16()
const text = 'Code;Ø [mm]\r\nA-1;6,0\r\n'
const rows = [
  ['Code', 'Ø [mm]'],
  ['A-1', '6,0'],
]

describe('encodings', () => {
  it.each([
    ['utf-8', Buffer.from(text, 'utf8')],
    ['utf-8', Buffer.from(`\ufeff${text}`, 'utf8')],
    ['utf-16le', Buffer.from(`\ufeff${text}`, 'utf16le')],
    ['utf-16le', Buffer.from(text, 'utf16le')],
    ['utf-16be', bigEndian(`\ufeff${text}`)],
    ['utf-16be', bigEndian(text)],
    ['windows-1252', Buffer.from(text, 'latin1')],
  ])('it reads %s', async (encoding, bytes) => expect(await rowsOf(bytes)).toEqual({ encoding, rows }))

  it('it reads the signs of Windows-1252 above 0x80: € – ” ™', async () => {
    // Code points from the table of windows-1252 in the WHATWG Encoding Standard.
    const bytes = Buffer.from([0x61, 0x2c, 0x80, 0x96, 0x94, 0x99, 0x0a])
    expect((await rowsOf(bytes)).rows).toEqual([['a', '€–”™']])
  })

  it('it finds a lone Windows-1252 byte far behind the head', async () => {
    const head = Buffer.from(`a,b\n${'1,2\n'.repeat(40_000)}`)
    const { encoding, rows: read } = await rowsOf(Buffer.concat([head, Buffer.from('3,\xd8\n', 'latin1')]))
    expect([encoding, read.at(-1)]).toEqual(['windows-1252', ['3', 'Ø']])
  })

  it('it keeps a character whole that two pieces share', async () => {
    const long = `a,b\n${'é'.repeat(9_000)},${'€'.repeat(9_999)}\n`.repeat(5)
    const { rows: read } = await rowsOf(Buffer.from(long))
    expect(read.at(-1)).toEqual(['é'.repeat(9_000), '€'.repeat(9_999)])
  })

  it('it knows a workbook, an image and other bytes for what they are', () => {
    expect(nonTextKind(Buffer.from('PK\x03\x04rest'))).toBe('a workbook or a zip archive')
    expect(nonTextKind(Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d]))).toBe('an image')
    expect(nonTextKind(Buffer.from('code,\0\0\0\0x'))).toBe('a file of another kind')
    expect(nonTextKind(Buffer.from('Code,Dia\n'))).toBeNull()
  })
})

describe('delimiters', () => {
  it.each([
    [',', 'a,b,c\n1,2,3\n'],
    [';', 'a;b;c\n1,5;2,5;3,5\n'],
    ['\t', 'a\tb, c\n1\t2; 3\n'],
    [';', '"a, quoted; heading";b\n"1,2,3";4\n'],
    [';', 'sep=;\na,b\n1,2\n'],
    [';', 'a;b'],
    [',', 'only one column\n1\n'],
  ])('it finds %j', (delimiter, head) => expect(detectDelimiter(head)).toBe(delimiter))

  it('it leaves out the sep= line and lines without anything on them', async () => {
    expect((await rowsOf(Buffer.from('sep=;\r\na;b\r\n;\r\n\r\n1;2\r\n'))).rows).toEqual([
      ['a', 'b'],
      ['1', '2'],
    ])
  })
})
