import { describe, expect, it } from 'vitest'
import type { ImportKind } from '@/schemas/import-fields'
import { checkMapping, headingRecordIndex, mapColumns, uniqueHeadings } from './column-mapping'
import { headingName } from './heading-name'

const none = { set: {}, kept: new Map(), currency: 'USD' }

function fieldsOf(kind: ImportKind, headings: string[]): (string | null)[] {
  return mapColumns(headings, { ...none, kind }).map((column) => column.field)
}

describe('headings by name', () => {
  it.each([
    ['Dia (in)', 'cuttingDiameterMm', 'in'],
    ['Flute Len', 'fluteLengthMm', null],
    ['LOC', 'lengthOfCutMm', null],
    ['L.O.C. (mm)', 'lengthOfCutMm', 'mm'],
    ['OAL', 'overallLengthMm', null],
    ['O.A.L. "', 'overallLengthMm', 'in'],
    ['Shank Ø [mm]', 'shankDiameterMm', 'mm'],
    ['SHK DIA', 'shankDiameterMm', null],
    ['Corner Rad.', 'cornerRadiusMm', null],
    ['# Flutes', 'fluteCount', null],
    ['No. of Flutes', 'fluteCount', null],
    ['cuttingDiameterMm', 'cuttingDiameterMm', 'mm'],
    ['neck_diameter_in', 'neckDiameterMm', 'in'],
    ['Point Angle (deg)', 'pointAngleDeg', null],
    ['Taper/Side °', 'taperHalfAngleDeg', null],
    ['Mfr P/N', 'partNumber', null],
    ['Mfg', 'maker', null],
    ['Tool #', 'code', null],
    ['Price ($)', 'unitCost', null],
    ['Unit Cost USD', 'unitCost', null],
    ['Cutting dia [DC]', 'cuttingDiameterMm', null],
    ['Ø DC', 'cuttingDiameterMm', null],
    ['Ø DC [mm]', 'cuttingDiameterMm', 'mm'],
    ['Ø', 'cuttingDiameterMm', null],
    ['Φ D1', 'cuttingDiameterMm', null],
    ['DIA', 'cuttingDiameterMm', null],
    ['D1', 'cuttingDiameterMm', null],
    ['d2 mm', 'shankDiameterMm', 'mm'],
    ['Ø DMM', 'shankDiameterMm', null],
    ['Shank Ø DMM', 'shankDiameterMm', null],
    ['Length OAL', 'overallLengthMm', null],
    ['APMX length of cut', 'lengthOfCutMm', null],
    ['FLUTES', 'fluteCount', null],
    ['Angle SIG °', 'pointAngleDeg', null],
    ['Shank Ø DC', null, null],
    ['OAL LU', null, null],
    ['L1', null, null],
    ['Length', null, null],
    ['Taper', null, null],
    ['Remarks', null, null],
  ])('it reads %s of a cutter', (heading, field, unit) => {
    const [column] = mapColumns([heading], { ...none, kind: 'cutters' })
    expect([column?.field, column?.unit]).toEqual([field, unit])
  })

  it('it reads the symbols of ISO 13399', () => {
    const symbols = ['DC', 'RE', 'APMX', 'LCF', 'DN', 'LU', 'DMM', 'OAL', 'SIG', 'BHTA', 'NOF']
    expect(fieldsOf('cutters', symbols)).toEqual([
      'cuttingDiameterMm',
      'cornerRadiusMm',
      'lengthOfCutMm',
      'fluteLengthMm',
      'neckDiameterMm',
      'reachLengthMm',
      'shankDiameterMm',
      'overallLengthMm',
      'pointAngleDeg',
      'neckTaperHalfAngleDeg',
      'fluteCount',
    ])
    expect(fieldsOf('cutters', ['DCONMS', 'RPMX'])).toEqual(['shankDiameterMm', 'maximumRpm'])
    expect(fieldsOf('extensions', ['Shank diameter', 'Bore diameter'])).toEqual([
      'shankDiameterMm',
      'boreDiameterMm',
    ])
  })

  it('it tells the segments of an outline from a shape in one row', () => {
    expect(fieldsOf('holders', ['Code', 'Part', 'Length', 'Nose dia', 'Spindle dia'])).toEqual([
      'code',
      'segmentPart',
      'segmentLengthMm',
      'segmentNoseDiameterMm',
      'segmentSpindleDiameterMm',
    ])
    expect(
      fieldsOf('holders', ['Code', 'Nose dia', 'Nose length', 'Body dia', 'Body length', 'Length']),
    ).toEqual(['code', 'noseDiameterMm', 'noseLengthMm', 'bodyDiameterMm', 'bodyLengthMm', null])
  })

  it('it knows the columns of reorder points by the names that shops give them', () => {
    const headings = [
      'Item #',
      'Crib',
      'Min',
      'Max Qty',
      'Pack size',
      'MOQ',
      'Vendor',
      'Vendor P/N',
      'Lead Time (days)',
    ]
    expect(fieldsOf('reorderPoints', headings)).toEqual([
      ...['code', 'crib', 'reorderPoint', 'orderUpTo', 'packSize', 'minimumOrder'],
      ...['supplier', 'supplierPartNumber', 'leadTimeDays'],
    ])
    expect(fieldsOf('reorderPoints', ['Lead time (weeks)', 'Lead time weeks'])).toEqual([null, null])
  })

  it('it leaves a price in another currency out and says so', () => {
    const [column] = mapColumns(['Price (EUR)'], { ...none, kind: 'cutters' })
    expect([column?.field, column?.note]).toEqual([null, 'This is in EUR; the shop keeps USD.'])
  })

  it('it gives a field to one column: what is set before what is kept before what is known', () => {
    const columns = mapColumns(['Dia', 'D1', 'Size'], {
      kind: 'cutters',
      set: { Size: 'cuttingDiameterMm' },
      kept: new Map([['d1', { field: 'cuttingDiameterMm', unit: 'in' }]]),
      currency: 'USD',
    })
    expect(columns.map((column) => column.field)).toEqual([null, null, 'cuttingDiameterMm'])
  })

  it('it takes what the shop kept, with its unit, whatever the capitals', () => {
    const kept = new Map([['weird one', { field: 'overallLengthMm', unit: 'in' as const }]])
    const [column] = mapColumns(['WEIRD One'], { ...none, kept, kind: 'cutters' })
    expect(column).toMatchObject({ field: 'overallLengthMm', unit: 'in', origin: 'kept' })
  })
})

