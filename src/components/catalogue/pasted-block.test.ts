import { describe, expect, it } from 'vitest'
import { isBlock, pastedBlock, pastedFile, pastedRecords, startsWithHeadings } from './pasted-block'

describe('a pasted block', () => {
  it('is counted as a spreadsheet copies it: tabs between cells, CRLF behind rows', () => {
    const text = 'Tool #\tDia\r\nEM-1\t6\r\nEM-2\t8\r\n'
    expect(pastedBlock(text, true)).toMatchObject({ rows: 2, columns: 2, fault: null })
    expect(pastedBlock(text, false)).toMatchObject({ rows: 3, columns: 2, fault: null })
  })

  it('of 5,000 columns is refused in a plain sentence that says how many there may be', () => {
    const text = `${Array.from({ length: 5000 }, (_, index) => `c${index}`).join('\t')}\n1\t2\n`
    expect(pastedBlock(text, true).fault).toBe(
      'This block has 5,000 columns; at most 200 can be taken. Copy only the columns of the list.',
    )
  })

  it('is refused where it is empty, or a line of headings alone', () => {
    expect(pastedBlock('  \n', true).fault).toMatch(/nothing here/)
    expect(pastedBlock('Code\tDia\n', true).fault).toMatch(/only a line of headings/)
    expect(pastedBlock('EM-1\t6\n', false).fault).toBeNull()
  })

  it('without headings gets numbered ones, so that its first row is no heading', async () => {
    expect(await pastedFile('EM-1\t6\n', false).text()).toBe('Column 1\tColumn 2\nEM-1\t6\n')
    expect(await pastedFile('Code\tDia\nEM-1\t6\n', true).text()).toBe('Code\tDia\nEM-1\t6\n')
  })

  it('has cells with tabs, lines and quotes in them, as a spreadsheet copies these', () => {
    expect(pastedRecords('a\t"two\nlines"\t"say ""hi"""\r\n"t\tab"\t6,35\t\n')).toEqual([
      ['a', 'two\nlines', 'say "hi"'],
      ['t\tab', '6,35', ''],
    ])
    expect(pastedRecords('1/2"\t"loose\n"a" b\t')).toEqual([
      ['1/2"', '"loose'],
      ['"a" b', ''],
    ])
    expect(pastedBlock('Code\tNote\nA\t"one\ntwo"\n', true)).toMatchObject({ rows: 1, columns: 2 })
  })

  it('says how many rows run on beyond the headings', () => {
    const text = 'Code\tDia\nA\t6\nB\nC\t6\tmore\nD\t8\t\n'
    expect(pastedBlock(text, true)).toMatchObject({ rows: 4, columns: 3, overlong: 1 })
    expect(pastedBlock(text, false)).toMatchObject({ rows: 5, overlong: 0 })
  })

  it('of ten thousand rows is read whole, and shown by its first', () => {
    const text = `Code\tDia\n${Array.from({ length: 10_000 }, (_, row) => `X-${row}\t6`).join('\n')}`
    const block = pastedBlock(text, true)
    expect([block.rows, block.sample.length]).toEqual([10_000, 6])
    expect(block.sample[1]).toEqual(['X-0', '6'])
  })

  it('is told from a word', () => {
    expect(isBlock('EM-1\t6')).toBe(true)
    expect(isBlock('EM-1')).toBe(false)
    expect(isBlock('two words\n')).toBe(false)
  })
})

describe('a first row', () => {
  it.each([
    ['Tool #\tDia\tD1\tØ mm', true],
    ['Code\tForm\n6\t12', true],
    ['EM-301\tsquare\t3\t0,5', false],
    ['EM-305\tsquare\t1/4"\t19', false],
    ['EM-305\tsquare\t6 mm', false],
  ])('it is guessed by whether numbers stand in it: %j', (text, isHeadings) =>
    expect(startsWithHeadings(text)).toBe(isHeadings),
  )
})
