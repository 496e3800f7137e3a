import { describe, expect, it } from 'vitest'
import { readPresetterFile } from './presetter-file'

type Request = Parameters<typeof readPresetterFile>[0]

const read = (text: string, change: Partial<Request> = {}, decimalComma = false) =>
  readPresetterFile({ text, unit: 'mm', ...change }, decimalComma)

describe('a presetter’s file', () => {
  it('is read by its own headings, whatever cuts its cells', () => {
    for (const sign of [',', ';', '\t']) {
      const text = ['Assembly', 'Gauge length', 'Diameter'].join(sign)
      const { rows, rejected } = read(`${text}\n${['12', '139.482', '3.171'].join(sign)}\n`)
      expect(rejected).toEqual([])
      expect(rows).toEqual([{ line: 2, number: 12, gaugeLengthMm: 139.482, diameterMm: 3.171 }])
    }
  })

  it('takes the unit of a heading before the one that was said', () => {
    const { rows } = read('Number,Length (in),Diameter (mm)\n1,5.5,6\n', { unit: 'mm' })
    expect(rows).toEqual([{ line: 2, number: 1, gaugeLengthMm: 139.7, diameterMm: 6 }])
  })

  it('takes a decimal comma where the shop writes one', () => {
    const { rows } = read('Assembly;Gauge length\n1;139,482\n', {}, true)
    expect(rows[0]).toMatchObject({ gaugeLengthMm: 139.482, diameterMm: null })
  })

  it('rejects by line what is no number, none or twice there, and keeps the others', () => {
    const text = 'Assembly,Gauge length\n1,100\nx,100\n3,\n1,101\n5,-4\n\n6,102\n'
    const { rows, rejected } = read(text)
    expect(rows.map(({ line, number }) => [line, number])).toEqual([
      [2, 1],
      [8, 6],
    ])
    expect(rejected.map(({ line }) => line)).toEqual([3, 4, 5, 6])
  })

  it('asks for the columns where no heading says what it is', () => {
    expect(read('T,Messwert\n1,100\n')).toMatchObject({
      headings: ['T', 'Messwert'],
      columns: { number: null, gaugeLength: null },
      rows: [],
      rejected: [],
    })
    const told = read('T,Messwert\n1,100\n', { columns: { number: 'T', gaugeLength: 'Messwert' } })
    expect(told.rows).toHaveLength(1)
  })

  it('says nothing of a file with nothing in it', () => {
    expect(read('\n\n')).toMatchObject({ headings: [], rows: [], rejected: [] })
  })
})