describe('the line of headings', () => {
  it('it names empty and repeated headings', () => {
    expect(uniqueHeadings(['Dia', '', 'dia', ' Dia '])).toEqual(['Dia', 'Column 2', 'dia (2)', 'Dia (3)'])
  })

  it('it passes over a title above the table', () => {
    const record = (cells: string[]) => ({ line: 1, cells, faults: [] })
    const records = [record(['Tool list 2026', '']), record(['Code', 'Dia']), record(['A', '6'])]
    expect(headingRecordIndex(records, { ...none, kind: 'cutters' })).toBe(1)
    expect(headingRecordIndex([record(['x', 'y']), record(['1', '2'])], { ...none, kind: 'cutters' })).toBe(0)
  })

  it('it takes a unit from brackets and from the end', () => {
    expect(headingName('Ø mm')).toMatchObject({ name: 'diameter', unit: 'mm' })
    expect(headingName('Overall Length, inches')).toMatchObject({ name: 'overalllength', unit: 'in' })
    expect(headingName('in')).toMatchObject({ name: 'in', unit: null })
  })
})

describe('a mapping that cannot be', () => {
  it.each([
    [{ Nope: 'code' }, 'The file has no column “Nope”.'],
    [{ A: 'wings' }, 'There is no field “wings” for cutters.'],
    [{ A: 'code', B: 'code' }, '“A” is given to code already.'],
  ])('it refuses %j', (mapping, message) => {
    expect(() => checkMapping('cutters', mapping, ['A', 'B'])).toThrow(message)
  })

  it('it takes a column that is left out', () => {
    expect(() => checkMapping('cutters', { A: null, B: '' }, ['A', 'B'])).not.toThrow()
  })
})
